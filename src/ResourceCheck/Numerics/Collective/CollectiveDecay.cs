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
    /// probability of that.
    /// </summary>
    public static (Complex[] Density, double Error) Evolve(CollectiveModel model, Complex[] density)
    {
        (Complex[] state, EvolutionWork work) = new MasterEquation(CouplingsOf(model)).Evolve(density, model.Time.Seconds, !model.Heralded, model.Tolerance);
        return (state, work.ErrorEstimate);
    }
}
