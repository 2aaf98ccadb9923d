using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Lists;

/// <summary>Tells which slots and expressions hold sets of positions.</summary>
internal sealed class SetKinds
{
    private readonly HashSet<int> _slots = [];

    public SetKinds(IReadOnlyList<Step> steps) => Learn(steps);

    public bool IsSet(int slot) => _slots.Contains(slot);

    public void Add(int slot) => _slots.Add(slot);

    public bool IsSet(BoundExpression expression) => expression switch
    {
        BoundWhere or BoundSome => true,
        BoundSlot slot => _slots.Contains(slot.Slot),
        BoundBinary { Operator: BinaryOperator.And or BinaryOperator.Or or BinaryOperator.Without } binary => IsSet(binary.Left) || IsSet(binary.Right),
        BoundIf choice => IsSet(choice.Then) || IsSet(choice.Else),
        _ => false,
    };

    private void Learn(IReadOnlyList<Step> steps)
    {
        foreach (Step step in steps)
        {
            switch (step)
            {
                case SetStep set when IsSet(set.Value):
                    _slots.Add(set.Slot);
                    break;
                case SendStep send when IsSet(send.Value):
                    _slots.Add(send.Slot);
                    break;
                case WhenStep block:
                    Learn(block.Then);
                    Learn(block.Otherwise);
                    break;
            }
        }
    }
}
