using ResourceCheck.Diagnostics;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>Numbers that a user gives to cheats instead of having them searched: <c>sender splits: n = 84, k1 = 0</c>.</summary>
internal static class ChosenNumbers
{
    /// <summary>What is wrong with the numbers given.</summary>
    public static IEnumerable<Diagnostic> Findings(IReadOnlyList<string> texts, Protocol protocol)
    {
        DishonestCase[] open = [.. protocol.Dishonest.Where(d => d.Choices.Count > 0)];
        foreach (string text in texts)
        {
            if (open.FirstOrDefault(d => d.Name == CaseOf(text)) is not { } cheat)
                yield return JudgementMessages.UnknownCheat(text, CaseOf(text), open.Select(d => d.Name));
            else if (texts.First(t => CaseOf(t) == cheat.Name) != text)
                yield return JudgementMessages.CheatTwice(cheat.Name);
            else if (For([text], cheat) is not { } values)
                yield return JudgementMessages.UnreadableNumbers(text, cheat);
            else if (Outside(cheat, values, protocol) is { } index)
                yield return JudgementMessages.NumberOutside(cheat, index, values[index]);
        }
    }

    /// <summary>The numbers given for a strategy, in its order; null when there are none or they cannot be read.</summary>
    public static Value[]? For(IReadOnlyList<string> texts, DishonestCase cheat)
    {
        if (texts.FirstOrDefault(t => CaseOf(t) == cheat.Name) is not { } text)
            return null;
        Dictionary<string, Value> numbers = [];
        foreach (string part in text[(text.LastIndexOf(':') + 1)..].Split(','))
        {
            string[] sides = part.Split('=');
            if (sides.Length != 2 || !Rational.TryParse(sides[1].Trim(), out Rational number) || !numbers.TryAdd(sides[0].Trim(), new NumberValue(number)))
                return null;
        }

        return numbers.Count == cheat.Choices.Count && cheat.Choices.All(c => numbers.ContainsKey(c.Name)) ? [.. cheat.Choices.Select(c => numbers[c.Name])] : null;
    }

    private static string CaseOf(string text) => text.LastIndexOf(':') is var colon and > 0 ? text[..colon].Trim() : text;

    private static int? Outside(DishonestCase cheat, Value[] values, Protocol protocol)
    {
        for (int i = 0; i < values.Length; i++)
        {
            ChoiceRange range = new(cheat.Choices[i], protocol.Lists?.Copies ?? 0, protocol.Levels);
            bool whole = !cheat.Choices[i].Whole || values[i] is NumberValue { Number: var n } && Rational.From(n.Floor()) == n;
            if (!whole || !range.Allows(values[i], values))
                return i;
        }

        return null;
    }
}
