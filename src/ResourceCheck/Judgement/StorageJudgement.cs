using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.Collective;

namespace ResourceCheck.Judgement;

/// <summary>Follows the antisymmetric state, its symmetric counterpart and independent emitters through storage without a photon.</summary>
internal static class StorageJudgement
{
    public static Outcome<StorageResult> Of(StorageRequest request)
    {
        Outcome<ConditionsDocument> read = ConditionsFile.Read(request.Conditions.Name, request.Conditions.Text, request.Overrides);
        if (read.Value is not { } document)
            return Outcome<StorageResult>.Failed(read.Findings);
        Outcome<CollectiveModel> storage = ConditionsFile.Storage(document, request.Emitters);
        if (storage.Value is not { } model)
            return Outcome<StorageResult>.Failed(storage.Findings);
        if (request.Emitters > PhotonFreeStorage.MostEmitters)
            return Outcome<StorageResult>.Failed([JudgementMessages.TooManyEmitters(request.Emitters, PhotonFreeStorage.MostEmitters)]);
        double work = EvolutionCost.WithoutPhoton(model, request.Until ?? model.Time.Seconds);
        return work > EvolutionCost.Most
            ? Outcome<StorageResult>.Failed([JudgementMessages.TooLongToIntegrate("storage", work)])
            : Outcome<StorageResult>.Of(Follow(request, model));
    }

    private static StorageResult Follow(StorageRequest request, CollectiveModel model)
    {
        Couplings couplings = CollectiveDecay.CouplingsOf(model);
        PhotonFreeStorage dark = PhotonFreeStorage.Antisymmetric(couplings), bright = PhotonFreeStorage.Symmetric(couplings);
        double until = request.Until ?? model.Time.Seconds;
        double[] times = [.. Enumerable.Range(0, request.Points).Select(i => until * i / (request.Points - 1))];
        StoragePoint[] points = [.. times.Select(t => Point(t, dark, bright, couplings, model.Tolerance))];
        double error = 2 * Math.Max(dark.Work.ErrorEstimate, bright.Work.ErrorEstimate);
        return new StorageResult
        {
            Version = Provenance.Version,
            Conditions = new InputFile(request.Conditions.Name, request.Conditions.Sha256),
            Overrides = request.Overrides,
            Emitters = request.Emitters,
            Heralded = model.Heralded,
            WithoutShifts = model.IsPoint,
            InitialRates = (PhotonFreeStorage.InitialRate(couplings, ExchangeSign.Odd), PhotonFreeStorage.InitialRate(couplings, ExchangeSign.Even), couplings.TotalRate),
            Points = points,
            ErrorEstimate = error,
            Warnings = [.. StorageAdvice.Of(model, until), .. StorageAdvice.OfError(error)],
        };
    }

    private static StoragePoint Point(double time, PhotonFreeStorage dark, PhotonFreeStorage bright, Couplings couplings, double tolerance)
    {
        StorageFigures odd = dark.AdvanceTo(time, tolerance), even = bright.AdvanceTo(time, tolerance);
        return new StoragePoint(time, odd.NoPhoton, odd.Fidelity, even.NoPhoton, even.Fidelity, PhotonFreeStorage.Independent(couplings, time).NoPhoton);
    }
}
