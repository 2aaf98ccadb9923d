using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Relaxation of more emitters than density operators fit for. What becomes of copies without a photon is one state vector and exact;
/// what photons add is a mean over <see cref="QuantumJumps"/>. A photon takes one excitation, and |S_N⟩ holds one: a start with at most
/// one excitation leaves nothing to sample.
/// </summary>
internal sealed class SampledRelaxation
{
    private readonly EmitterSpace _space;
    private readonly EmitterState _start;
    private readonly QuantumJumps _jumps;
    private readonly ulong _oneEach;
    private readonly double[] _signs;
    private readonly double _tolerance;

    /// <param name="couplings">γ and Ω, with as many levels as emitters.</param>
    /// <param name="start">d^N amplitudes of norm 1; the first emitter is the most significant digit.</param>
    /// <param name="tolerance">Truncation of each no-photon step.</param>
    public SampledRelaxation(Couplings couplings, Complex[] start, double tolerance = TaylorEvolution.DefaultTolerance)
    {
        _jumps = new QuantumJumps(couplings, start, tolerance);
        _space = _jumps.Space;
        _start = EmitterState.From(_space, start);
        _tolerance = tolerance;
        _oneEach = EmitterSpace.Key([.. Enumerable.Repeat(1, couplings.Levels)]);
        _signs = [.. _space.Block(_oneEach).Codes.Select(Sign)];
    }

    /// <summary>Whether a photon leaves nothing that these figures ask for.</summary>
    public bool NothingToSample => _start.Blocks.Keys.All(key => EmitterSpace.Count(key, 0) <= 1);

    /// <summary>Figures of the copies without a photon, unnormalised, at times that ascend from 0 on.</summary>
    public IReadOnlyList<RelaxationFigures> WithoutPhoton(IReadOnlyList<double> times)
    {
        EmitterState state = _start.Copy();
        List<RelaxationFigures> figures = [];
        double now = 0, error = 0;
        foreach (double time in times)
        {
            error += state.Advance(time - now, _tolerance).ErrorEstimate;
            now = time;
            figures.Add(Of(state, time, 2 * error));
        }

        return figures;
    }

    /// <summary>
    /// What copies with a photon add at each of the times: means over trajectories 0 … count-1 of the population of |S_N⟩, of its
    /// counterpart with all signs +, and of the fraction of excited emitters. Each interval holds by itself with the confidence.
    /// </summary>
    public IReadOnlyList<(SampledMean Population, SampledMean Symmetric, SampledMean Excited)> WithPhotons(
        IReadOnlyList<double> times, ulong seed, int count, double confidence, CancellationToken cancellation)
    {
        RelaxationFigures[][] found = [.. times.Select(_ => new RelaxationFigures[count])]; // zero until a photon
        Parallel.For(0, count, new ParallelOptions { CancellationToken = cancellation }, index => _jumps.Run(times, seed, index, (i, state, photons) =>
        {
            if (photons > 0)
                found[i][index] = Normalised(Of(state, times[i], 0));
        }));
        return [.. found.Select(f => (Mean(f, x => x.Population), Mean(f, x => x.Symmetric), Mean(f, x => x.Excitations / _space.Emitters)))];

        SampledMean Mean(RelaxationFigures[] figures, Func<RelaxationFigures, double> value) => SampledMean.From([.. figures.Select(value)], confidence);
    }

    private static RelaxationFigures Normalised(RelaxationFigures f) => new(f.Time, f.Population / f.Kept, f.Symmetric / f.Kept, 1, f.Excitations / f.Kept, f.ErrorEstimate);

    private RelaxationFigures Of(EmitterState state, double time, double error)
    {
        double kept = 0, excitations = 0;
        foreach ((ulong key, Complex[] amplitudes) in state.Blocks)
        {
            double norm = AmplitudeLoops.NormSquared(amplitudes);
            kept += norm;
            excitations += norm * EmitterSpace.Count(key, 0);
        }

        (double odd, double even) = state.Blocks.TryGetValue(_oneEach, out Complex[]? each) ? Overlaps(each) : (0, 0);
        return new RelaxationFigures(time, odd, even, kept, excitations, error);
    }

    private (double Odd, double Even) Overlaps(Complex[] amplitudes)
    {
        Complex odd = Complex.Zero, even = Complex.Zero;
        for (int q = 0; q < amplitudes.Length; q++)
        {
            odd += _signs[q] * amplitudes[q];
            even += amplitudes[q];
        }

        return (Squared(odd) / amplitudes.Length, Squared(even) / amplitudes.Length);
    }

    private double Sign(ulong code) => Permutations.Sign([.. Enumerable.Range(0, _space.Emitters).Select(i => WordBlock.Letter(code, i))]);

    private static double Squared(Complex z) => (z.Real * z.Real) + (z.Imaginary * z.Imaginary);
}
