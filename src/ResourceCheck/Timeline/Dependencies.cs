using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Timeline;

/// <summary>The slots an expression reads.</summary>
internal static class Dependencies
{
    public static IEnumerable<int> Of(BoundExpression? expression) => expression switch
    {
        BoundSlot slot => [slot.Slot],
        BoundUnary unary => Of(unary.Operand),
        BoundBinary binary => Of(binary.Left).Concat(Of(binary.Right)),
        BoundIf choice => Of(choice.Condition).Concat(Of(choice.Then)).Concat(Of(choice.Else)),
        BoundCall call => call.Arguments.SelectMany(Of),
        BoundBasis basis => Of(basis.Argument),
        _ => [],
    };

    public static IEnumerable<int> Of(BoundUnitary unitary) => Of(unitary.Basis).Concat(Of(unitary.First)).Concat(Of(unitary.Second));
}
