using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Usage;

/// <summary>The command line as one quotable line, so that findings can mark the word they are about.</summary>
internal sealed class Words(IReadOnlyList<string> args)
{
    private const string Name = "the command line";
    private readonly string[] _shown = [.. args.Select(Quoted)];

    /// <summary>The place of a word; where it stands behind an option, the one behind it.</summary>
    public Place PlaceOf(string word, string? behind = null)
    {
        int from = behind is null ? 0 : Math.Max(0, Find(behind, 0, args.Count));
        int index = Find(word, from, args.Count);
        return At(index >= 0 ? index : Math.Max(0, Find(word, 0, args.Count)));
    }

    /// <summary>The place of a word's last use.</summary>
    public Place PlaceOfLast(string word)
    {
        int index = args.Count - 1;
        while (index > 0 && !Matches(args[index], word))
            index--;
        return At(index);
    }

    private Place At(int index)
    {
        const string program = $"{Findings.Program} ";
        int start = program.Length + _shown.Take(index).Sum(w => w.Length + 1);
        string line = program + string.Join(' ', _shown);
        return new Place(Name, 0, 0, line, start, index < _shown.Length ? _shown[index].Length : 0);
    }

    private int Find(string word, int from, int to)
    {
        for (int i = from; i < to; i++)
        {
            if (Matches(args[i], word))
                return i;
        }

        return -1;
    }

    private static bool Matches(string arg, string word) =>
        arg == word || arg.StartsWith($"{word}=", StringComparison.Ordinal) || arg.EndsWith($"={word}", StringComparison.Ordinal);

    /// <summary>A word as a shell takes it: in quotes where blanks or signs of the shell stand in it.</summary>
    public static string Quoted(string arg) => (arg.Length > 0 && !arg.Any(IsSpecial), arg.AsSpan().IndexOfAny("\"$`\\!") < 0) switch
    {
        (true, _) => arg,
        (_, true) => $"\"{arg}\"",
        _ => $"'{arg.Replace("'", "'\\''", StringComparison.Ordinal)}'",
    };

    private static bool IsSpecial(char c) => char.IsWhiteSpace(c) || "\"'$`\\!*?()<>;&|".Contains(c, StringComparison.Ordinal);
}
