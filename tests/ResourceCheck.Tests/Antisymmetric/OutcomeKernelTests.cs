using System.Numerics;
using FsCheck.Xunit;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Tests.Engines;
using Xunit;

namespace ResourceCheck.Tests.Antisymmetric;

/// <summary>Outcome probabilities of antisymmetric states against explicit tensors.</summary>
public sealed class OutcomeKernelTests
{
    [Property(MaxTest = 30)]
    public bool Mixed_discriminant_is_the_expectation_value(int seed)
    {
        Random random = new(seed);
        int n = random.Next(1, 6);
        LocalOperator[] operators = [.. Enumerable.Range(0, n).Select(_ => LocalOperator.Of(RandomWorld.Matrix(random, n)))];
        RoundedSum d = MixedDiscriminant.Of(operators);
        Complex plain = PlainTensors.Expectation(operators);
        return (d.Value - plain).Magnitude < 1e-13 && d.Error < 1e-12;
    }

    /// <summary>k observed of N = 5 … 8: cycles, coefficients and signs, each against the sign form with the identities put in.</summary>
    [Property(MaxTest = 30)]
    public bool Parties_that_nobody_looks_at_leave_the_sum(int seed)
    {
        Random random = new(seed);
        int n = random.Next(5, 9), k = random.Next(1, n + 1);
        LocalOperator[] observed = [.. Enumerable.Range(0, k).Select(_ => PlainTensors.Effect(random, n))];
        LocalOperator[] all = [.. observed, .. Enumerable.Repeat(LocalOperator.Identity(n), n - k)];
        (double[] re, double[] im) = MixedDiscriminant.Pack(all);
        Complex signs = SignSums.Of(n, n, re, im).Value * MixedDiscriminant.Normalisation(n);
        return Math.Abs((MixedDiscriminant.Of(all).Value / signs).Magnitude - 1) < 1e-10;
    }

    /// <summary>D(A, …, A) = det A. Threads take their share from N = 12 on.</summary>
    [Theory]
    [InlineData(5)]
    [InlineData(12)]
    [InlineData(16)]
    [InlineData(20)]
    public void Equal_operators_give_the_determinant(int n)
    {
        LocalOperator a = PlainTensors.Effect(new Random(n), n);
        Complex determinant = MathNet.Numerics.LinearAlgebra.Matrix<Complex>.Build.DenseOfArray(a.ToMatrix()).Determinant();
        RoundedSum d = MixedDiscriminant.Of([.. Enumerable.Repeat(a, n)]);
        Assert.Equal(1, (d.Value / determinant).Real, 1e-9);
        Assert.InRange((d.Value - determinant).Magnitude, 0, 10 * d.Error);
    }

    /// <summary>A pivot of zero in one lane only: a permutation matrix among regular ones.</summary>
    [Fact]
    public void Singular_and_permuted_operators_are_no_trouble()
    {
        Complex[,] shift = Shift(4);
        LocalOperator[] operators = [LocalOperator.Of(shift), LocalOperator.Of(shift), LocalOperator.Of(new Complex[4, 4]), LocalOperator.Identity(4)];
        Assert.Equal(0, MixedDiscriminant.Of(operators).Value.Magnitude, 1e-15);
        operators[2] = LocalOperator.Of(shift);
        Assert.Equal(0, (MixedDiscriminant.Of(operators).Value - PlainTensors.Expectation(operators)).Magnitude, 1e-14);
    }

    [Property(MaxTest = 15)]
    public bool Joint_law_lists_every_string(int seed)
    {
        Random random = new(seed);
        int n = random.Next(2, 6);
        LocalOperator[][] effects = [.. Enumerable.Range(0, n).Select(i => i == 1 ? [PlainTensors.Effect(random, n)] : PlainTensors.Measurement(random, n))];
        double[] law = JointLaw.Of(effects);
        int at = 0;
        return PlainTensors.Strings([.. effects.Select(e => e.Length)]).Where((_, i) => i % 7 == 0 || i < 5).All(s =>
        {
            at = s.Select((k, i) => (k, i)).Aggregate(0, (sum, x) => (sum * effects[x.i].Length) + x.k);
            return Math.Abs(law[at] - PlainTensors.Expectation([.. effects.Select((e, i) => e[s[i]])]).Real) < 1e-13;
        });
    }

    [Property(MaxTest = 15)]
    public bool Distinct_outcomes_add_up_over_strings(int seed)
    {
        Random random = new(seed);
        int n = random.Next(2, 6), m = random.Next(1, n + 1);
        LocalOperator[][] effects = [.. Enumerable.Range(0, m).Select(_ => PlainTensors.Measurement(random, n))];
        LocalOperator[] others = [.. Enumerable.Range(0, n - m).Select(_ => PlainTensors.Effect(random, n))];
        double plain = PlainTensors.Strings([.. effects.Select(e => e.Length)]).Where(s => s.Distinct().Count() == m)
            .Sum(s => PlainTensors.Expectation([.. effects.Select((e, i) => e[s[i]]), .. others]).Real);
        return Math.Abs(DistinctOutcomes.Of(effects, others).Value.Real - plain) < 1e-12;
    }

    /// <summary>The sum over used indices and the double sign form agree where both apply: operators diagonal in a random common basis.</summary>
    [Property(MaxTest = 15)]
    public bool Diagonal_and_general_sums_agree(int seed)
    {
        Random random = new(seed);
        int n = random.Next(2, 6), m = random.Next(1, n + 1);
        Complex[,] basis = RandomWorld.Unitary(random, n);
        LocalOperator Diagonal() => LocalOperator.Combination([.. Enumerable.Range(0, n).Select(l => LocalOperator.Of(PlainTensors.Projector(basis, l)))], [.. Enumerable.Range(0, n).Select(_ => (Complex)random.NextDouble())]);
        LocalOperator[][] effects = [.. Enumerable.Range(0, m).Select(_ => Enumerable.Range(0, n).Select(_ => Diagonal()).ToArray())];
        LocalOperator[] others = [.. Enumerable.Range(0, n - m).Select(_ => Diagonal())];
        RoundedSum? diagonal = DiagonalDistinct.Find(effects, others)?.Probability();
        return diagonal is { } found && Math.Abs((found.Value / DistinctOutcomes.General(effects, others).Value).Real - 1) < 1e-10;
    }

    /// <summary>Page 4: probability of all different after depolarising p_i, any common basis: Σ_k e_k(p) k!/N^k.</summary>
    [Theory]
    [InlineData(4)]
    [InlineData(8)]
    [InlineData(12)]
    [InlineData(20)]
    public void Depolarised_outcomes_differ_as_the_closed_form_says(int n)
    {
        Complex[,] basis = RandomWorld.Unitary(new Random(n), n);
        double[] p = Strengths(n);
        LocalOperator[][] effects = [.. p.Select(x => Depolarised(basis, x))];
        double[] events = Events(p);
        double closed = Enumerable.Range(0, n + 1).Sum(k => events[k] * Enumerable.Range(1, k).Aggregate(1.0, (f, i) => f * i / n));
        Assert.Equal(closed, DistinctOutcomes.Of(effects, []).Value.Real, 1e-9);
        if (n == 12)
            Assert.Equal(0.585846231361, closed, 1e-12);
        if (n <= 8)
            Assert.Equal(closed, DistinctOutcomes.General(effects, []).Value.Real, 1e-11);
    }

    /// <summary>Page 4: in levels after decay of level 0 the outcomes differ with the mean of exp(-Γ_i t), whatever the branching.</summary>
    [Theory]
    [InlineData(4)]
    [InlineData(8)]
    [InlineData(12)]
    [InlineData(20)]
    public void Decayed_levels_differ_in_the_mean_of_the_exponentials(int n)
    {
        double[] stay = [.. Enumerable.Range(0, n).Select(i => Math.Exp(-0.1 - (0.02 * i)))];
        LocalOperator[][] effects = [.. stay.Select(s => Enumerable.Range(0, n).Select(k => Decayed(n, k, s)).ToArray())];
        Assert.Equal(stay.Average(), DistinctOutcomes.Of(effects, []).Value.Real, 1e-10);
    }

    [Property(MaxTest = 15)]
    public bool Products_differ_as_their_strings_say(int seed)
    {
        Random random = new(seed);
        int d = random.Next(2, 6), m = random.Next(1, d + 1);
        double[][] rows = [.. Enumerable.Range(0, m).Select(_ => Enumerable.Range(0, d).Select(_ => random.NextDouble()).ToArray())];
        double plain = PlainTensors.Strings([.. Enumerable.Repeat(d, m)]).Where(s => s.Distinct().Count() == m).Sum(s => s.Select((k, i) => rows[i][k]).Aggregate(1.0, (a, b) => a * b));
        return Math.Abs(DistinctOutcomes.OfProduct(rows) - plain) < 1e-12;
    }

    /// <summary>How many see outcome 0, and how many outcome 1 or 2, over all strings.</summary>
    [Property(MaxTest = 10)]
    public bool Counts_add_up_over_strings(int seed)
    {
        Random random = new(seed);
        const int n = 4;
        LocalOperator[][] effects = [.. Enumerable.Range(0, n).Select(_ => PlainTensors.Measurement(random, n))];
        static int Sets(int k) => k == 0 ? 1 : k < 3 ? 2 : 0;
        RoundedSum[] law = OutcomeCounts.Of([.. effects.Select(e => (IReadOnlyList<(int, LocalOperator)>)[.. e.Select((a, k) => (Sets(k), a))])], 2, MixedDiscriminant.Of);
        double[] plain = new double[(n + 1) * (n + 1)];
        foreach (int[] s in PlainTensors.Strings([n, n, n, n]))
            plain[(s.Count(k => Sets(k) == 1) * (n + 1)) + s.Count(k => Sets(k) == 2)] += PlainTensors.Expectation([.. effects.Select((e, i) => e[s[i]])]).Real;
        return law.Zip(plain, (a, b) => Math.Abs(a.Value.Real - b)).Max() < 1e-12;
    }

    /// <summary>p_i = 0.02 + 0.005 i.</summary>
    public static double[] Strengths(int n) => [.. Enumerable.Range(0, n).Select(i => 0.02 + (0.005 * i))];

    /// <summary>e_k: probability that exactly k of independent events happen.</summary>
    public static double[] Events(double[] p)
    {
        double[] e = [1];
        foreach (double x in p)
            e = [.. Enumerable.Range(0, e.Length + 1).Select(k => (k < e.Length ? (1 - x) * e[k] : 0) + (k > 0 ? x * e[k - 1] : 0))];
        return e;
    }

    private static LocalOperator[] Depolarised(Complex[,] basis, double p)
    {
        int n = basis.GetLength(0);
        LocalOperator identity = LocalOperator.Identity(n);
        return [.. Enumerable.Range(0, n).Select(k => LocalOperator.Combination([LocalOperator.Of(PlainTensors.Projector(basis, k)), identity], [1 - p, p / n]))];
    }

    /// <summary>Level 0 stays with probability s, otherwise it goes to level 1 twice as often as to the last level.</summary>
    private static LocalOperator Decayed(int n, int k, double s)
    {
        Complex[,] a = new Complex[n, n];
        a[k, k] = 1;
        a[0, 0] = k == 0 ? s : ((k == 1 ? 2 * (1 - s) / 3 : 0) + (k == n - 1 ? (1 - s) / 3 : 0));
        return LocalOperator.Of(a);
    }

    private static Complex[,] Shift(int d)
    {
        Complex[,] u = new Complex[d, d];
        for (int l = 0; l < d; l++)
            u[(l + 1) % d, l] = 1;
        return u;
    }
}
