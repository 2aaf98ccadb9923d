using System.Globalization;
using System.Text.RegularExpressions;

namespace ResourceCheck.Conditions;

/// <summary>Who is meant by a party name of a conditions file: <c>Dov</c>, <c>P[3]</c> or <c>P[2..5]</c>.</summary>
/// <param name="Base">Name of the party or family.</param>
/// <param name="From">First index; null for a party that is no family member.</param>
/// <param name="To">Last index; null like <paramref name="From"/>.</param>
internal sealed partial record PartyName(string Base, int? From, int? To)
{
    /// <summary>Whether several members are meant.</summary>
    public bool IsRange => From != To;

    /// <summary>Reads a name; null when it has no such form or its range runs backwards.</summary>
    public static PartyName? Parse(string text)
    {
        Match match = Form().Match(text);
        if (!match.Success)
            return null;
        string name = match.Groups["base"].Value;
        if (!match.Groups["from"].Success)
            return new PartyName(name, null, null);
        if (!Index(match.Groups["from"].Value, out int from))
            return null;
        int to = from;
        if (match.Groups["to"] is { Success: true } last && !Index(last.Value, out to))
            return null;
        return from <= to ? new PartyName(name, from, to) : null;
    }

    /// <summary>Whether a single party or member belongs to what this names.</summary>
    public bool Covers(PartyName single) => single.Base == Base && (From is null ? single.From is null : single.From >= From && single.From <= To);

    private static bool Index(string text, out int index) => int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out index);

    [GeneratedRegex(@"^(?<base>[\p{L}_][\p{L}\p{Nd}_]*)(\[(?<from>[0-9]+)(\.\.(?<to>[0-9]+))?\])?\z", RegexOptions.ExplicitCapture)]
    private static partial Regex Form();
}
