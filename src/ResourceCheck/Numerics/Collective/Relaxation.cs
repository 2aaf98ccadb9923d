using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Collective;

/// <summary>Preparation by relaxation: population of |S_N⟩ against time while any start decays collectively.</summary>
internal static class Relaxation
{
    /// <summary>Figures at each of the times, which ascend, and the operator at the last of them.</summary>
    /// <param name="couplings">γ and Ω; the levels must hold |S_N⟩: d ≥ N.</param>
    /// <param name="start">Density operator, d^N × d^N row after row.</param>
    /// <param name="times">From 0 on, ascending.</param>
    /// <param name="photons">False keeps only copies that emit no photon.</param>
    /// <param name="tolerance">See <see cref="MasterEquation.Evolve"/>.</param>
    /// <param name="cancellation">Stops between two times.</param>
    public static (IReadOnlyList<RelaxationFigures> Figures, Complex[] Last) Follow(
        Couplings couplings, Complex[] start, IReadOnlyList<double> times, bool photons = true,
        double tolerance = TaylorEvolution.DefaultTolerance, CancellationToken cancellation = default)
    {
        Complex[] target = AntisymmetricState.Ket(couplings.Emitters, couplings.Levels), bright = [.. target.Select(a => (Complex)a.Magnitude)];
        Complex[] last = start;
        List<RelaxationFigures> figures = [];
        foreach ((Complex[] rho, EvolutionWork work) in new MasterEquation(couplings).Follow(start, times, photons, tolerance))
        {
            cancellation.ThrowIfCancellationRequested();
            last = rho;
            figures.Add(Figures(couplings, target, bright, rho, times[figures.Count], work.ErrorEstimate));
        }

        return (figures, last);
    }

    private static RelaxationFigures Figures(Couplings couplings, Complex[] target, Complex[] bright, Complex[] rho, double time, double error)
    {
        double kept = 0, excitations = 0;
        for (int i = 0; i < target.Length; i++)
        {
            double population = rho[(i * target.Length) + i].Real;
            kept += population;
            excitations += population * Excited(i, couplings.Levels, couplings.Emitters);
        }

        return new RelaxationFigures(time, Expectation(target, rho), Expectation(bright, rho), kept, excitations, error);
    }

    private static double Expectation(Complex[] ket, Complex[] rho)
    {
        Complex sum = Complex.Zero;
        for (int r = 0; r < ket.Length; r++)
        {
            if (ket[r] != Complex.Zero)
                sum += Complex.Conjugate(ket[r]) * Row(ket, rho.AsSpan(r * ket.Length, ket.Length));
        }

        return sum.Real;
    }

    private static Complex Row(Complex[] ket, ReadOnlySpan<Complex> row)
    {
        Complex sum = Complex.Zero;
        for (int c = 0; c < ket.Length; c++)
            sum += row[c] * ket[c];
        return sum;
    }

    private static int Excited(int index, int d, int emitters)
    {
        int excited = 0;
        for (int i = 0; i < emitters; i++, index /= d)
            excited += index % d == 0 ? 1 : 0;
        return excited;
    }
}
