using System.Globalization;
using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources.Formats;

/// <summary>The members of a JSON state as far as they were read.</summary>
internal sealed class JsonState
{
    /// <summary>Number of qudits.</summary>
    public int? Parties { get; set; }

    /// <summary>Levels of each; as many as parties when left out.</summary>
    public int? Levels { get; set; }

    /// <summary>Amplitudes.</summary>
    public List<Complex>? Vector { get; set; }

    /// <summary>Density matrix, row after row.</summary>
    public List<Complex>? Density { get; set; }

    /// <summary>Amplitudes by levels.</summary>
    public List<JsonTerm>? Terms { get; set; }

    /// <summary>Number of rows read.</summary>
    public int Rows { get; set; }

    /// <summary>Length of the first row.</summary>
    public int RowLength { get; set; }
}

/// <summary>An amplitude with its levels.</summary>
/// <param name="Label">Levels such as <c>0-2-1</c>.</param>
/// <param name="Amplitude">The amplitude.</param>
/// <param name="Start">Offset of the label in the file's bytes.</param>
internal sealed record JsonTerm(string Label, Complex Amplitude, int Start)
{
    /// <summary>Index of the basis state; null when the label does not name one.</summary>
    public int? IndexIn(StateShape shape)
    {
        string[] words = Label.Split('-');
        int[] levels = [.. words.Select(word => Level(word, shape.Levels)).OfType<int>()];
        return words.Length == shape.Parties && levels.Length == words.Length ? Permutations.IndexOf(levels, shape.Levels) : null;
    }

    /// <summary>Leading zeros are refused: two spellings of one label would hide a repetition.</summary>
    private static int? Level(string word, int levels) =>
        int.TryParse(word, NumberStyles.None, CultureInfo.InvariantCulture, out int level) && level < levels && word == $"{level}" ? level : null;
}
