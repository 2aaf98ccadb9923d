using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;

namespace ResourceCheck.Judgement;

/// <summary>The parameter assignments that a user asks for: every combination of the values chosen.</summary>
/// <param name="Assignments">At least one; each names only the parameters that were chosen.</param>
/// <param name="Chosen">Values per chosen parameter, in the order given.</param>
internal sealed record ParameterChoices(
    IReadOnlyList<IReadOnlyDictionary<string, Rational>> Assignments, IReadOnlyDictionary<string, IReadOnlyList<Rational>> Chosen)
{
    /// <summary>More combinations than this in one run are a sweep's work.</summary>
    private const int MostAssignments = 4096;

    /// <summary>Longest range that is laid out.</summary>
    private const int MostValues = 4096;

    /// <summary>Reads the choices; those that do not fit are reported and left at their default.</summary>
    public static (ParameterChoices Choices, IReadOnlyList<Diagnostic> Findings) From(
        IReadOnlyList<ParameterInfo> parameters, IReadOnlyList<KeyValuePair<string, string>> choices)
    {
        List<Diagnostic> findings = [];
        Dictionary<string, IReadOnlyList<Rational>> chosen = [];
        foreach ((string name, string text) in choices)
        {
            ParameterInfo? parameter = parameters.FirstOrDefault(p => p.Name == name);
            if (parameter is null)
                findings.Add(JudgementMessages.UnknownParameter(name, parameters));
            else if (chosen.ContainsKey(name))
                findings.Add(JudgementMessages.TwiceChosen(name));
            else if (Values(parameter, text, findings) is { Count: > 0 } values)
                chosen[name] = values;
        }

        double count = chosen.Values.Aggregate(1.0, (product, values) => product * values.Count);
        if (count > MostAssignments)
            findings.Add(JudgementMessages.TooManyAssignments(count, MostAssignments));
        return (new ParameterChoices(count > MostAssignments ? [new Dictionary<string, Rational>()] : Combine(chosen), chosen), findings);
    }

    private static IReadOnlyList<Rational>? Values(ParameterInfo parameter, string text, List<Diagnostic> findings)
    {
        if (text.Trim() == "all")
        {
            if (parameter.Values is null)
                findings.Add(JudgementMessages.NoListedValues(parameter));
            return parameter.Values;
        }

        if (Read(text) is not { } values)
        {
            findings.Add(JudgementMessages.UnreadableChoice(parameter.Name, text));
            return null;
        }

        Rational[] outside = [.. values.Where(v => !parameter.Allows(v))];
        findings.AddRange(outside.Take(1).Select(v => JudgementMessages.OutsideDomain(parameter, v)));
        return outside.Length > 0 ? null : values;
    }

    private static List<Rational>? Read(string text)
    {
        List<Rational> values = [];
        foreach (string part in text.Split(','))
        {
            if (ReadRange(part.Trim()) is not { } range)
                return null;
            values.AddRange(range.Where(v => !values.Contains(v)));
        }

        return values;
    }

    private static IEnumerable<Rational>? ReadRange(string part)
    {
        int dots = part.IndexOf("..", StringComparison.Ordinal);
        if (dots < 0)
            return ReadNumber(part) is { } single ? [single] : null;
        if (ReadNumber(part[..dots]) is not { } from || ReadNumber(part[(dots + 2)..]) is not { } to)
            return null;
        BigInteger first = from.Ceiling(), last = to.Floor();
        return last < first || last - first > MostValues ? null : Enumerable.Range(0, (int)(last - first) + 1).Select(i => Rational.From(first + i));
    }

    private static Rational? ReadNumber(string text)
    {
        int slash = text.IndexOf('/', StringComparison.Ordinal);
        if (slash < 0)
            return Rational.TryParse(text.Trim(), out Rational whole) ? whole : null;
        return Rational.TryParse(text[..slash].Trim(), out Rational numerator) && Rational.TryParse(text[(slash + 1)..].Trim(), out Rational denominator) && denominator.Sign != 0
            ? numerator / denominator
            : null;
    }

    private static IReadOnlyList<IReadOnlyDictionary<string, Rational>> Combine(Dictionary<string, IReadOnlyList<Rational>> chosen)
    {
        IEnumerable<Dictionary<string, Rational>> combinations = [[]];
        foreach ((string name, IReadOnlyList<Rational> values) in chosen)
            combinations = [.. combinations.SelectMany(c => values.Select(v => new Dictionary<string, Rational>(c) { [name] = v }))];
        return [.. combinations];
    }
}
