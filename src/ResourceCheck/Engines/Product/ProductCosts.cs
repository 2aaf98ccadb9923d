using ResourceCheck.Numerics;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>Adds up what an evaluation would cost, and finds out whether the conditions of a plan can be summed without listing strings.</summary>
internal sealed class ProductCosts : IProductTally
{
    private readonly Plan _plan;
    private readonly OperatorBasis _basis;
    private readonly Inlining _inlining;
    private readonly ConditionLaw _conditions;
    private readonly WeightCosts _looks = new();

    public ProductCosts(Plan plan, OperatorBasis basis)
    {
        (_plan, _basis) = (plan, basis);
        _inlining = new Inlining(plan.Protocol.Levels);
        _conditions = new ConditionLaw(_inlining, plan.Protocol.Levels);
    }

    /// <summary>What looks cost.</summary>
    public WeightCosts Looks => _looks;

    /// <summary>What ends cost when strings are not listed.</summary>
    public WeightCosts Open { get; } = new();

    /// <summary>What ends cost when strings are listed, without the reading of the strings.</summary>
    public WeightCosts Listing { get; } = new();

    /// <summary>Strings to be read when they are listed.</summary>
    public double Strings { get; private set; }

    /// <summary>Most strings of one history.</summary>
    public double MostStrings { get; private set; }

    /// <summary>Why strings cannot be left unlisted; null when they can.</summary>
    public ProductRefusalException? Refusal { get; private set; }

    public double Weight(ProductBranch branch) => 1;

    public void Look(CheckpointPlanStep step, ProductBranch branch, ProductBranch waited)
    {
        _looks.Overlap(ProductLook.Of(step, waited, _plan.Protocol.Holders, _basis.Trace), branch.Copies);
        _looks.Repeat(branch.Copies, () => _ = Law(branch, _looks).Total);
    }

    public void Drop(ProductBranch branch, BoundExpression? condition) =>
        Try(() => Open.Repeat(branch.Copies, () => _conditions.Probability(Law(branch, Open), condition is null ? branch.Conditions : [.. branch.Conditions, condition])));

    public void End(ProductBranch branch)
    {
        OpenLaw listed = Law(branch, Listing);
        Strings += branch.Copies * listed.Strings;
        MostStrings = Math.Max(MostStrings, listed.Strings);
        Listing.Repeat(branch.Copies, () => listed.Joint());
        if (Refusal is null)
            Try(() => Open.Repeat(branch.Copies, () => AddOpen(branch, Law(branch, Open))));
    }

    private void AddOpen(ProductBranch branch, OpenLaw law)
    {
        _conditions.Probability(law, branch.Conditions);
        if (branch.Aborted == 0)
            _conditions.Probability(law, [.. branch.Conditions, _inlining.In(_plan.Protocol.Success, branch)]);
        if (_plan.Protocol.Harm is { } harm)
            _conditions.Probability(law, [.. branch.Conditions, _inlining.In(harm, branch)]);
        new SymbolicSums(_plan.Protocol, _inlining, _conditions).Add(branch, law, 1);
    }

    private void Try(Action action)
    {
        try
        {
            action();
        }
        catch (ProductRefusalException refusal)
        {
            Refusal ??= refusal;
        }
    }

    private OpenLaw Law(ProductBranch branch, WeightCosts costs) => new(costs, branch.AllReadings(_plan.Protocol.Holders, _basis.Trace), _plan.Protocol.Levels);
}
