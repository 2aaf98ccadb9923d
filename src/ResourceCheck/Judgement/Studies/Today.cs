using ResourceCheck.Conditions;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Finds the value that a varied path or parameter has without being varied.</summary>
internal static class Today
{
    /// <summary>Sections in which a party takes from <c>default</c> what it does not say.</summary>
    private static readonly string[] PartySections = ["levels", "flight", "waiting", "operations", "detection"];

    /// <summary>The value in the unit varied and whether the path itself gives it; null when neither conditions nor script give one.</summary>
    public static (double Value, bool Own)? Of(Setup setup, Variation varied) => varied.IsParameter ? OfParameter(setup, varied.Path) : OfPath(setup.Document, varied);

    private static (double Value, bool Own)? OfParameter(Setup setup, string name)
    {
        double[] values = [.. setup.Settings.Select(s => s.Protocol.Parameters.Single(p => p.Name == name).Value.ToDouble()).Distinct()];
        return values is [var only] ? (only, true) : null;
    }

    private static (double Value, bool Own)? OfPath(ConditionsDocument? document, Variation varied)
    {
        IReadOnlyList<NumericPath> numbers = document?.Numbers ?? [];
        foreach (string path in Candidates(varied.Path, numbers))
        {
            if (numbers.FirstOrDefault(n => n.Path == path) is { } number && BaseOf(varied.Unit, number) == number.Unit)
                return (UncertainInputs.In(number.Value, UncertainInputs.Scale(varied.Unit)), path == varied.Path);
        }

        return null;
    }

    /// <summary>The path, then those that a party inherits from; a section with ranges of parties is left alone, since a range stands before the default.</summary>
    private static IEnumerable<string> Candidates(string path, IReadOnlyList<NumericPath> numbers)
    {
        yield return path;
        string[] parts = path.Split('.', 3);
        if (parts.Length < 3 || !PartySections.Contains(parts[0]) || numbers.Any(n => n.Path.StartsWith($"{parts[0]}.", StringComparison.Ordinal) && n.Path.Contains("..", StringComparison.Ordinal)))
            yield break;
        yield return $"{parts[0]}.default.{parts[2]}";
        yield return $"{parts[0]}.{parts[2]}";
    }

    private static string BaseOf(string unit, NumericPath number) =>
        UnitTable.Find(unit) is { } found ? UnitTable.BaseSymbolOf(found.Dimension) : number.Unit is "rad" ? "rad" : ""; // an angle may be bare
}
