using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Matrix Market files and the tool's own JSON form.</summary>
public sealed class TextFormatTests
{
    private const string Hermitian = "%%MatrixMarket matrix coordinate complex hermitian\n% singlet\n\n4 4 3\n2 2 0.5 0\n3 2 -0.5 0\n3 3 5e-1 0\n";

    [Theory]
    [InlineData(Hermitian)]
    [InlineData("%%matrixmarket MATRIX Coordinate Real Symmetric\r\n4 4 3\r\n2 2 0.5\r\n3 2 -.5\r\n3 3 0.5\r\n")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 4\n2 2 0.5\n2 3 -0.5\n3 2 -0.5\n3 3 0.5")]
    [InlineData("%%MatrixMarket matrix array real symmetric\n4 4\n0\n0\n0\n0\n0.5\n-0.5\n0\n0.5\n0\n0\n")]
    [InlineData("%%MatrixMarket matrix array real general\n4 4\n0\n0\n0\n0\n0\n0.5\n-0.5\n0\n0\n-0.5\n0.5\n0\n0\n0\n0\n0\n")]
    public void Every_layout_of_a_matrix_gives_the_same_state(string text)
    {
        Complex[] density = Read(".mtx", text).Value!.Density!;
        Assert.Equal([0, 0, 0, 0, 0, 0.5, -0.5, 0, 0, -0.5, 0.5, 0, 0, 0, 0, 0], density.Select(x => x.Real));
        Assert.All(density, x => Assert.Equal(0, x.Imaginary));
    }

    [Fact]
    public void Entries_above_the_diagonal_are_the_conjugates()
    {
        Complex[] density = Read(".mtx", Hermitian.Replace("3 2 -0.5 0", "3 2 0 -0.25", StringComparison.Ordinal)).Value!.Density!;
        Assert.Equal(new Complex(0, -0.25), density[2 * 4 + 1]);
        Assert.Equal(new Complex(0, 0.25), density[1 * 4 + 2]);
    }

    [Fact]
    public void Arrays_run_down_the_columns()
    {
        Complex[] density = Read(".mtx", "%%MatrixMarket matrix array complex general\n4 4\n0.5 0\n0 -0.5\n0 0\n0 0\n0 0.5\n0.5 0\n0 0\n0 0\n0 0\n0 0\n0 0\n0 0\n0 0\n0 0\n0 0\n0 0\n").Value!.Density!;
        Assert.Equal(new Complex(0, -0.5), density[4]);
        Assert.Equal(new Complex(0, 0.5), density[1]);
    }

    [Theory]
    [InlineData("%%MatrixMarket matrix array integer general\n4 1\n0\n1\n0\n0\n")]
    [InlineData("%%MatrixMarket matrix array integer general\n1 4\n0\n1\n0\n0\n")]
    [InlineData("%%MatrixMarket matrix coordinate integer general\n4 1 1\n2 1 1\n")]
    public void One_column_or_row_is_a_vector(string text) => Assert.Equal([0, 1, 0, 0], Read(".mtx", text).Value!.Ket!.Select(x => x.Real));

    [Theory]
    [InlineData("", "D020 1:1")]
    [InlineData("%%MatrixMarket matrix coordinate pattern general\n4 4 1\n1 1\n", "D020 1:1")]
    [InlineData("%%MatrixMarket matrix coordinate complex skew-symmetric\n4 4 1\n1 1\n", "D020 1:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4\n", "D021 2:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 -1\n", "D021 2:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n1000000 1000000 1\n1 1 1\n", "D011 2:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n5 5 1\n1 1 1\n", "D010 2:1")]
    [InlineData("%%MatrixMarket matrix array real symmetric\n4 1\n1\n", "D022 2:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 1\n1 1 0,5\n", "D024 3:5")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 1\n1 1 NaN\n", "D024 3:5")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 1\n1 1 1e999\n", "D024 3:5")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 1\n1 1 1 0\n", "D023 3:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 1\n5 1 1\n", "D025 3:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 1\n0 1 1\n", "D025 3:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 2\n1 1 1\n1 1 1\n", "D025 4:1")]
    [InlineData("%%MatrixMarket matrix coordinate real symmetric\n4 4 1\n1 2 1\n", "D025 3:1")]
    [InlineData("%%MatrixMarket matrix coordinate complex hermitian\n4 4 1\n1 1 1 0.1\n", "D025 3:1")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 2\n1 1 1\n", "D026 0:0")]
    [InlineData("%%MatrixMarket matrix array real general\n4 1\n1\n0\n0\n0\n0\n", "D026 0:0")]
    [InlineData("%%MatrixMarket matrix coordinate real general\n4 4 2\n1 1 x\n\n9 1 1\n", "D024 3:5", "D025 5:1")]
    public void Mistakes_in_a_matrix_are_found_with_their_lines(string text, params string[] findings) =>
        Assert.Equal(findings, Found(".mtx", text));

    [Fact]
    public void A_flood_of_mistakes_is_cut()
    {
        string text = $"%%MatrixMarket matrix array real general\n27 27\n{string.Concat(Enumerable.Repeat("x\n", 729))}";
        string[] found = Found(".mtx", text);
        Assert.Equal(21, found.Length);
        Assert.Equal("D027 0:0", found[^1]);
    }

    [Theory]
    [InlineData("{\"parties\": 2, \"vector\": [0, [0.6, 0], [0, 0.8], 0]}")]
    [InlineData("{\"levels\": 2, \"terms\": {\"0-1\": 0.6, \"1-0\": [0, 0.8]}, \"parties\": 2}")]
    [InlineData("\uFEFF{\"parties\": 2, \"terms\": {\"0-1\": 0.6, \"1-0\": [0, 0.8]}}\n")]
    public void Vectors_and_terms_give_the_same_state(string text) =>
        Assert.Equal([0, 0.6, new Complex(0, 0.8), 0], Read(".json", text).Value!.Ket!.Select(a => new Complex(Math.Round(a.Real, 14), Math.Round(a.Imaginary, 14))));

    [Fact]
    public void Stated_levels_may_differ_from_the_parties()
    {
        PreparedState state = Read(".json", "{\"parties\": 2, \"levels\": 3, \"terms\": {\"0-2\": 1}}").Value!;
        Assert.Equal((2, 3, 9), (state.Parties, state.Levels, state.Ket!.Length));
        Assert.Equal(1, state.Ket[2].Real);
    }

    [Fact]
    public void A_row_of_a_density_matrix_runs_along_its_columns()
    {
        Complex[] density = Read(".json", "{\"parties\": 2, \"density\": [[0.5, [0, 0.5], 0, 0], [[0, -0.5], 0.5, 0, 0], [0, 0, 0, 0], [0, 0, 0, 0]]}").Value!.Density!;
        Assert.Equal(new Complex(0, 0.5), density[1]);
    }

    [Theory]
    [InlineData("", "D030 1:1")]
    [InlineData("{\"parties\": 2,\n \"vector\": [1, 0, 0, 0],}", "D030 2:25")]
    [InlineData("{\"parties\": 2, /* two */ \"vector\": [1, 0, 0, 0]}", "D030 1:16")]
    [InlineData("{\"parties\": 2, \"vector\": [1, 0, 0, NaN]}", "D030 1:36")]
    [InlineData("{\"parties\": 2, \"vector\": [1, 0, 0, 0]} x", "D030 1:40")]
    [InlineData("[1, 0, 0, 0]", "D034 1:1")]
    [InlineData("{\"parties\": 2}", "D033 0:0")]
    [InlineData("{\"vector\": [1, 0, 0, 0]}", "D033 0:0")]
    [InlineData("{\"parties\": 2, \"vector\": [1, 0, 0, 0], \"terms\": {}}", "D033 0:0")]
    [InlineData("{\"parties\": 2, \"parties\": 3, \"vector\": [1, 0, 0, 0]}", "D032 1:16")]
    [InlineData("{\"partys\": 2, \"parties\": 2, \"vector\": [1, 0, 0, 0]}", "D031 1:2")]
    [InlineData("{\"parties\": \"2\", \"vector\": [1, 0, 0, 0]}", "D034 1:13")]
    [InlineData("{\"parties\": 2.5, \"vector\": [1, 0, 0, 0]}", "D034 1:13")]
    [InlineData("{\"parties\": null, \"vector\": [1, 0, 0, 0]}", "D034 1:13")]
    [InlineData("{\"parties\": 1, \"vector\": [1]}", "D034 1:13")]
    [InlineData("{\"parties\": 2, \"vector\": [1, 0, \"0\", 1e999]}", "D034 1:33", "D034 1:38")]
    [InlineData("{\"parties\": 2, \"vector\": [[1, 0, 0], 0, 0, 0]}", "D034 1:27")]
    [InlineData("{\"parties\": 2, \"vector\": {\"a\": 1}}", "D034 1:26")]
    [InlineData("{\"parties\": 2, \"vector\": [1, 0, 0]}", "D038 0:0")]
    [InlineData("{\"parties\": 2, \"levels\": 3, \"vector\": [1, 0, 0, 0]}", "D038 0:0")]
    [InlineData("{\"parties\": 2, \"density\": [[1, 0], [0, 0]]}", "D038 0:0")]
    [InlineData("{\"parties\": 2, \"density\": [[1, 0, 0, 0], [0], [0, 0, 0, 0], [0, 0, 0, 0]]}", "D036 1:42")]
    [InlineData("{\"parties\": 40, \"terms\": {}}", "D011 0:0")]
    [InlineData("{\"parties\": 2147483647, \"levels\": 2147483647, \"density\": []}", "D011 0:0")]
    [InlineData("{\"parties\": 2, \"terms\": {\"0-1\": 1, \"0-1\": 1}}", "D032 1:36")]
    [InlineData("{\"parties\": 2, \"terms\": {\"0-2\": 1, \"0\": 1, \"00-1\": 1, \"0-1-0\": 1}}", "D035 1:26", "D035 1:36", "D035 1:44", "D035 1:55")]
    public void Mistakes_in_json_are_found_with_their_places(string text, params string[] findings) =>
        Assert.Equal(findings, Found(".json", text));

    [Fact]
    public void Long_lines_are_quoted_around_the_mistake_only()
    {
        string zeros = string.Concat(Enumerable.Repeat("0, ", 5000));
        Place place = Read(".json", $"{{\"parties\": 2,\n \"vector\": [{zeros}\"x\", {zeros} 0]}}").Findings[0].Place!;
        Assert.Equal("\"x\"", place.LineText!.Substring(place.MarkStart, place.MarkLength));
        Assert.Equal((2, 12 + zeros.Length + 1), (place.Line, place.Column));
        Assert.True(place.LineText.Length < 200);
    }

    [Fact]
    public void A_finding_reads_as_all_findings_do()
    {
        string text = Fixture.With(".mtx", "%%MatrixMarket matrix coordinate real general\n4 4 1\n1 1 0,5\n", path => StateFile.Read(path, false).Findings[0].ToString().Replace(path, "state.mtx", StringComparison.Ordinal));
        Assert.Equal(
            """
            This is no finite decimal number such as -0.25 or 1.5e-3.
                1 1 «0,5»
              Cure: write a point before the decimals, and e before the exponent
              at state.mtx:3:5 (D024)
            """,
            text);
    }

    private static string[] Found(string ending, string text) =>
        [.. Read(ending, text).Findings.Select(f => $"{f.Code} {f.Place!.Line}:{f.Place.Column}")];

    private static Outcome<PreparedState> Read(string ending, string text) => Fixture.With(ending, text, path => StateFile.Read(path, mend: false));
}
