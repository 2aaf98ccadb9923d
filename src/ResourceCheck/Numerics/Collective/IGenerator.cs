using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>A linear map A = s·1 + B that generates exp(tA), with the multiple of the identity taken out.</summary>
internal interface IGenerator
{
    /// <summary>Number of amplitudes.</summary>
    public int Size { get; }

    /// <summary>s, real here: decay that all amplitudes have in common.</summary>
    public double Shift { get; }

    /// <summary>An upper bound of the 2-norm of B.</summary>
    public double Bound { get; }

    /// <summary>target = scale·B·source, then sum += target. Returns ‖target‖² (2-norm). The three arrays are different ones.</summary>
    public double Step(Complex[] source, Complex[] target, double scale, Complex[] sum);
}
