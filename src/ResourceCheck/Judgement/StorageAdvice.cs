using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.Collective;

namespace ResourceCheck.Judgement;

/// <summary>Warns where dark is not stable: hardly anything is emitted, and exchange shifts move the state all the same.</summary>
internal static class StorageAdvice
{
    /// <summary>The loss by shifts oscillates, so one time would not show it.</summary>
    private const int Times = 40;

    /// <summary>A state that is this likely to have emitted nothing passes for dark.</summary>
    private const double Dark = 0.9;

    /// <summary>Moved without a photon by this much is worth a warning.</summary>
    private const double Moved = 0.02;

    /// <summary>Integration errors below this are nobody's concern: results are held to 1e-8.</summary>
    private const double Rough = 1e-8;

    /// <summary>Warns where an integration is too rough for its figures to pass as exact.</summary>
    public static IEnumerable<Diagnostic> OfError(double error) => error > Rough ? [JudgementMessages.RoughIntegration(error)] : [];

    /// <summary>Warnings and notes about storage that lasts until a time, s.</summary>
    public static IEnumerable<Diagnostic> Of(CollectiveModel model, double until)
    {
        int emitters = model.Positions.Length;
        if (model.IsPoint)
            yield return JudgementMessages.WithoutShifts();
        if (emitters is < 3 or > PhotonFreeStorage.MostEmitters || until <= 0 || Worst(model, until) is not { } at)
            yield break;
        SymmetryBreaking? breaking = SymmetryBreaking.Of(CollectiveDecay.CouplingsOf(model), at.Time, model.Tolerance);
        if (breaking is not null)
            yield return JudgementMessages.DarkNotStable(at.Time, at.NoPhoton, at.Fidelity, breaking.First + 1, breaking.Second + 1);
    }

    private static StorageFigures? Worst(CollectiveModel model, double until)
    {
        PhotonFreeStorage storage = PhotonFreeStorage.Antisymmetric(CollectiveDecay.CouplingsOf(model));
        StorageFigures worst = Enumerable.Range(1, Times).Select(i => storage.AdvanceTo(until * i / Times, model.Tolerance))
            .Where(f => f.NoPhoton > Dark).DefaultIfEmpty().MaxBy(f => f.NoPhoton - f.Fidelity);
        return worst.NoPhoton - worst.Fidelity > Moved ? worst : null;
    }
}
