using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// exp(tA)ψ by truncated Taylor series in equal steps, after A. H. Al-Mohy and N. J. Higham, SIAM J. Sci. Comput. 33, 488 (2011),
/// with the shift of the generator taken out (their section 3.1) and termination on the terms met (their section 3.2).
/// Departure: the step follows from a bound of the norm that the couplings give, and the tail is bounded rigorously:
/// ‖Σ_{m>k} (hB)^m ψ/m!‖ ≤ ‖(hB)^k ψ/k!‖ · r/(1-r) with r = h‖B‖/(k+1).
/// </summary>
internal static class TaylorEvolution
{
    /// <summary>Tolerance where nobody asked for another: well below the 1e-8 that results are held to, above round-off.</summary>
    public const double DefaultTolerance = 1e-12;

    /// <summary>
    /// Largest h‖B‖. Terms grow to at most e^6 before they fall, which costs less than three digits of sixteen,
    /// and the number of products for unit time hardly falls with longer steps.
    /// </summary>
    private const double LongestStep = 6;

    /// <summary>At h‖B‖ = 6 term 50 is below 1e-25: reached only when a norm is not finite.</summary>
    private const int MostTerms = 60;

    private const double UnitRoundoff = 1.1102230246251565e-16;

    /// <summary>Steps that a time takes.</summary>
    public static int Steps(IGenerator generator, double time) =>
        time == 0 ? 0 : (int)Math.Clamp(Math.Ceiling(generator.Bound * time / LongestStep), 1, int.MaxValue);

    /// <summary>Replaces ψ by exp(tA)ψ, t ≥ 0.</summary>
    public static EvolutionWork Advance(IGenerator generator, Complex[] state, double time, double tolerance = DefaultTolerance)
    {
        int steps = Steps(generator, time);
        EvolutionWork work = new(0, 0, 0, tolerance);
        Complex[] term = new Complex[state.Length], next = new Complex[state.Length];
        for (int i = 0; i < steps; i++)
            work += Step(generator, state, term, next, time / steps, tolerance);
        return work;
    }

    private static EvolutionWork Step(
        IGenerator generator, Complex[] state, Complex[] term, Complex[] next, double h, double tolerance)
    {
        state.CopyTo(term, 0);
        double norm = AmplitudeLoops.Norm(state), allowed = tolerance * norm, size = h * generator.Bound;
        double sizes = norm, tail = norm;
        int k = 0;
        while (tail > allowed && k < MostTerms)
        {
            k++;
            norm = Math.Sqrt(generator.Step(term, next, h / k, state));
            (term, next) = (next, term);
            sizes += norm;
            double ratio = size / (k + 1);
            tail = ratio < 1 ? norm * ratio / (1 - ratio) : double.PositiveInfinity;
        }

        double common = Math.Exp(generator.Shift * h);
        AmplitudeLoops.Scale(state, common);
        return new EvolutionWork(1, k, common * (Finite(tail) + (UnitRoundoff * sizes)), tolerance);
    }

    private static double Finite(double tail) => double.IsFinite(tail) ? tail : double.MaxValue;
}
