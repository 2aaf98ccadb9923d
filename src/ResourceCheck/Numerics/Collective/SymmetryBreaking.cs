namespace ResourceCheck.Numerics.Collective;

/// <summary>The pair of emitters whose exchange shift breaks the symmetry most, and what that does to |S_N⟩.</summary>
/// <param name="First">Emitter, from 0.</param>
/// <param name="Second">The other emitter.</param>
/// <param name="Transition">Transition (from 1) with the largest deviation.</param>
/// <param name="Shift">Ω of that pair and transition.</param>
/// <param name="MeanShift">Mean of Ω over all pairs, same transition.</param>
/// <param name="Stored">Figures at the given time.</param>
/// <param name="WithMean">Figures if that pair had the mean shift in every transition.</param>
/// <param name="AllMean">Figures if every pair had it: what is lost then is decay alone.</param>
internal sealed record SymmetryBreaking(
    int First,
    int Second,
    int Transition,
    double Shift,
    double MeanShift,
    StorageFigures Stored,
    StorageFigures WithMean,
    StorageFigures AllMean)
{
    /// <summary>Equivalent pairs differ by rounding; the first of them is named.</summary>
    private const double Tie = 1e-9;

    /// <summary>|Ω - mean Ω|; 0 where all pairs are equivalent.</summary>
    public double Deviation => Math.Abs(Shift - MeanShift);

    /// <summary>Probability that no photon was emitted and the state has moved all the same: large where dark is not stable.</summary>
    public double MovedWithoutPhoton => Stored.NoPhoton - Stored.Fidelity;

    /// <summary>Finds the pair; null when there is no shift at all, or two emitters only.</summary>
    public static SymmetryBreaking? Of(Couplings couplings, double time, double tolerance = TaylorEvolution.DefaultTolerance)
    {
        double[] means = [.. couplings.Shift.Select(Mean)];
        if (couplings.Emitters < 3 || !couplings.Shift.Any(omega => omega.Cast<double>().Any(x => x != 0)))
            return null;
        (int j, int first, int second) = Worst(couplings, means);
        Couplings withMean = couplings.WithShifts((t, i, k, old) => i == first && k == second ? means[t - 1] : old);
        return new SymmetryBreaking(
            first, second, j, couplings.Shift[j - 1][first, second], means[j - 1],
            Figures(couplings, time, tolerance),
            Figures(withMean, time, tolerance),
            Figures(couplings.WithShifts((t, _, _, _) => means[t - 1]), time, tolerance));
    }

    private static StorageFigures Figures(Couplings couplings, double time, double tolerance) =>
        PhotonFreeStorage.Antisymmetric(couplings).AdvanceTo(time, tolerance);

    /// <summary>Transitions to levels that |S_N⟩ leaves empty exchange nothing.</summary>
    private static (int Transition, int First, int Second) Worst(Couplings couplings, double[] means)
    {
        (int Transition, int First, int Second) worst = (1, 0, 1);
        double largest = 0;
        for (int j = 1; j < couplings.Emitters; j++)
        {
            foreach ((int i, int k) in Pairs(couplings.Emitters))
            {
                double deviation = Math.Abs(couplings.Shift[j - 1][i, k] - means[j - 1]);
                if (deviation > largest * (1 + Tie))
                    (largest, worst) = (deviation, (j, i, k));
            }
        }

        return worst;
    }

    private static double Mean(double[,] omega) => omega.Cast<double>().Sum() / (omega.GetLength(0) * (omega.GetLength(0) - 1.0));

    private static IEnumerable<(int First, int Second)> Pairs(int count)
    {
        for (int i = 0; i < count; i++)
        {
            for (int k = i + 1; k < count; k++)
                yield return (i, k);
        }
    }
}
