using ResourceCheck.Diagnostics;
using ResourceCheck.Engines.Figures;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>Finds the reports and claims of a list protocol that no evaluation answers: those about what a discussion made.</summary>
internal static class ListFigures
{
    public static IEnumerable<Diagnostic> Unanswerable(Protocol protocol) => protocol.Lists is not { } lists ? [] :
        FigureTally.Elementary(protocol).Where(f => Expressions(f).SelectMany(BoundWalk.Within).Any(e => OfDiscussion(e, lists)))
            .Select(f => JudgementMessages.FigureOfDiscussion(protocol.Source.PlaceOf(f.Span))).Distinct();

    private static bool OfDiscussion(BoundExpression expression, ListProtocol lists) =>
        expression is BoundWhere or BoundSome or BoundSize or BoundTally || (expression is BoundSlot slot && slot.Slot >= lists.CopySlots);

    private static IEnumerable<BoundExpression> Expressions(Figure figure) => figure switch
    {
        ProbabilityFigure f => f.Given is { } given ? [f.Condition, given] : [f.Condition],
        MeanFigure f => f.Given is { } given ? [f.Value, given] : [f.Value],
        GuessFigure f => f.Known.Prepend(f.Target),
        InformationFigure f => f.Left.Concat(f.Right),
        _ => [],
    };
}
