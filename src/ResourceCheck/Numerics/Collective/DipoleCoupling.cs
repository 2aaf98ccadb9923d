namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Coupling of two equal transitions with parallel dipoles through the free field, relative to the linewidth Γ of one emitter:
/// R. H. Lehmberg, Phys. Rev. A 2, 883 (1970). With ξ = 2πr/λ and c the cosine between dipole and separation,
/// γ/Γ = (3/2){(1-c²) sin ξ/ξ + (1-3c²)[cos ξ/ξ² - sin ξ/ξ³]} and Ω/Γ = (3/4){-(1-c²) cos ξ/ξ + (1-3c²)[sin ξ/ξ² + cos ξ/ξ³]}.
/// γ is the rate of decay that both share (not half of it); Ω multiplies σ†_i σ_k + σ†_k σ_i in H/ħ.
/// </summary>
internal static class DipoleCoupling
{
    /// <summary>Below this the bracket of γ loses more than a digit to cancellation; the series has fallen below round-off by its last term.</summary>
    private const double SeriesUpTo = 1.5;

    private const int SeriesTerms = 14;

    /// <summary>γ/Γ; 1 at ξ = 0 whatever the direction.</summary>
    public static double SharedDecay(double xi, double cosine)
    {
        double c2 = cosine * cosine;
        return 1.5 * (((1 - c2) * SineOver(xi)) - ((1 - (3 * c2)) * FirstBesselOver(xi)));
    }

    /// <summary>Ω/Γ; grows as 1/ξ³ and has no value at ξ = 0.</summary>
    public static double ExchangeShift(double xi, double cosine)
    {
        double c2 = cosine * cosine;
        (double sine, double cosineOfXi) = Math.SinCos(xi);
        return 0.75 * ((-(1 - c2) * cosineOfXi / xi) + ((1 - (3 * c2)) * ((sine / xi) + (cosineOfXi / (xi * xi))) / xi));
    }

    private static double SineOver(double xi) => xi == 0 ? 1 : Math.Sin(xi) / xi;

    /// <summary>sin ξ/ξ³ - cos ξ/ξ² = j_1(ξ)/ξ = Σ_k (-1)^k ξ^{2k} / (2^k k! (2k+3)!!).</summary>
    private static double FirstBesselOver(double xi)
    {
        double square = xi * xi;
        if (xi > SeriesUpTo)
            return ((Math.Sin(xi) / xi) - Math.Cos(xi)) / square;
        double term = 1.0 / 3, sum = term;
        for (int k = 1; k < SeriesTerms; k++)
        {
            term *= -square / (2 * k * ((2 * k) + 3));
            sum += term;
        }

        return sum;
    }
}
