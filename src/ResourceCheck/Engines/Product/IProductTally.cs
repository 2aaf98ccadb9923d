using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>Takes what histories contribute: their figures, or only what these would cost.</summary>
internal interface IProductTally
{
    /// <summary>Probability of a history, its picks' included; open outcomes may be anything.</summary>
    public double Weight(ProductBranch branch);

    /// <summary>A look at a checkpoint; <paramref name="waited"/> is the copy on which everybody has waited.</summary>
    public void Look(CheckpointPlanStep step, ProductBranch branch, ProductBranch waited);

    /// <summary>A keep drops copies of the history for which the condition on its open outcomes fails; null when it drops them all.</summary>
    public void Drop(ProductBranch branch, BoundExpression? condition);

    /// <summary>The history has come to its end.</summary>
    public void End(ProductBranch branch);
}
