using ResourceCheck.Numerics.Collective;
using ResourceCheck.Tests.Reference;

namespace ResourceCheck.Tests.Collective;

/// <summary>Geometries of the tests and of tests/reference/collective.csv.</summary>
internal static class CollectiveCases
{
    public static readonly double[] Normal = [0, 0, 1];

    /// <summary>Three emitters without any symmetry and two transitions that differ.</summary>
    public static Couplings General => Couplings.From(
        EmitterShape.At([[0, 0, 0], [0.21, 0.05, 0.1], [-0.1, 0.3, 0.02]]), [new(1, 1, Normal), new(0.7, 1, [1, 1, 0])]);

    /// <summary>Four emitters without any symmetry and as many different transitions as fit.</summary>
    public static Couplings Uneven(int levels) => Couplings.From(
        EmitterShape.At([[0, 0, 0], [0.21, 0.05, 0.1], [-0.1, 0.3, 0.02], [0.15, -0.2, 0.25]]),
        [.. new Transition[] { new(1, 1, Normal), new(0.7, 0.8, [1, 1, 0]), new(1.3, 1.1, [0.3, -1, 2]) }.Take(levels - 1)]);

    /// <summary>Equal transitions with dipoles normal to the plane.</summary>
    public static Transition[] Equal(int levels, double rate = 1) =>
        [.. Enumerable.Range(1, levels - 1).Select(_ => new Transition(rate, 1, Normal))];

    /// <summary>Transitions whose dipoles point everywhere: no two share their couplings.</summary>
    public static Transition[] Unequal(int levels) =>
        [.. Enumerable.Range(1, levels - 1).Select(j => new Transition(1, 1, [Math.Cos(j), Math.Sin(2.0 * j), 0.3 * j]))];

    /// <summary>The couplings that a row of the table describes.</summary>
    public static Couplings Of(TableRow row)
    {
        double[] rates = Numbers(row, "rates"), wavelengths = Numbers(row, "wavelengths");
        double[][] dipoles = [.. row.Parameters["dipoles"].Split('|').Select(Vector)];
        return Couplings.From(Shape(row), [.. rates.Select((rate, j) => new Transition(rate, wavelengths[j], dipoles[j]))]);
    }

    private static EmitterShape Shape(TableRow row) => row.Parameters.GetValueOrDefault("shape") switch
    {
        "point" => EmitterShape.Point(row.N),
        "ring" => EmitterShape.Ring(row.N, row.Number("spacing", 0)),
        "chain" => EmitterShape.Chain(row.N, row.Number("spacing", 0)),
        _ => EmitterShape.At([.. row.Parameters["positions"].Split('|').Select(Vector)]),
    };

    private static double[] Numbers(TableRow row, string key) => [.. row.Parameters[key].Split('|').Select(TableRow.Number)];

    private static double[] Vector(string text) => [.. text.Split(',').Select(TableRow.Number)];
}
