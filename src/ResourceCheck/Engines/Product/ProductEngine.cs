using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Numerics;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>
/// Exact evaluation of the antisymmetric resource, with white noise mixed in, under noise that acts on each qudit by itself. Maps are pulled back to
/// the resource's levels, so that every probability is a mixed discriminant and every fidelity a sum over subsets; no density operator is made.
/// </summary>
public static class ProductEngine
{
    /// <summary>Beyond, maps on the operator space of one qudit take hundreds of megabytes each.</summary>
    public const int MostParties = 20;

    /// <summary>Up to this many strings of outcomes are listed, so that the likeliest histories can be told.</summary>
    private const double ListedAnyway = 65536;

    /// <summary>Most strings that are listed where a condition leaves no other way.</summary>
    private const double MostListed = 2e7;

    /// <summary>Reading one string costs about as much as so many multiplications.</summary>
    private const double WorkPerString = 5000;

    /// <summary>Why the engine does not apply to a plan; null when it does.</summary>
    public static string? Refusal(Plan plan, IReadOnlyDictionary<string, Complex[,]> matrices)
    {
        if (plan.World.Resource.Preparation is not IdealPreparation)
            return "the product engine takes the antisymmetric state itself, with white noise at most, and this resource is prepared otherwise";
        if (plan.World.Storage is not null)
            return "the product engine takes noise on each qudit by itself, and storage is collective decay";
        if (plan.Protocol.Levels > MostParties)
            return $"the product engine keeps d⁴ numbers per qudit and takes up to {MostParties} levels, and here are {plan.Protocol.Levels}";
        return RefusalOf(plan, Costs(plan, matrices, default));
    }

    /// <summary>What an evaluation would cost. Nothing large is allocated.</summary>
    public static EngineChoice Estimate(Plan plan, IReadOnlyDictionary<string, Complex[,]> matrices, string reason)
    {
        ProductCosts costs = Costs(plan, matrices, default);
        bool listed = IsListed(plan, costs);
        double work = costs.Looks.Work + (listed ? costs.Listing.Work + (WorkPerString * costs.Strings) : costs.Open.Work);
        double sites = 16 * Math.Pow(plan.Protocol.Levels, 5);
        return new EngineChoice("product", reason, sites + Math.Max(costs.Looks.Bytes, listed ? costs.Listing.Bytes : costs.Open.Bytes), work);
    }

    /// <summary>Evaluates a plan for one assignment of the private inputs; see <see cref="DenseEngine.Evaluate"/>.</summary>
    public static Evaluation Evaluate(
        Plan plan, IReadOnlyList<Value> inputs, EngineChoice choice, IReadOnlyDictionary<string, Complex[,]> matrices, CancellationToken cancellation,
        Func<IReadOnlyList<CopyType>, ListEvaluation>? lists = null)
    {
        return Evaluate(plan, inputs, choice, matrices, IsListed(plan, Costs(plan, matrices, cancellation)), lists, cancellation);
    }

    /// <summary>Evaluates with strings of open outcomes listed or not, whichever the costs say.</summary>
    internal static Evaluation Evaluate(
        Plan plan, IReadOnlyList<Value> inputs, EngineChoice choice, IReadOnlyDictionary<string, Complex[,]> matrices, bool listed,
        Func<IReadOnlyList<CopyType>, ListEvaluation>? lists, CancellationToken cancellation)
    {
        OperatorBasis basis = new(plan.Protocol.Levels, plan.NeedsSink);
        ProductTally tally = new(plan, basis, listed);
        new ProductWalker(plan, new LocalModels(basis, matrices), tally, false, cancellation).Walk(Start(plan, basis, inputs));
        return tally.Conclude(choice, inputs, lists);
    }

    private static ProductCosts Costs(Plan plan, IReadOnlyDictionary<string, Complex[,]> matrices, CancellationToken cancellation)
    {
        OperatorBasis basis = new(plan.Protocol.Levels, plan.NeedsSink);
        ProductCosts costs = new(plan, basis);
        new ProductWalker(plan, new LocalModels(basis, matrices), costs, true, cancellation).Walk(Start(plan, basis, [.. plan.Protocol.Inputs.Select(i => i.Values[0])]));
        return costs;
    }

    /// <summary>Lists need the law of one copy, which is a list of strings.</summary>
    private static bool IsListed(Plan plan, ProductCosts costs) =>
        plan.Protocol.Lists is not null || costs.Strings <= ListedAnyway || costs.Refusal is not null;

    private static string? RefusalOf(Plan plan, ProductCosts costs)
    {
        if (!IsListed(plan, costs) || costs.Strings <= MostListed)
            return null;
        string strings = costs.Strings.ToString("0.#e+0");
        return costs.Refusal is { } refusal
            ? $"the condition at {plan.Protocol.Source.PlaceOf(refusal.At)} reads {refusal.Outcomes} outcomes in a way that has no sum of its own, and {strings} strings of outcomes are too many to list"
            : $"lists need the law of one copy, and {strings} strings of outcomes are too many to list";
    }

    private static ProductBranch Start(Plan plan, OperatorBasis basis, IReadOnlyList<Value> inputs)
    {
        Value[] slots = new Value[plan.Protocol.Slots.Count];
        Array.Fill(slots, History.NotYet);
        for (int i = 0; i < inputs.Count; i++)
            slots[plan.Protocol.Inputs[i].Slot] = inputs[i];
        SiteState fresh = SiteState.Fresh(basis);
        return new ProductBranch
        {
            Sites = [.. Enumerable.Range(0, plan.Protocol.Parties.Count).Select(p => plan.Protocol.Holders.Contains(p) ? fresh : null)],
            Readings = new Reading?[plan.Protocol.Parties.Count],
            Slots = slots,
            Symbols = new BoundExpression?[slots.Length],
        };
    }
}
