using ResourceCheck.Engines.Dense;
using ResourceCheck.Engines.Figures;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>Adds up what histories contribute and turns it into an evaluation.</summary>
internal sealed class ProductTally : IProductTally
{
    /// <summary>Histories told for ends and failures.</summary>
    private const int HistoriesTold = 8;

    /// <summary>As for fidelities: less than this is what sums of terms of order one leave of nothing.</summary>
    private const double Nothing = 1e-14;

    private readonly Plan _plan;
    private readonly OperatorBasis _basis;
    private readonly bool _listed;
    private readonly MixtureWeights _weights;
    private readonly ConditionLaw _conditions;
    private readonly Inlining _inlining;
    private readonly SymbolicSums _symbolic;
    private readonly FigureTally _figures;
    private readonly BellTally _bell;
    private readonly IReadOnlyList<string> _labels;
    private readonly Dictionary<string, Look> _looks = [];
    private readonly History _failures;
    private readonly History _ends;
    private readonly Dictionary<string, CopyType> _copies = [];
    private double _overlapError;
    private RoundedSum _success, _failure, _abort, _harm, _dropped;

    /// <param name="plan">The plan.</param>
    /// <param name="basis">Operator basis of a site.</param>
    /// <param name="listed">Whether strings of open outcomes are listed.</param>
    public ProductTally(Plan plan, OperatorBasis basis, bool listed)
    {
        (_plan, _basis, _listed) = (plan, basis, listed);
        _weights = new MixtureWeights(plan.World.Resource.White);
        _inlining = new Inlining(plan.Protocol.Levels);
        _conditions = new ConditionLaw(_inlining, plan.Protocol.Levels);
        _symbolic = new SymbolicSums(plan.Protocol, _inlining, _conditions);
        _figures = new FigureTally(plan.Protocol);
        _labels = PlanLabels.Of(plan);
        _bell = new BellTally(plan.Protocol, basis, _labels);
        _failures = new History(plan.Protocol, false);
        _ends = new History(plan.Protocol, false);
    }

    public double Weight(ProductBranch branch) => branch.Factor * Law(branch).Total.Value.Real;

    public void Look(CheckpointPlanStep step, ProductBranch branch, ProductBranch waited)
    {
        RoundedSum overlap = Overlap(step, waited).Times(branch.Factor);
        double weight = Weight(branch);
        _overlapError = Math.Max(_overlapError, overlap.Error);
        LookOf(step).Add(branch.Slots, weight, overlap.Value.Real);
        foreach (BellFigure pair in _bell.Pairs.Where(p => waited.Readings[p.First] is null && waited.Readings[p.Second] is null))
            _bell.Look(pair, step.Label, (a, b) => branch.Factor * Law(Observed(waited, pair, a, b)).Total.Value.Real);
    }

    public void Drop(ProductBranch branch, BoundExpression? condition)
    {
        OpenLaw law = Law(branch);
        if (condition is null)
            _dropped += Kept(branch, law);
        else
            _dropped += Probability(branch, law, [new BoundUnary(condition.Span, Scripts.Syntax.UnaryOperator.Not, condition)]);
    }

    public void End(ProductBranch branch)
    {
        OpenLaw law = Law(branch);
        if (_listed)
        {
            foreach ((Value[] slots, double weight) in OpenEnds.Of(branch, law, _plan.Protocol.Levels))
                EndListed(branch, slots, weight);
        }
        else
        {
            EndOpen(branch, law);
        }
    }

    /// <summary>A fraction of two rounded sums as an estimate; undefined when the whole is nothing.</summary>
    public static Estimate Fraction(RoundedSum part, RoundedSum whole)
    {
        double value = FigureSum.Ratio(part.Value.Real, whole.Value.Real);
        double roundOff = whole.Value.Real > 0 ? (part.Error + whole.Error) / whole.Value.Real : 0;
        return Estimate.Exact(Math.Abs(value) <= Math.Max(roundOff, Nothing) ? 0 : Tally.Clip(value)) with { RoundOff = roundOff };
    }

    /// <summary>Everything added up; figures are of kept copies.</summary>
    public Evaluation Conclude(EngineChoice choice, IReadOnlyList<Value> inputs, Func<IReadOnlyList<CopyType>, ListEvaluation>? lists)
    {
        RoundedSum all = _success + _failure;
        double kept = Tally.Clip(all.Value.Real), heralded = Tally.Clip(_looks.GetValueOrDefault("arrived")?.Weight ?? 0), seen = kept + _dropped.Value.Real;
        CheckpointEvaluation[] checkpoints = [.. _labels.Where(_looks.ContainsKey).Select(l => _looks[l].Conclude()).Select(WithRoundOff)];
        CopyType[] copies = [.. _copies.OrderBy(c => c.Key, StringComparer.Ordinal).Select(c => c.Value with { Probability = c.Value.Probability / kept })];
        ListEvaluation? verdicts = kept > 0 ? lists?.Invoke(copies) : null;
        Metrics metrics = new(verdicts?.Success ?? Fraction(_success, all), verdicts?.Failure ?? Fraction(_failure, all), verdicts?.Abort ?? Fraction(_abort, all), kept, checkpoints);
        FigureValues figures = new(_plan.Protocol, metrics, _listed ? _figures.Of : _symbolic.Of, _bell.Of);
        return new Evaluation
        {
            Engine = choice,
            Inputs = inputs,
            Heralded = heralded,
            Seen = Tally.Clip(Tally.Ratio(seen, heralded)),
            Kept = Tally.Clip(Tally.Ratio(kept, seen)),
            Success = metrics.Success,
            Failure = metrics.Failure,
            Abort = metrics.Abort,
            Harm = _plan.Protocol.Harm is null ? null : verdicts?.Harm ?? Fraction(_harm, all),
            Copies = copies,
            ListMethod = verdicts?.Method,
            Checkpoints = checkpoints,
            Reports = figures.Reports(),
            Claims = figures.Claims(),
            Ends = [.. _ends.MostProbable(kept, HistoriesTold)],
            Failures = [.. _failures.MostProbable(kept, HistoriesTold)],
        };
    }

    private CheckpointEvaluation WithRoundOff(CheckpointEvaluation look) =>
        look with { Fidelity = look.Fidelity with { RoundOff = look.Kept > 0 ? _overlapError / look.Kept : 0 } };

    private void EndListed(ProductBranch branch, Value[] slots, double weight)
    {
        RoundedSum sum = new(weight, weight * 1e-15);
        if (_plan.Protocol.Lists is { } lists)
            AddCopy([.. slots.Take(lists.CopySlots)], weight);
        if (_plan.Protocol.Harm is { } harm && ValueEvaluator.Holds(harm, slots, _basis.Levels))
            _harm += sum;
        bool success = branch.Aborted == 0 && ValueEvaluator.Holds(_plan.Protocol.Success, slots, _basis.Levels);
        _success += success ? sum : default;
        _failure += success ? default : sum;
        _abort += branch.Aborted != 0 ? sum : default;
        if (!success && _plan.Protocol.Lists is null)
            _failures.Add(slots, weight, 0);
        _ends.Add(slots, weight, 0);
        _figures.Add(slots, weight, _basis.Levels);
    }

    private void AddCopy(Value[] slots, double weight)
    {
        string key = string.Join('|', slots.AsEnumerable());
        _copies[key] = new CopyType(slots, weight + (_copies.TryGetValue(key, out CopyType? before) ? before.Probability : 0));
    }

    /// <summary>Failure is the rest of what is kept: sums over many strings are never listed, so that it has no sum of its own.</summary>
    private void EndOpen(ProductBranch branch, OpenLaw law)
    {
        RoundedSum kept = Kept(branch, law);
        bool aborted = branch.Aborted != 0;
        RoundedSum success = aborted ? default : Probability(branch, law, [_inlining.In(_plan.Protocol.Success, branch)]);
        _success += success;
        _failure += new RoundedSum(kept.Value - success.Value, kept.Error + success.Error);
        _abort += aborted ? kept : default;
        if (_plan.Protocol.Harm is { } harm)
            _harm += Probability(branch, law, [_inlining.In(harm, branch)]);
        _symbolic.Add(branch, law, kept.Value.Real);
    }

    private RoundedSum Kept(ProductBranch branch, OpenLaw law) => Probability(branch, law, []);

    private RoundedSum Probability(ProductBranch branch, OpenLaw law, IEnumerable<BoundExpression> conditions) =>
        _conditions.Probability(law, branch.Conditions.Concat(conditions)).Times(branch.Factor);

    private OpenLaw Law(ProductBranch branch) => new(_weights, branch.AllReadings(_plan.Protocol.Holders, _basis.Trace), _plan.Protocol.Levels);

    private static ProductBranch Observed(ProductBranch branch, BellFigure pair, double[] first, double[] second) =>
        branch.Read(pair.First, Reading.Settled(branch.Sites[pair.First]!.Pull(first))).Read(pair.Second, Reading.Settled(branch.Sites[pair.Second]!.Pull(second)));

    private RoundedSum Overlap(CheckpointPlanStep step, ProductBranch waited)
    {
        double white = _plan.World.Resource.White;
        RoundedSum pure = ProductLook.Of(step, waited, _plan.Protocol.Holders, _basis.Trace).Overlap().Times(1 - white);
        return white == 0 ? pure : pure + ProductLook.OfWhite(step, waited, _plan.Protocol.Holders, _basis.Trace).Times(white);
    }

    private Look LookOf(CheckpointPlanStep step)
    {
        if (!_looks.TryGetValue(step.Label, out Look? look))
            _looks[step.Label] = look = new Look(step.Label, step.At.Seconds, new History(_plan.Protocol, true));
        return look;
    }
}
