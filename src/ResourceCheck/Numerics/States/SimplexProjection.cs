namespace ResourceCheck.Numerics.States;

/// <summary>
/// The probabilities nearest to some real numbers in the Euclidean sense. With a Hermitian matrix's eigenvalues this gives its nearest
/// density matrix: Smolin, Gambetta and Smith, Phys. Rev. Lett. 108, 070502 (2012).
/// </summary>
internal static class SimplexProjection
{
    /// <summary>
    /// The projection, in the order given. The paper's sum of the cut values starts at 1 - Σμ here, which also mends the sum.
    /// </summary>
    public static double[] Of(double[] mu)
    {
        int[] descending = [.. Enumerable.Range(0, mu.Length).OrderByDescending(i => mu[i])];
        double a = 1 - mu.Sum();
        int kept = mu.Length;
        while (kept > 1 && mu[descending[kept - 1]] + a / kept < 0)
            a += mu[descending[--kept]];
        double[] lambda = new double[mu.Length];
        for (int i = 0; i < kept; i++)
            lambda[descending[i]] = mu[descending[i]] + a / kept;
        return lambda;
    }
}
