using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>What the checks of a state found.</summary>
/// <param name="Validity">Deviation from Hermitian, of the trace from 1, lowest eigenvalue (or, for large matrices, a lower bound of it).</param>
/// <param name="Original">The state as read: of unit trace when within tolerances, else its Hermitian part as it is.</param>
/// <param name="Mended">The nearest state; null unless asked for.</param>
/// <param name="MendedBy">Trace distance between the matrix as read and the mended one; null unless asked for.</param>
internal sealed record CheckedState(
    (double Hermitian, double Trace, double LowestEigenvalue) Validity, PreparedState Original, PreparedState? Mended, double? MendedBy)
{
    /// <summary>Whether the numbers are a state as they are, within the tolerances.</summary>
    public bool IsStateAsRead { get; init; } = true;
}

/// <summary>Checks that numbers are a state, and mends small violations when asked to.</summary>
internal static class StateCheck
{
    /// <summary>The checked state, or everything that keeps the numbers from being one.</summary>
    /// <param name="file">Name for messages.</param>
    /// <param name="raw">The numbers as read.</param>
    /// <param name="mend">Whether small violations are mended.</param>
    /// <param name="figures">Whether the lowest eigenvalue itself is wanted, not only that it is above the tolerance, which takes a tenth of the time.</param>
    public static Outcome<CheckedState> Check(string file, RawState raw, bool mend, bool figures) =>
        raw.Shape.IsVector ? CheckVector(file, raw, mend) : CheckDensity(file, raw, mend, figures);

    private static Outcome<CheckedState> CheckVector(string file, RawState raw, bool mend)
    {
        double square = raw.Numbers.Sum(a => a.Real * a.Real + a.Imaginary * a.Imaginary);
        double deviation = Math.Abs(square - 1);
        bool fits = deviation <= StateTolerances.For(raw).Trace;
        if (!fits && !(mend && deviation <= StateTolerances.Mendable))
            return Outcome<CheckedState>.Failed([StateMessages.Norm(file, square, StateTolerances.For(raw).Trace)]);
        PreparedState normalised = State(raw.Shape, Scale(raw.Numbers, 1 / Math.Sqrt(square)));
        PreparedState original = fits ? normalised : State(raw.Shape, raw.Numbers);
        CheckedState found = new((0, deviation, 0), original, mend ? normalised : null, mend ? deviation / 2 : null) { IsStateAsRead = fits };
        return new(found, fits ? [] : [StateMessages.Mended(file, deviation / 2)]);
    }

    private static Outcome<CheckedState> CheckDensity(string file, RawState raw, bool mend, bool figures)
    {
        int size = raw.Shape.Dimension;
        StateTolerances tolerances = StateTolerances.For(raw);
        Complex[] hermitian = HermitianMatrix.HermitianPart(raw.Numbers, size);
        bool decomposed = size <= HermitianMatrix.LargestDecomposed;
        double bound = decomposed && (figures || mend) ? double.NegativeInfinity : Bound(hermitian, size, tolerances.Negative);
        double lowest = decomposed && double.IsInfinity(bound) ? HermitianMatrix.Eigenvalues(hermitian, size)[0] : bound;
        (double Deviation, int, int) asymmetry = HermitianMatrix.LargestAsymmetry(raw.Numbers, size);
        Complex trace = HermitianMatrix.Trace(raw.Numbers, size);
        List<Diagnostic> wrong = [.. Violations(file, raw, asymmetry, trace, lowest)];
        double[] deviations = [asymmetry.Deviation, Complex.Abs(trace - 1), -lowest];
        if (wrong.Count > 0 && !(mend && decomposed && deviations.All(x => x <= StateTolerances.Mendable)))
            return Outcome<CheckedState>.Failed(mend && !decomposed ? [.. wrong, StateMessages.MendTooLarge(file, size)] : wrong);
        PreparedState original = State(raw.Shape, wrong.Count == 0 ? Scale(hermitian, 1 / trace.Real) : hermitian);
        CheckedState found = new((asymmetry.Deviation, Complex.Abs(trace - 1), lowest), original, null, null) { IsStateAsRead = wrong.Count == 0 };
        IReadOnlyList<Diagnostic> notes = decomposed ? [] : [StateMessages.NotDecomposed(file, size, tolerances.Negative)];
        return mend ? Mend(file, raw, found, notes) : new(found, notes);
    }

    private static IEnumerable<Diagnostic> Violations(
        string file, RawState raw, (double Deviation, int Row, int Column) asymmetry, Complex trace, double lowest)
    {
        StateTolerances tolerances = StateTolerances.For(raw);
        if (asymmetry.Deviation > tolerances.Hermitian)
            yield return StateMessages.NotHermitian(file, asymmetry, tolerances.Hermitian);
        if (Complex.Abs(trace - 1) > tolerances.Trace)
            yield return StateMessages.Trace(file, trace, tolerances.Trace);
        if (lowest < -tolerances.Negative)
            yield return StateMessages.Negative(file, lowest, tolerances.Negative);
    }

    /// <summary>-tolerance when the lowest eigenvalue is above it, else minus infinity.</summary>
    private static double Bound(Complex[] hermitian, int size, double tolerance) =>
        Cholesky.IsAbove(hermitian, size, tolerance) ? -tolerance : double.NegativeInfinity;

    /// <summary>A large matrix is mended only where nothing needs to be: then it is its own nearest state within the tolerances.</summary>
    private static Outcome<CheckedState> Mend(string file, RawState raw, CheckedState found, IReadOnlyList<Diagnostic> notes)
    {
        int size = raw.Shape.Dimension;
        if (size > HermitianMatrix.LargestDecomposed)
            return new(found with { Mended = found.Original, MendedBy = 0 }, notes);
        Complex[] hermitian = HermitianMatrix.HermitianPart(raw.Numbers, size);
        Complex[] nearest = HermitianMatrix.WithEigenvalues(hermitian, size, SimplexProjection.Of);
        Complex[] change = [.. raw.Numbers.Zip(nearest, (a, b) => a - b)];
        double by = HermitianMatrix.TraceNorm(change, size) / 2;
        return new(found with { Mended = State(raw.Shape, nearest), MendedBy = by }, found.IsStateAsRead ? notes : [.. notes, StateMessages.Mended(file, by)]);
    }

    private static Complex[] Scale(Complex[] numbers, double factor) => [.. numbers.Select(number => number * factor)];

    private static PreparedState State(StateShape shape, Complex[] numbers) => new()
    {
        Parties = shape.Parties,
        Levels = shape.Levels,
        Ket = shape.IsVector ? numbers : null,
        Density = shape.IsVector ? null : numbers,
    };
}
