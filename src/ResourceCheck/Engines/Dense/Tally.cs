using ResourceCheck.Engines.Figures;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.States;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Dense;

/// <summary>Adds up what the branches contribute and turns it into an evaluation.</summary>
internal sealed class Tally
{
    /// <summary>Histories told for a failing success condition.</summary>
    private const int FailuresTold = 8;

    /// <summary>Far above what sums of some thousand terms lose, far below what anybody would notice.</summary>
    private const double RoundOff = 1e-9;

    private readonly Plan _plan;
    private readonly OperatorBasis _basis;
    private readonly Dictionary<string, Look> _looks = [];
    private readonly IReadOnlyList<string> _labels;
    private readonly Dictionary<int, SiteTensor> _targets = [];
    private readonly FigureTally _figures;
    private readonly BellTally _bell;
    private readonly History _failures;
    private readonly History _ends;
    private readonly Dictionary<string, CopyType> _copies = [];
    private double _success, _failure, _abort, _harm, _dropped, _error;

    public Tally(Plan plan, OperatorBasis basis)
    {
        _plan = plan;
        _basis = basis;
        _figures = new FigureTally(plan.Protocol);
        _labels = PlanLabels.Of(plan);
        _bell = new BellTally(plan.Protocol, basis, _labels);
        _failures = new History(plan.Protocol, false);
        _ends = new History(plan.Protocol, false);
    }

    /// <summary>A <c>keep</c> dropped the copy.</summary>
    public void Dropped(double weight) => _dropped += weight;

    /// <summary>Adds the estimated error of integrating collective decay: preparation and storage happen once each, one after the other.</summary>
    public void IntegrationError(double error) => _error += error;

    /// <summary>A look at a checkpoint in one branch.</summary>
    public void Look(CheckpointPlanStep step, Branch branch, LocalModels models)
    {
        Branch waited = branch;
        foreach (NoisePlanStep wait in step.Waits)
            waited = waited.Acting(wait.Party, models.Noise(wait.Noise));
        SiteTensor state = waited.Reduced(step.Parties, _basis.Trace);
        double weight = branch.Weight(_basis.Trace);
        LookOf(step).Add(branch.Slots, weight, branch.Factor * Overlap(state, waited, step.Parties));
        _bell.Look(step, waited);
    }

    /// <summary>A branch has come to its end.</summary>
    public void End(Branch branch, double weight)
    {
        bool aborted = branch.Aborted != 0;
        if (_plan.Protocol.Lists is { } lists)
            AddCopy([.. branch.Slots.Take(lists.CopySlots)], weight);
        if (_plan.Protocol.Harm is { } harm && ValueEvaluator.Holds(harm, branch.Slots, _basis.Levels))
            _harm += weight;
        bool success = !aborted && ValueEvaluator.Evaluate(_plan.Protocol.Success, branch.Slots, _basis.Levels) is TruthValue { Truth: true };
        _success += success ? weight : 0;
        _failure += success ? 0 : weight;
        _abort += aborted ? weight : 0;
        if (!success && _plan.Protocol.Lists is null)
            _failures.Add(branch.Slots, weight, 0);
        _ends.Add(branch.Slots, weight, 0);
        _figures.Add(branch.Slots, weight, _basis.Levels);
    }

    private void AddCopy(Value[] slots, double weight)
    {
        string key = string.Join('|', slots.AsEnumerable());
        _copies[key] = new CopyType(slots, weight + (_copies.TryGetValue(key, out CopyType? before) ? before.Probability : 0));
    }

    /// <summary>Everything added up; figures are of kept copies.</summary>
    /// <param name="choice">The engine, for the record.</param>
    /// <param name="inputs">Values of the private inputs.</param>
    /// <param name="lists">Verdicts of the protocol's lists from the law of one copy; null for a protocol on single copies.</param>
    public Evaluation Conclude(EngineChoice choice, IReadOnlyList<Value> inputs, Func<IReadOnlyList<CopyType>, ListEvaluation>? lists)
    {
        double kept = Clip(_success + _failure);
        double heralded = Clip(_looks.GetValueOrDefault("arrived")?.Weight ?? 0);
        double seen = kept + _dropped; // not what was lost subtracted: with a weak detector nearly all is lost
        CheckpointEvaluation[] checkpoints = [.. _labels.Where(_looks.ContainsKey).Select(l => _looks[l].Conclude())];
        CopyType[] copies = [.. _copies.OrderBy(c => c.Key, StringComparer.Ordinal).Select(c => c.Value with { Probability = c.Value.Probability / kept })];
        ListEvaluation? verdicts = kept > 0 ? lists?.Invoke(copies) : null;
        Metrics metrics = new(verdicts?.Success ?? Of(_success), verdicts?.Failure ?? Of(_failure), verdicts?.Abort ?? Of(_abort), kept, checkpoints);
        FigureValues figures = new(_plan.Protocol, metrics, _figures.Of, _bell.Of);
        return new Evaluation
        {
            Engine = choice,
            Inputs = inputs,
            Heralded = heralded,
            Seen = Clip(Ratio(seen, heralded)),
            Kept = Clip(Ratio(kept, seen)),
            Success = metrics.Success,
            Failure = metrics.Failure,
            Abort = metrics.Abort,
            Harm = _plan.Protocol.Harm is null ? null : verdicts?.Harm ?? Of(_harm),
            Copies = copies,
            ListMethod = verdicts?.Method,
            Checkpoints = checkpoints,
            Reports = figures.Reports(),
            Claims = figures.Claims(),
            Ends = [.. _ends.MostProbable(kept, FailuresTold)],
            IntegrationError = _error,
            Failures = [.. _failures.MostProbable(kept, FailuresTold)],
        };
    }

    private Estimate Of(double part) => Estimate.Exact(Clip(Ratio(part, _success + _failure)));

    /// <summary>Round-off beyond the ends of a probability is cut off; anything further out stays to be seen.</summary>
    internal static double Clip(double probability) => probability switch
    {
        > 1 and < 1 + RoundOff => 1,
        < 0 and > -RoundOff => 0,
        _ => probability,
    };

    /// <summary>A fraction of nothing is undefined; it shows as such instead of as 0.</summary>
    internal static double Ratio(double part, double whole) => FigureSum.Ratio(part, whole);

    private Look LookOf(CheckpointPlanStep step)
    {
        if (!_looks.TryGetValue(step.Label, out Look? look))
            _looks[step.Label] = look = new Look(step.Label, step.At.Seconds, new History(_plan.Protocol, true));

        return look;
    }

    /// <summary>⟨S|ρ|S⟩ with the collected maps pulled back onto the target.</summary>
    private double Overlap(SiteTensor state, Branch branch, IReadOnlyList<int> parties)
    {
        SiteTensor target = Target(parties.Count);
        target = new SiteTensor(target.Dimension, parties, target.Data);
        foreach (int party in parties)
        {
            if (branch.Pending[party] is { } map)
                target = target.Apply(party, map.Transposed());
        }

        return target.Dot(state);
    }

    private SiteTensor Target(int parties)
    {
        if (!_targets.TryGetValue(parties, out SiteTensor? target))
        {
            PreparedState state = new() { Parties = parties, Levels = _basis.Levels, Ket = AntisymmetricState.Ket(parties, _basis.Levels) };
            _targets[parties] = target = TensorBuilder.Build(_basis, [.. Enumerable.Range(0, parties)], state, 0);
        }

        return target;
    }
}
