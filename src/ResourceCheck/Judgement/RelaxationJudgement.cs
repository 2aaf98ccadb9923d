using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Numerics.States;
using ResourceCheck.Resources;

namespace ResourceCheck.Judgement;

/// <summary>Follows a start through shared decay, beside emitters that decay each alone.</summary>
internal static class RelaxationJudgement
{
    public static Outcome<RelaxationResult> Of(RelaxationRequest request)
    {
        Outcome<ConditionsDocument> read = ConditionsFile.Read(request.Conditions.Name, request.Conditions.Text, request.Overrides);
        if (read.Value is not { } document)
            return Outcome<RelaxationResult>.Failed(read.Findings);
        Outcome<RelaxedPreparation> relaxed = ConditionsFile.Relaxation(document, request.Emitters);
        if (relaxed.Value is not { } preparation)
            return Outcome<RelaxationResult>.Failed(relaxed.Findings);
        if (request.Emitters > AntisymmetricState.MostParties)
            return Outcome<RelaxationResult>.Failed([JudgementMessages.TooManyToRelax(request.Emitters, AntisymmetricState.MostParties)]);
        double work = EvolutionCost.WithoutPhoton(preparation.Decay, request.Until ?? preparation.Decay.Time.Seconds);
        if (work > EvolutionCost.Most)
            return Outcome<RelaxationResult>.Failed([JudgementMessages.TooLongToIntegrate("resource.relaxed", work)]);
        Outcome<PreparedState> start = RelaxedPrepared.Start(preparation.Start, request.Emitters);
        return start.Value is { } state
            ? new Outcome<RelaxationResult>(Follow(request, preparation, state), start.Findings)
            : Outcome<RelaxationResult>.Failed(start.Findings);
    }

    private static RelaxationResult Follow(RelaxationRequest request, RelaxedPreparation preparation, PreparedState start)
    {
        CollectiveModel model = preparation.Decay;
        double until = request.Until ?? model.Time.Seconds;
        double[] times = [.. Enumerable.Range(0, request.Points).Select(i => until * i / (request.Points - 1))];
        RelaxationCurve together = Curve(CollectiveDecay.CouplingsOf(model), start, times, request, model.Tolerance);
        RelaxationCurve alone = Curve(Couplings.Independent(request.Emitters, [.. model.Transitions.Select(t => t.Rate.PerSecond)]), start, times, request, model.Tolerance);
        bool sampled = together.IsSampled || alone.IsSampled;
        return new RelaxationResult
        {
            Version = Provenance.Version,
            Conditions = new InputFile(request.Conditions.Name, request.Conditions.Sha256),
            Overrides = request.Overrides,
            Emitters = request.Emitters,
            Start = Words(preparation.Start),
            Heralded = model.Heralded,
            WithoutShifts = model.IsPoint,
            Method = together.Method,
            Seed = sampled ? request.Seed : null,
            Samples = sampled ? request.Samples : null,
            Points = [.. times.Select((t, i) => Point(t, together, alone, i))],
            ErrorEstimate = Math.Max(together.Error, alone.Error),
            Warnings = [.. model.IsPoint ? [JudgementMessages.WithoutShifts()] : Array.Empty<Diagnostic>(), .. StorageAdvice.OfError(Math.Max(together.Error, alone.Error))],
        };
    }

    private static RelaxationCurve Curve(Couplings couplings, PreparedState start, double[] times, RelaxationRequest request, double tolerance) =>
        request.Emitters <= RelaxedPrepared.MostParties
            ? RelaxationCurve.Exact(couplings, start, times, tolerance, request.Cancellation)
            : RelaxationCurve.ByTrajectories(couplings, start, times, tolerance, request);

    private static RelaxationPoint Point(double time, RelaxationCurve together, RelaxationCurve alone, int i) => new(
        time, together.Antisymmetric[i], together.Symmetric[i], alone.Antisymmetric[i], together.PhotonFree[i].Kept, together.PhotonFree[i].Fidelity, together.Excited[i]);

    private static string Words(RelaxedStart start) => start switch
    {
        { File: { } file } => $"the state in {Path.GetFileName(file)}",
        { Bystanders: { Count: 0 } } => "the antisymmetric pair",
        { Bystanders: { } bystanders } => $"a pair in the antisymmetric state beside {Levels(bystanders)}",
        _ => $"emitters in {Levels(start.Levels!)}",
    };

    private static string Levels(IReadOnlyList<int> levels) => $"{(levels.Count == 1 ? "level" : "levels")} {string.Join(", ", levels)}";
}
