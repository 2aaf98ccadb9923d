using System.Collections.Immutable;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Who learns what, line by line, in the order of the steps; in a loop each turn has its own entries.</summary>
internal static class Knowledge
{
    /// <summary>The entries of a protocol.</summary>
    public static IReadOnlyList<KnowledgeLine> Of(Protocol protocol)
    {
        List<(Span Span, List<Step> Steps)> groups = [];
        foreach (Step step in Flat(protocol.Steps).Concat(Flat(protocol.Lists?.Steps ?? [])))
        {
            if (groups.Count > 0 && groups[^1].Span == step.Span && !StartsAnew(groups[^1].Steps, step))
                groups[^1].Steps.Add(step);
            else
                groups.Add((step.Span, [step]));
        }

        IEnumerable<KnowledgeLine> inputs = protocol.Inputs.Select(i => Line(protocol, protocol.Slots[i.Slot].Span, ImmutableDictionary<string, int>.Empty, $"{protocol.Parties[i.Party]} knows {i.Name}"));
        IEnumerable<KnowledgeLine> steps = groups.Select(g => (g.Span, g.Steps[0].Counters, Text: Learned(protocol, g.Steps))).Where(g => g.Text.Length > 0)
            .Select(g => Line(protocol, g.Span, g.Counters, g.Text));
        return [.. inputs, .. steps];
    }

    private static IEnumerable<Step> Flat(IReadOnlyList<Step> steps) =>
        steps.SelectMany(s => s is WhenStep block ? Flat(block.Then).Concat(Flat(block.Otherwise)) : [s]);

    // Turns that follow one another directly repeat the same line for slots of their own.
    private static bool StartsAnew(List<Step> group, Step step) => MadeBy(step) is { } made && group.Any(g => MadeBy(g) is { } other && other == made);

    private static int? MadeBy(Step step) => step switch
    {
        MeasureStep s => s.Party,
        PickStep s => s.Party,
        SetStep s => s.Party,
        InterceptStep s => s.Outsider,
        _ => null,
    };

    private static string Learned(Protocol protocol, List<Step> steps)
    {
        string[] makers = [.. steps.Select(MadeBy).OfType<int>().Select(p => protocol.Parties[p])];
        if (makers.Length > 0)
        {
            string name = protocol.Slots[SlotOf(steps[0])].Name;
            return makers.Length == 1 ? $"{makers[0]} knows {name}" : $"{string.Join(", ", makers)} each know their own {name}";
        }

        return string.Join("; ", steps.OfType<SendStep>().GroupBy(s => string.Join(',', s.Recipients), (_, sent) => Sent(protocol, [.. sent])));
    }

    private static string Sent(Protocol protocol, SendStep[] sent)
    {
        IReadOnlyList<int> recipients = sent[0].Recipients;
        string values = Words.And(sent.Select(s => $"{protocol.Parties[s.Party]}.{protocol.Slots[s.Slot].Name}"));
        return $"{string.Join(", ", recipients.Select(r => protocol.Parties[r]))} {Words.Verb(recipients.Count, "learns", "learn")} {values}";
    }

    private static int SlotOf(Step step) => step switch
    {
        MeasureStep s => s.Slot,
        PickStep s => s.Slot,
        SetStep s => s.Slot,
        InterceptStep s => s.Slot,
        _ => -1,
    };

    private static KnowledgeLine Line(Protocol protocol, Span span, IReadOnlyDictionary<string, int> counters, string learned)
    {
        string line = protocol.Source.PlaceOf(span).LineText ?? "";
        bool quoted = false;
        int end = 0;
        while (end < line.Length && (quoted || line[end] != '#'))
            quoted ^= line[end++] == '"';
        return new KnowledgeLine(protocol.Source.LineOf(span.Start), TurnText.Of(line[..end].Trim(), counters), learned);
    }
}
