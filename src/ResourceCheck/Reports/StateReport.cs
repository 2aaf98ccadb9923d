using ResourceCheck.Engines;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>state</c>: what a prepared state is, and what mending changed.</summary>
internal static class StateReport
{
    /// <summary>Trace distances below this are the decomposition's round-off.</summary>
    private const double NotMended = 1e-12;

    /// <summary>Builds the report.</summary>
    public static Report From(StateDescription state, string version) => new(
        Headline(state),
        null,
        [
            new Section(null, Figures(state), []),
            .. state.MendedBy is { } by ? [Section.Of(Mending(by, state.IsStateAsRead))] : Array.Empty<Section>(),
            Section.Of(Validity(state)),
            .. state.Populations.Count == 0 ? [] : new[] { new Section("Largest populations", Populations(state), []) },
        ],
        Data(state),
        [$"ResourceCheck {version}; {Provenance.File(state.File, state.Sha256)}"],
        []);

    private static string Headline(StateDescription state)
    {
        string kind = state.IsVector ? "a state vector" : "a density matrix";
        string fidelity = state.Figures.FirstOrDefault(f => f.Name == "fidelity") is { } figure
            ? $"; its fidelity with the antisymmetric state is {FigureText.Number(figure.Mended ?? figure.Value)} ({Truth.Name(figure.Label)})"
                + (figure.Mended is null ? "" : $" once mended, {FigureText.Number(figure.Value)} as read") : "";
        return $"{state.File} holds {kind} of {state.Parties} qudits with {state.Levels} levels each{fidelity}.";
    }

    private static string Mending(double by, bool isState) => by < NotMended
        ? "Nothing needed mending: the nearest density matrix is the one read."
        : isState ? $"The file holds a state within round-off; mending moved it by a trace distance of {FigureText.Number(by)}, which is of no account."
        : $"Mended to the nearest density matrix, a trace distance of {FigureText.Number(by)} away; nothing is certified from a mended state.";

    private static string Validity(StateDescription state) => state.IsVector
        ? $"As read: the norm squared is off 1 by {FigureText.Number(state.Validity.Trace)}."
        : $"As read: off a Hermitian matrix by {FigureText.Number(state.Validity.Hermitian)}, off trace 1 by {FigureText.Number(state.Validity.Trace)}, "
            + $"lowest eigenvalue {FigureText.Number(state.Validity.LowestEigenvalue)}.";

    private static Table Figures(StateDescription state) => new(
        [new("quantity", "Figure"), new("value", state.MendedBy is null ? "Value" : "As read"), new("mended", "Mended"), new("label", "Label")],
        [.. state.Figures.Select(f => Row(f, f.Label == TruthLabel.Bound ? "bound, at least" : Truth.Name(f.Label)))]);

    // Figures of a state are sums of terms of order one, so what is below their round-off shows as 0.
    // A bound in a state's description is a fidelity found by search: the true one is at least that.
    private static IReadOnlyList<Cell> Row(StateFigure figure, string label)
    {
        Rounding rounding = figure.Label == TruthLabel.Bound ? Rounding.Down : Rounding.Nearest;
        return [Cell.Of(figure.Name), new DifferenceCell(figure.Value, rounding, ""), figure.Mended is { } mended ? new DifferenceCell(mended, rounding, "") : Cell.Empty, Cell.Of(label)];
    }

    private static Table Data(StateDescription state) => new(
        [new("quantity", "Quantity"), new("value", "Value"), new("mended", "Mended"), new("label", "Label")],
        [
            .. state.Figures.Select(f => Row(f, Truth.Name(f.Label))),
            .. state.Populations.Select(p => (IReadOnlyList<Cell>)[Cell.Of($"population {p.Levels}"), Cell.Of(p.Value), Cell.Of(p.Mended), Cell.Of("exact")]),
        ]);

    private static Table Populations(StateDescription state) => new(
        [new("levels", "Levels"), new("population", state.MendedBy is null ? "Population" : "As read"), new("mended", "Mended"), new("label", "Label")],
        [.. state.Populations.Select(p => (IReadOnlyList<Cell>)[Cell.Of(p.Levels), Cell.Of(p.Value), Cell.Of(p.Mended), Cell.Of("exact")])]);
}
