using System.Numerics;
using ResourceCheck.Conditions;

namespace ResourceCheck.Numerics.Collective;

/// <summary>From a collective model of the conditions to couplings and evolved states.</summary>
internal static class CollectiveDecay
{
    /// <summary>Couplings in 1/s.</summary>
    public static Couplings CouplingsOf(CollectiveModel model) => Couplings.From(ShapeOf(model), TransitionsOf(model));

    public static EmitterShape ShapeOf(CollectiveModel model) => model.IsPoint ? EmitterShape.Point(model.Positions.Length) : EmitterShape.At(model.Positions);

    public static IReadOnlyList<Transition> TransitionsOf(CollectiveModel model) =>
        [.. model.Transitions.Select(t => new Transition(t.Rate.PerSecond, t.Wavelength, t.Dipole))];

    /// <summary>
    /// The density operator after the model's time, d^N × d^N row after row. Heralded: the part that emitted no photon, whose trace is the
    /// probability of that. The error is that of any probability found in it, of the copies that are kept.
    /// </summary>
    public static (Complex[] Density, double Error) Evolve(CollectiveModel model, Complex[] density)
    {
        (Complex[] state, EvolutionWork work) = new MasterEquation(CouplingsOf(model)).Evolve(density, model.Time.Seconds, !model.Heralded, model.Tolerance);
        int size = (int)Math.Round(Math.Sqrt(density.Length));
        double error = ProbabilityError(work.ErrorEstimate, size);
        return (state, Math.Min(1, model.Heralded ? 2 * error / Trace(state, size) : error)); // no probability is off by more than 1
    }

    /// <summary>
    /// Bound of |tr Tδ| for an effect 0 ≤ T ≤ 1 from the 2-norms of the sectors of δ: ‖T‖₂ ≤ √D, and a sector beside the diagonal
    /// stands for its adjoint too, which makes its norm √2 as large.
    /// </summary>
    internal static double ProbabilityError(double error, int dimension) => Math.Sqrt(2.0 * dimension) * error;

    /// <summary>Trace of a D×D operator.</summary>
    internal static double Trace(Complex[] operatorEntries, int dimension)
    {
        double trace = 0;
        for (int i = 0; i < dimension; i++)
            trace += operatorEntries[(i * dimension) + i].Real;
        return trace;
    }
}
