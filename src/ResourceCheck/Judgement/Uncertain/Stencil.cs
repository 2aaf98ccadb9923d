namespace ResourceCheck.Judgement.Uncertain;

/// <summary>
/// A first derivative from values at multiples of a step, of second order at the step and at twice the step. The two together give one of
/// higher order and its error: L. F. Richardson, Phil. Trans. R. Soc. A 226, 299 (1927).
/// </summary>
/// <param name="OneSided">Whether all points lie on one side.</param>
/// <param name="Points">Places in steps, with the weights of the value there at one step and at two.</param>
internal sealed record Stencil(bool OneSided, IReadOnlyList<(int Place, double Fine, double Coarse)> Points)
{
    public static Stencil Central { get; } = new(false, [(-2, 0, -1.0 / 4), (-1, -1.0 / 2, 0), (1, 1.0 / 2, 0), (2, 0, 1.0 / 4)]);

    public static Stencil Forward { get; } = new(true, [(0, -3.0 / 2, -3.0 / 4), (1, 2, 0), (2, -1.0 / 2, 1), (4, 0, -1.0 / 4)]);

    public static Stencil Backward { get; } = new(true, [.. Forward.Points.Select(p => (-p.Place, -p.Fine, -p.Coarse))]);

    /// <summary>All of them, the better first.</summary>
    public static IReadOnlyList<Stencil> All { get; } = [Central, Forward, Backward];

    /// <summary>The derivative and its estimated error, per unit of the step.</summary>
    /// <param name="values">Values at the places, in order.</param>
    /// <param name="step">The step.</param>
    public (double Derivative, double Error) Derive(IReadOnlyList<double> values, double step)
    {
        double fine = Points.Zip(values, (p, v) => Weighted(p.Fine, v)).Sum() / step, coarse = Points.Zip(values, (p, v) => Weighted(p.Coarse, v)).Sum() / step;
        return (fine + ((fine - coarse) / 3), Math.Abs(fine - coarse) / 3);
    }

    private static double Weighted(double weight, double value) => weight == 0 ? 0 : weight * value; // 0 times undefined would be undefined
}
