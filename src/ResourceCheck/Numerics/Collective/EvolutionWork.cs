namespace ResourceCheck.Numerics.Collective;

/// <summary>What an evolution took and how good it is.</summary>
/// <param name="Steps">Time steps.</param>
/// <param name="Products">Applications of the generator.</param>
/// <param name="ErrorEstimate">Bound of the truncation plus an estimate of the round-off: 2-norm of the error of the amplitudes.</param>
/// <param name="Tolerance">What truncation was asked to stay below, relative to the norm at each step's begin.</param>
internal readonly record struct EvolutionWork(int Steps, int Products, double ErrorEstimate, double Tolerance)
{
    /// <summary>Work done one after the other.</summary>
    public static EvolutionWork operator +(EvolutionWork a, EvolutionWork b) => new(
        a.Steps + b.Steps, a.Products + b.Products, a.ErrorEstimate + b.ErrorEstimate, Math.Max(a.Tolerance, b.Tolerance));
}
