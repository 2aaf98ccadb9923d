using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>What of the positions' counts an expression reads.</summary>
internal enum StatisticKind
{
    /// <summary>Members of the first set.</summary>
    Size,

    /// <summary>Members of the first set at which the second, a predicate, holds.</summary>
    Tally,

    /// <summary>Positions that are in one of two sets only; -1 when one set is none.</summary>
    Mismatch,
}

/// <summary>A count that an expression needs, and the slot that stands for it in the expression.</summary>
internal sealed record Statistic(StatisticKind Kind, BoundExpression Set, BoundExpression? Other, int Temporary);

/// <summary>An expression of single values in which counts are replaced by temporary slots.</summary>
internal sealed record Reading(IReadOnlyList<Statistic> Statistics, BoundExpression Residual);

/// <summary>A step of the flat form that the evaluation by counting runs on: jumps lead forward only.</summary>
internal abstract record ListOperation;

/// <summary>A single value goes to a slot.</summary>
internal sealed record AssignOperation(int Party, int Slot, Reading Value) : ListOperation;

/// <summary>A set of positions goes to a slot; nothing is counted.</summary>
internal sealed record AssignSetOperation(int Party, int Slot, BoundExpression Set) : ListOperation;

/// <summary>Positions drawn from a set go to a slot.</summary>
internal sealed record DrawOperation(int Party, int Slot, Reading Count, BoundExpression Set, bool AlwaysFull) : ListOperation;

/// <summary>A party gives up when the condition holds.</summary>
internal sealed record AbortOperation(int Party, Reading Condition) : ListOperation;

/// <summary>Goes on with the next step when the condition holds, else elsewhere.</summary>
internal sealed record BranchOperation(Reading Condition, int Otherwise) : ListOperation;

/// <summary>Goes on elsewhere.</summary>
internal sealed record JumpOperation(int Target) : ListOperation;
