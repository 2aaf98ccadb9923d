using System.Numerics;
using FsCheck;
using FsCheck.Xunit;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Smolin, Gambetta and Smith, Phys. Rev. Lett. 108, 070502 (2012).</summary>
public sealed class MendingTests
{
    /// <summary>By hand: -1/5 is cut, which leaves each of the others 1/15 less; then none is negative.</summary>
    [Fact]
    public void Cut_eigenvalues_are_taken_evenly_from_the_others()
    {
        double[] lambda = SimplexProjection.Of([0.6, 0.5, 0.1, -0.2]);
        double[] expected = [8 / 15.0, 13 / 30.0, 1 / 30.0, 0];
        Assert.All(lambda.Zip(expected), pair => Assert.Equal(pair.Second, pair.First, 1e-14));
    }

    /// <summary>Optimality (Karush, Kuhn, Tucker): all kept values move by the same amount, and no cut one would stay positive after it.</summary>
    [Property]
    public bool The_projection_is_the_nearest_point_of_the_simplex(NormalFloat[] numbers)
    {
        if (numbers.Length == 0 || numbers.Any(x => Math.Abs(x.Get) > 1e3))
            return true;
        double[] mu = [.. numbers.Select(x => x.Get)];
        double[] lambda = SimplexProjection.Of(mu);
        double scale = 1e-12 * (1 + mu.Sum(Math.Abs));
        double shift = lambda.Zip(mu, (l, m) => (l, m)).Where(p => p.l > 0).Max(p => p.l - p.m);
        return Math.Abs(lambda.Sum() - 1) <= scale
            && lambda.Zip(mu, (l, m) => l >= 0 && (l > 0 ? Math.Abs(l - m - shift) <= scale : m + shift <= scale)).All(x => x);
    }

    [Fact]
    public void A_slightly_negative_matrix_is_mended_on_request_only()
    {
        string text = Matrices.Json(2, Matrices.Diagonal(0.52, 0.5, 0, -0.02), 4);
        Assert.Equal(["D015"], Fixture.With(".json", text, path => StateFile.Read(path, mend: false)).Findings.Select(f => f.Code));
        Outcome<PreparedState> mended = Fixture.With(".json", text, path => StateFile.Read(path, mend: true));
        Assert.Equal((Severity.Warning, "D018"), (mended.Findings.Single().Severity, mended.Findings.Single().Code));
        Assert.Equal([0.51, 0.49, 0, 0], Enumerable.Range(0, 4).Select(i => Math.Round(mended.Value!.Density![5 * i].Real, 12)));
    }

    [Fact]
    public void Original_and_mended_figures_stand_side_by_side()
    {
        string text = Matrices.Json(2, Matrices.Diagonal(0.52, 0.5, 0, -0.02), 4);
        StateDescription described = Fixture.With(".json", text, path => StateFile.Describe(path, mend: true)).Value!;
        Assert.Equal(0.02, described.MendedBy!.Value, 1e-12);
        Assert.Equal(-0.02, described.Validity.LowestEigenvalue, 1e-12);
        StateFigure purity = described.Figures.Single(f => f.Name == "purity");
        Assert.Equal(0.52 * 0.52 + 0.25 + 0.0004, purity.Value, 1e-12);
        Assert.Equal(0.51 * 0.51 + 0.49 * 0.49, purity.Mended!.Value, 1e-12);
    }

    [Fact]
    public void A_mended_matrix_keeps_its_eigenvectors()
    {
        Complex[] density = Matrices.WithWhiteNoise(Matrices.Projector(AntisymmetricState.Ket(3)), 27, -0.1);
        Outcome<PreparedState> mended = Fixture.With(".json", Matrices.Json(3, density, 27), path => StateFile.Read(path, mend: true));
        Complex[] ideal = Matrices.Projector(AntisymmetricState.Ket(3));
        Assert.All(mended.Value!.Density!.Zip(ideal), pair => Assert.Equal(0, Complex.Abs(pair.First - pair.Second), 1e-12));
    }

    /// <summary>The singular values of the antihermitian part ±0.01 (levels 0 and 1) are both 0.01, half their sum is the distance.</summary>
    [Fact]
    public void The_distance_of_a_matrix_that_is_not_Hermitian_counts_too()
    {
        Complex[] density = Matrices.Diagonal(0.25, 0.25, 0.25, 0.25);
        (density[1], density[4]) = (0.01, -0.01);
        StateDescription described = Fixture.With(".json", Matrices.Json(2, density, 4), path => StateFile.Describe(path, mend: true)).Value!;
        Assert.Equal(0.01, described.MendedBy!.Value, 1e-12);
        Assert.Equal(0.02, described.Validity.Hermitian, 1e-12);
    }

    [Fact]
    public void A_vector_is_mended_by_its_norm()
    {
        const string Text = "{\"parties\": 2, \"vector\": [0, 0.71, -0.71, 0]}";
        Assert.Equal(["D016"], Fixture.With(".json", Text, path => StateFile.Read(path, mend: false)).Findings.Select(f => f.Code));
        PreparedState state = Fixture.With(".json", Text, path => StateFile.Read(path, mend: true)).Value!;
        Assert.Equal(1, StateFigures.Fidelity(state), 1e-12);
    }

    [Fact]
    public void A_good_state_is_mended_by_nothing()
    {
        StateDescription described = StateFile.Describe(Fixture.PathOf("c16-c-v1.npy"), mend: true).Value!;
        Assert.Equal(0, described.MendedBy!.Value, 1e-13);
        Assert.All(described.Figures, f => Assert.Equal(f.Value, f.Mended!.Value, 1e-7));
    }

    [Property(MaxTest = 20)]
    public bool Cholesky_tells_the_sign_of_the_lowest_eigenvalue(int seed)
    {
        const int Size = 40;
        Complex[,] a = Matrices.Random(seed, Size);
        Complex[] hermitian = HermitianMatrix.HermitianPart([.. a.Cast<Complex>()], Size);
        double lowest = HermitianMatrix.Eigenvalues(hermitian, Size)[0];
        return Cholesky.IsAbove(hermitian, Size, -lowest + 1e-6) && !Cholesky.IsAbove(hermitian, Size, -lowest - 1e-6);
    }

    [Fact]
    public void Large_matrices_are_checked_without_their_eigenvalues()
    {
        string good = Diagonal(_ => 1 / 529.0);
        Outcome<StateDescription> described = Fixture.With(".json", good, path => StateFile.Describe(path, mend: false));
        Assert.Equal((Severity.Note, "D019"), (described.Findings.Single().Severity, described.Findings.Single().Code));
        Assert.Equal(1 / 529.0, described.Value!.Figures.Single(f => f.Name == "purity").Value, 1e-12);
        Assert.Equal(-1e-9, described.Value.Validity.LowestEigenvalue, 1e-15);
        string bad = Diagonal(i => i == 300 ? -1e-8 : (1 + 1e-8) / 528);
        Assert.Equal(["D015"], Fixture.With(".json", bad, path => StateFile.Read(path, mend: false)).Findings.Select(f => f.Code));
        Assert.Equal(["D015", "D017"], Fixture.With(".json", bad, path => StateFile.Read(path, mend: true)).Findings.Select(f => f.Code));
    }

    /// <summary>A diagonal matrix of two qudits with 23 levels as JSON.</summary>
    private static string Diagonal(Func<int, double> value)
    {
        IEnumerable<string> rows = Enumerable.Range(0, 529).Select(r => $"[{string.Join(',', Enumerable.Range(0, 529).Select(c => r == c ? $"{value(r):R}" : "0"))}]");
        return $"{{\"parties\": 2, \"levels\": 23, \"density\": [{string.Join(",\n", rows)}]}}";
    }
}
