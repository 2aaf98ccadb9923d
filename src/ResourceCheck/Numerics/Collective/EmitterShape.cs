namespace ResourceCheck.Numerics.Collective;

/// <summary>Where the emitters sit. Lengths are in any one unit: metres, or the wavelength of transition 1.</summary>
internal sealed class EmitterShape
{
    private EmitterShape(double[][] positions, bool isPoint)
    {
        Positions = positions;
        IsPoint = isPoint;
    }

    /// <summary>Three coordinates for each emitter.</summary>
    public double[][] Positions { get; }

    /// <summary>The limit of one point: γ = Γ for every pair. Exchange shifts, which diverge there, are left out.</summary>
    public bool IsPoint { get; }

    /// <summary>Number of emitters.</summary>
    public int Count => Positions.Length;

    /// <summary>All emitters at one point.</summary>
    public static EmitterShape Point(int count) => new(Build(count, _ => [0, 0, 0]), true);

    /// <summary>Two emitters on the x axis.</summary>
    public static EmitterShape Pair(double spacing) => Chain(2, spacing);

    /// <summary>Emitters on the x axis, equally far apart.</summary>
    public static EmitterShape Chain(int count, double spacing) => new(Build(count, i => [i * spacing, 0, 0]), false);

    /// <summary>A regular polygon in the x-y plane whose sides have the given length; three emitters make the equilateral triangle.</summary>
    public static EmitterShape Ring(int count, double spacing)
    {
        if (count == 1)
            return At([[0, 0, 0]]);
        double radius = spacing / (2 * Math.Sin(Math.PI / count));
        return new EmitterShape(Build(count, i => Turned(radius, 2 * Math.PI * i / count)), false);
    }

    /// <summary>Positions one by one, three coordinates each.</summary>
    public static EmitterShape At(double[][] positions) => new(positions, false);

    /// <summary>Distance between two emitters.</summary>
    public double Distance(int i, int k) => Lengths.Of(Separation(i, k));

    /// <summary>Vector from emitter k to emitter i.</summary>
    public double[] Separation(int i, int k) => [.. Positions[i].Zip(Positions[k], (a, b) => a - b)];

    private static double[] Turned(double radius, double angle)
    {
        (double sine, double cosine) = Math.SinCos(angle);
        return [radius * cosine, radius * sine, 0];
    }

    private static double[][] Build(int count, Func<int, double[]> place) => [.. Enumerable.Range(0, count).Select(place)];
}
