using ResourceCheck.Engines.Figures;
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
    private double _success, _failure, _abort, _dropped, _error;

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

    /// <summary>Estimated error of integrating collective decay.</summary>
    public void IntegrationError(double error) => _error = Math.Max(_error, error);

    /// <summary>A look at a checkpoint in one branch.</summary>
    public void Look(CheckpointPlanStep step, Branch branch, LocalModels models)
    {
        Branch waited = branch;
        foreach (NoisePlanStep wait in step.Waits)
            waited = waited.Acting(wait.Party, models.Noise(wait.Noise));
        SiteTensor state = waited.Reduced(step.Parties, _basis.Trace);
        double weight = branch.Weight(_basis.Trace);
        LookOf(step).Add(branch, weight, branch.Factor * Overlap(state, waited, step.Parties));
        _bell.Look(step, waited);
    }

    /// <summary>A branch has come to its end.</summary>
    public void End(Branch branch, double weight)
    {
        bool aborted = branch.Aborted != 0;
        bool success = !aborted && ValueEvaluator.Evaluate(_plan.Protocol.Success, branch.Slots, _basis.Levels) is TruthValue { Truth: true };
        _success += success ? weight : 0;
        _failure += success ? 0 : weight;
        _abort += aborted ? weight : 0;
        if (!success)
            _failures.Add(branch.Slots, weight, 0);
        _ends.Add(branch.Slots, weight, 0);
        _figures.Add(branch.Slots, weight, _basis.Levels);
    }

    /// <summary>Everything added up; figures are of kept copies.</summary>
    public Evaluation Conclude(EngineChoice choice, IReadOnlyList<Value> inputs)
    {
        double kept = Clip(_success + _failure);
        double heralded = Clip(_looks.GetValueOrDefault("arrived")?.Weight ?? 0);
        double seen = kept + _dropped; // not what was lost subtracted: with a weak detector nearly all is lost
        CheckpointEvaluation[] checkpoints = [.. _labels.Where(_looks.ContainsKey).Select(l => _looks[l].Conclude())];
        Metrics metrics = new(Clip(Ratio(_success, _success + _failure)), Clip(Ratio(_failure, _success + _failure)), Clip(Ratio(_abort, _success + _failure)), kept, checkpoints);
        FigureValues figures = new(_plan.Protocol, metrics, _figures, _bell);
        return new Evaluation
        {
            Engine = choice,
            Inputs = inputs,
            Heralded = heralded,
            Seen = Clip(Ratio(seen, heralded)),
            Kept = Clip(Ratio(kept, seen)),
            Success = Estimate.Exact(metrics.Success),
            Failure = Estimate.Exact(metrics.Failure),
            Abort = Estimate.Exact(metrics.Abort),
            Checkpoints = checkpoints,
            Reports = figures.Reports(),
            Claims = figures.Claims(),
            Ends = [.. _ends.MostProbable(kept, FailuresTold)],
            IntegrationError = _error,
            Failures = [.. _failures.MostProbable(kept, FailuresTold)],
        };
    }

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
