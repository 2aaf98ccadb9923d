using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>A number with an estimate of what rounding has done to it.</summary>
/// <param name="Value">The number.</param>
/// <param name="Error">Estimated absolute error.</param>
internal readonly record struct RoundedSum(Complex Value, double Error)
{
    /// <summary>The number times a factor.</summary>
    public RoundedSum Times(double factor) => new(Value * factor, Error * Math.Abs(factor));

    /// <summary>Sum of two numbers; their errors add up at worst.</summary>
    public static RoundedSum operator +(RoundedSum a, RoundedSum b) => new(a.Value + b.Value, a.Error + b.Error);
}
