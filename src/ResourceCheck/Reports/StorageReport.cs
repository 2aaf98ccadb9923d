using ResourceCheck.Judgement;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>storage</c>.</summary>
internal static class StorageReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(StorageResult storage) => new(
        Headline(storage),
        null,
        [
            new Section("Decay rates at the start", Rates(storage), []),
            new Section("Against storage time (all figures exact)", Curves(storage.Points, shown: true), Remarks(storage)),
        ],
        Curves(storage.Points, shown: false),
        [$"ResourceCheck {storage.Version}; under {Provenance.File(storage.Conditions.Name, storage.Conditions.Sha256)}", .. storage.Overrides.Select(o => $"Set: {o.Key} = {o.Value}"), $"Estimated error of the integration: {FigureText.Number(storage.ErrorEstimate)}"],
        storage.Warnings);

    private static string Headline(StorageResult storage)
    {
        StoragePoint last = storage.Points[^1];
        return $"After {FigureText.Time(last.Time)} side by side, the antisymmetric state of {storage.Emitters} emitters has fidelity {FigureText.Number(last.Fidelity)} (exact); decaying each alone it would be {FigureText.Number(last.Independent)} (exact)."
            + (storage.Heralded ? $" These conditions keep copies without a photon alone, {FigureText.Number(last.NoPhoton)} of all (exact): their fidelity is {FigureText.Number(last.PhotonFreeFidelity)} (exact)." : "");
    }

    private static Table Rates(StorageResult storage) => new(
        [new("state", "State"), new("rate", "Rate"), new("label", "Label")],
        [
            [Cell.Of("antisymmetric"), Cell.Of(storage.InitialRates.Antisymmetric, "/s"), Cell.Of("exact")],
            [Cell.Of("all signs +"), Cell.Of(storage.InitialRates.Symmetric, "/s"), Cell.Of("exact")],
            [Cell.Of("each alone"), Cell.Of(storage.InitialRates.Independent, "/s"), Cell.Of("exact")],
        ],
        Headed: false);

    private static Table Curves(IReadOnlyList<StoragePoint> points, bool shown) => new(
        [
            new("time", "Time", shown ? "" : "s"),
            new("antisymmetric_no_photon", "No photon"),
            new("antisymmetric_fidelity", "Fidelity"),
            new("photon_free_fidelity", "if no photon"),
            new("symmetric_no_photon", "All +, no photon"),
            new("symmetric_fidelity", "All +, fidelity"),
            new("independent", "Each alone"),
        ],
        [.. (shown ? CurveRows.Shown(points) : points).Select(Row)]);

    private static IReadOnlyList<Cell> Row(StoragePoint point) =>
        [Cell.Of(point.Time, "s"), Cell.Of(point.NoPhoton), Cell.Of(point.Fidelity), Cell.Of(point.PhotonFreeFidelity), Cell.Of(point.SymmetricNoPhoton), Cell.Of(point.SymmetricFidelity), Cell.Of(point.Independent)];

    private static IReadOnlyList<string> Remarks(StorageResult storage) =>
    [
        "Fidelity is of all copies: one that emitted a photon adds nothing; \"if no photon\" is of those that emitted none. As one excitation is shared, \"no photon\" is also the population of level 0, summed over the emitters. \"All +\" is the counterpart with all signs +, compared with its own start.",
        .. storage.WithoutShifts ? ["The shape is one point, the limit of no distance: exchange shifts are left out."] : Array.Empty<string>(),
    ];
}
