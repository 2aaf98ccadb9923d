using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Finds out why a name has no value where it stands: made later, gone with its turn, held by others, or never made.</summary>
internal static class UnknownNames
{
    /// <summary>Reports a name without a value.</summary>
    /// <param name="context">The binding.</param>
    /// <param name="state">Who holds what.</param>
    /// <param name="party">Whose value was asked for; null for a bare name.</param>
    /// <param name="name">The name.</param>
    /// <param name="span">Where it stands.</param>
    public static void Report(BindContext context, NameState state, int? party, string name, Span span)
    {
        if (context.Findings.IsSuspect(name))
            return;
        string? owner = party is { } p ? context.NameOf(p) : null;
        IReadOnlyList<(int Party, Holding Value)> others = state.Makers(name);
        if (owner is not null && others.Count > 0)
        {
            context.Findings.Report(span, BindingMessages.HeldByOthers(owner, name, [.. others.Select(o => context.NameOf(o.Party))]));
            return;
        }

        context.Findings.ReportName(name, span, Cause(context, owner, Held(state, party), name, span));
    }

    private static Message Cause(BindContext context, string? owner, string[] held, string name, Span span)
    {
        IReadOnlyList<Maker> makers = context.Makers.Of(name);
        string label = owner is null ? name : $"{owner}.{name}";
        if (makers.Count == 0)
            return BindingMessages.NeverMade(label, NearWords.Find(name, owner is null ? Candidates(context) : held), owner, held);
        if (makers.FirstOrDefault(m => m.Loop is not null && !context.Loops.Contains(m.Loop)) is { } inTurn && makers.All(m => m.Span.Start < span.Start))
            return BindingMessages.OfAnEndedTurn(label, context.LineOf(inTurn.Span), context.LineOf(inTurn.Loop!.Span));
        Maker? later = makers.FirstOrDefault(m => m.Span.Start > span.Start);
        return later is not null && later == makers[0]
            ? BindingMessages.MadeLater(label, context.LineOf(later.Span))
            : BindingMessages.NotMadeHere(label, context.LineOf(makers[0].Span));
    }

    private static string[] Held(NameState state, int? party) =>
        [.. state.Own.Keys.Concat(state.Received.Keys).Where(k => k.Party == party).Select(k => k.Name).Distinct().Order(StringComparer.Ordinal)];

    private static IEnumerable<string> Candidates(BindContext context) =>
        context.Makers.Names.Concat(context.Parameters.Keys).Concat(context.Counters.Keys).Concat(context.Parties.Names).Concat(["level", "fourier"]);
}
