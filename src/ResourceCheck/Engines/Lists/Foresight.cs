using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// What the operations still to come can see of each position: they are run on signatures instead of counts, both ways at decisions
/// that are open. Positions of the same class cannot be told apart later; class 0 is never looked at again.
/// </summary>
internal sealed class Foresight
{
    private readonly ListContext _context;
    private readonly ListStructure _structure;
    private readonly Signatures _signatures = new();
    private readonly int[][] _classes;
    private readonly Prospect?[] _pending;
    private int _looks;

    private Foresight(ListContext context, ListStructure structure)
    {
        _context = context;
        _structure = structure;
        _classes = [.. structure.Cells.Select(_ => new int[context.Types])];
        _pending = new Prospect?[context.Code.Operations.Count + 1];
    }

    /// <summary>Class of each cell's types.</summary>
    /// <param name="context">The task.</param>
    /// <param name="structure">What is known.</param>
    /// <param name="from">First operation still to come.</param>
    /// <param name="or">Another operation that may come first instead; -1 for none.</param>
    /// <param name="open">A slot whose single value is about to be found; -1 for none.</param>
    /// <param name="abortOpen">A party of which it is about to be found whether it gives up; -1 for none.</param>
    public static int[][] Classes(ListContext context, ListStructure structure, int from, int or = -1, int open = -1, int abortOpen = -1)
    {
        Foresight foresight = new(context, structure);
        Prospect start = Prospect.Of(context, structure, open, abortOpen);
        foresight._pending[from] = start;
        if (or >= 0)
            foresight.Go(or, start.Copy());
        for (int at = from; at < foresight._pending.Length - 1; at++)
        {
            if (foresight._pending[at] is { } prospect)
                foresight.Step(at, prospect);
        }

        return foresight._classes;
    }

    private void Step(int at, Prospect prospect)
    {
        switch (_context.Code.Operations[at])
        {
            case AssignOperation assign:
                Look(assign.Value, prospect);
                prospect.Assign(assign.Slot, prospect.MayAbort(assign.Party) ? null : Known(assign.Value, prospect));
                Go(at + 1, prospect);
                break;
            case AssignSetOperation assign:
                prospect.AssignSet(assign.Slot, Set(assign.Set, prospect));
                Go(at + 1, prospect);
                break;
            case DrawOperation draw:
                Look(draw.Count, prospect);
                int[][]? source = Set(draw.Set, prospect);
                Look(source);
                prospect.AssignSet(draw.Slot, Map(source, s => s == Signatures.No ? s : _signatures.Of("drawn", at, s)));
                Go(at + 1, prospect);
                break;
            case AbortOperation abort:
                Look(abort.Condition, prospect);
                if (Known(abort.Condition, prospect) is null or TruthValue { Truth: true })
                    prospect.Abort(abort.Party);
                Go(at + 1, prospect);
                break;
            case BranchOperation branch:
                Branch(at, branch, prospect);
                break;
            case JumpOperation jump:
                Go(jump.Target, prospect);
                break;
        }
    }

    private void Branch(int at, BranchOperation branch, Prospect prospect)
    {
        Look(branch.Condition, prospect);
        Value? known = Known(branch.Condition, prospect);
        bool holds = known is TruthValue { Truth: true };
        if (known is null || holds)
            Go(at + 1, prospect.Copy());
        if (known is null || !holds)
            Go(branch.Otherwise, prospect.Copy());
    }

    private void Go(int at, Prospect prospect) =>
        _pending[at] = _pending[at] is { } other ? other.Joined(prospect, _signatures) : prospect;

    private Value? Known(Reading reading, Prospect prospect) =>
        reading.Statistics.Count == 0 && Reads.Slots(reading.Residual).All(prospect.IsKnown) ? _context.Evaluate(reading.Residual, prospect.Single) : null;

    private void Look(Reading reading, Prospect prospect)
    {
        foreach (Statistic statistic in Simplification.Of(reading, prospect.IsKnown, e => _context.Evaluate(e, prospect.Single)).Statistics)
        {
            int[][]? set = Set(statistic.Set, prospect);
            switch (statistic.Kind)
            {
                case StatisticKind.Tally:
                    Look(Both(set, Where(statistic.Other!, prospect), _signatures.And));
                    break;
                case StatisticKind.Mismatch:
                    Look(set);
                    Look(Set(statistic.Other!, prospect));
                    break;
                default:
                    Look(set);
                    break;
            }
        }
    }

    private void Look(int[][]? set)
    {
        if (set is null)
            return;
        _looks++;
        for (int cell = 0; cell < set.Length; cell++)
        {
            for (int type = 0; type < set[cell].Length; type++)
            {
                if (set[cell][type] != Signatures.No)
                    _classes[cell][type] = _signatures.Of("seen", _classes[cell][type], _signatures.Of("look", _looks, set[cell][type]));
            }
        }
    }

    private int[][]? Set(BoundExpression expression, Prospect prospect)
    {
        switch (expression)
        {
            case BoundWhere where:
                return Where(where.Predicate, prospect);
            case BoundSlot slot:
                return prospect.Sets[slot.Slot];
            case BoundIf choice:
                return If(choice, prospect);
            case BoundBinary binary:
                return Both(Set(binary.Left, prospect), Set(binary.Right, prospect), Combination(binary.Operator));
            default:
                return null;
        }
    }

    private Func<int, int, int> Combination(BinaryOperator op) => op switch
    {
        BinaryOperator.And => _signatures.And,
        BinaryOperator.Or => _signatures.Or,
        _ => _signatures.Without,
    };

    private int[][]? If(BoundIf choice, Prospect prospect)
    {
        if (Known(new Reading([], choice.Condition), prospect) is { } known)
            return Set(known is TruthValue { Truth: true } ? choice.Then : choice.Else, prospect);
        int[][]? then = Set(choice.Then, prospect), otherwise = Set(choice.Else, prospect);
        return then is null ? otherwise : otherwise is null ? then : Both(then, otherwise, _signatures.Either);
    }

    private int[][] Where(BoundExpression predicate, Prospect prospect)
    {
        int[] signatures = new int[_context.Types];
        int[] read = [.. Reads.Slots(predicate).Distinct()];
        bool known = read.All(s => _context.Task.IsPerCopy(s) || prospect.IsKnown(s));
        for (int type = 0; type < signatures.Length; type++)
        {
            signatures[type] = known
                ? _context.Holds(predicate, prospect.Single, type) ? Signatures.Yes : Signatures.No
                : _signatures.Of(string.Join('|', read.Where(_context.Task.IsPerCopy).Select(s => $"{s}={_context.Content(type, s)}")), 0, 0);
        }

        return [.. _structure.Cells.Select(c => Within(signatures, c))];
    }

    private static int[] Within(int[] signatures, Cell cell) => [.. signatures.Select((s, type) => ListContext.Has(cell.Types, type) ? s : Signatures.No)];

    private static int[][]? Map(int[][]? set, Func<int, int> change) => set?.Select(c => c.Select(change).ToArray()).ToArray();

    private static int[][]? Both(int[][]? left, int[][]? right, Func<int, int, int> combine) =>
        left is null || right is null ? null : [.. left.Zip(right, (l, r) => l.Zip(r, combine).ToArray())];
}
