using ResourceCheck.Conditions;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;
using Xunit;

namespace ResourceCheck.Tests.Reference;

/// <summary>
/// The dense engine against tables computed by an independent NumPy program with plain density matrices (tests/reference,
/// sources at the head of each table; CI recomputes them).
/// </summary>
public sealed class ReferenceTableTests
{
    /// <summary>Tables are good to 1e-12 in absolute terms and hold 15 digits.</summary>
    private const double Tolerance = 1e-10;

    /// <summary>CHSH values with population in other levels come from searches on both sides.</summary>
    private const double SearchTolerance = 1e-8;

    public static TheoryData<string> Tables => ["local-noise", "outcomes", "removal", "pairs", "preparation"];

    [Theory]
    [MemberData(nameof(Tables))]
    public void Dense_engine_reproduces_every_row(string table)
    {
        IReadOnlyList<TableRow> rows = [.. TableRow.Of(table).Where(r => r.Kind != "error-rate")];
        Assert.NotEmpty(rows);
        List<string> off = [.. rows.Select(r => (Row: r, Value: Compute(r))).Where(p => !Close(p.Row, p.Value)).Select(p => $"{p.Row}: {p.Value:R} for {p.Row.Value:R}")];
        Assert.True(off.Count == 0, $"{off.Count} of {rows.Count} rows differ:\n{string.Join('\n', off)}");
    }

    /// <summary>Zero of 1 - 2h(Q): Shor and Preskill, Phys. Rev. Lett. 85, 441 (2000).</summary>
    [Fact]
    public void Key_fraction_vanishes_at_eleven_per_cent_in_both_bases()
    {
        TableRow limit = TableRow.Of("pairs").Single(r => r.Kind == "error-rate");
        TableRow at = limit with { Kind = "key-fraction", Parameters = new Dictionary<string, string> { ["white"] = (2 * limit.Value).ToString("R") } };
        Assert.Equal(0, Compute(at), Tolerance);
        Assert.Equal(0.110, limit.Value, 4);
    }

    private static bool Close(TableRow row, double value) => Math.Abs(value - row.Value) <= (row.Kind == "bell" ? SearchTolerance : Tolerance);

    private static double Compute(TableRow row)
    {
        Protocol protocol = TestScripts.Bind(TableScript.Of(row));
        World world = TableWorld.Of(row, protocol.Parties.Count);
        if (row.Table == "preparation")
            world = world with { Resource = new ResourceModel(TablePreparation.Of(row), 0) };
        Evaluation evaluation = TestScripts.Evaluate(protocol, world);
        return row.Kind switch
        {
            "yield" or "seen" or "probability" => evaluation.Yield,
            "leak-probability" => 1 - evaluation.Yield,
            _ when protocol.Reports.Count > 0 => evaluation.Reports[0].Value,
            _ => evaluation.Checkpoints.Single(c => c.Label == TableScript.Figure).Fidelity.Value,
        };
    }
}
