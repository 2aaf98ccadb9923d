namespace ResourceCheck.Judgement;

/// <summary>Shares of a whole among its parts: L. S. Shapley, in Contributions to the Theory of Games II, 307 (1953).</summary>
internal static class Shapley
{
    /// <summary>Shares from the value of every subset.</summary>
    /// <param name="values">values[S] for the subset S, bit i standing for part i; 2^n entries.</param>
    /// <param name="parts">n.</param>
    /// <returns>n shares; they add up to the value of the whole less that of the empty subset.</returns>
    public static double[] Shares(double[] values, int parts)
    {
        double[] shares = new double[parts];
        for (int subset = 0; subset < values.Length; subset++)
        {
            int size = System.Numerics.BitOperations.PopCount((uint)subset);
            for (int i = 0; i < parts; i++)
            {
                if ((subset & (1 << i)) == 0)
                    shares[i] += Weight(size, parts) * (values[subset | (1 << i)] - values[subset]);
            }
        }

        return shares;
    }

    /// <summary>|S|!(n-|S|-1)!/n!</summary>
    private static double Weight(int size, int parts)
    {
        double weight = 1.0 / parts;
        for (int k = 1; k <= size; k++)
            weight *= (double)k / (parts - k);
        return weight;
    }
}
