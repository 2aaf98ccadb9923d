using System.Numerics;
using FsCheck.Xunit;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Tests.Engines;
using Xunit;

namespace ResourceCheck.Tests.Antisymmetric;

/// <summary>Fidelity after a channel on each party, and after some have left, against explicit tensors and closed forms.</summary>
public sealed class FidelityKernelTests
{
    [Property(MaxTest = 20)]
    public bool Any_channels_agree_with_tensors(int seed)
    {
        Random random = new(seed);
        int n = random.Next(2, 5), m = random.Next(1, n + 1);
        Complex[][][,] kraus = [.. Enumerable.Range(0, m).Select(_ => PlainTensors.Kraus(random, n, 2))];
        LocalOperator[] others = [.. Enumerable.Range(0, n - m).Select(_ => PlainTensors.Effect(random, n))];
        MixedMinors minors = others.Aggregate(MixedMinors.None(n), (sum, e) => sum.With(e));
        double plain = PlainTensors.Overlap(kraus, others);
        return Math.Abs(FourSubsets.Overlap([.. kraus.Select(k => LocalChannel.Of(k))], minors).Value.Real - plain) < 1e-12 * Math.Max(1, plain);
    }

    [Property(MaxTest = 10)]
    public bool Few_Kraus_operators_agree_with_tensors(int seed)
    {
        Random random = new(seed);
        Complex[][][,] kraus = [.. Enumerable.Range(0, 4).Select(_ => PlainTensors.Kraus(random, 4, random.Next(1, 3)))];
        double plain = PlainTensors.Overlap(kraus, []);
        return Math.Abs(KrausStrings.Fidelity([.. kraus.Select(k => LocalChannel.Of(k))]).Value.Real - plain) < 1e-12 * Math.Max(1, plain);
    }

    /// <summary>All three sums on incoherent channels, levels without any symmetry; both ways of counting levels.</summary>
    [Property(MaxTest = 15)]
    public bool Incoherent_channels_agree_with_any_channels(int seed)
    {
        Random random = new(seed);
        int n = random.Next(2, 6);
        LocalChannel[] channels = [.. Enumerable.Range(0, n).Select(_ => LocalChannel.Of(PlainTensors.IncoherentKraus(random, n)))];
        IncoherentChannel[] incoherent = [.. channels.Select(IncoherentChannel.Of)];
        double factorial = Numerics.States.AntisymmetricState.Factorial(n), general = FourSubsets.Overlap(channels, MixedMinors.None(n)).Value.Real;
        double pairs = PairedLevels.Sum(incoherent) / factorial / factorial, classes = LevelClasses.Sum(incoherent, IncoherentFidelity.Classes(incoherent)) / factorial / factorial;
        return channels.All(c => c.IsIncoherent) && Math.Abs(pairs - general) < 1e-13 && Math.Abs(classes - general) < 1e-13;
    }

    /// <summary>Beside incoherent channels the average over phases stands for one that is not.</summary>
    [Property(MaxTest = 15)]
    public bool One_channel_of_any_kind_among_incoherent_ones_is_averaged_over_phases(int seed)
    {
        Random random = new(seed);
        int n = random.Next(2, 5);
        Complex[][][,] kraus = [.. Enumerable.Range(0, n).Select(i => i == 1 % n ? PlainTensors.Kraus(random, n, 2) : PlainTensors.IncoherentKraus(random, n))];
        ChannelFidelity fidelity = ChannelFidelity.Of([.. kraus.Select(k => LocalChannel.Of(k))], [], null);
        double averaged = IncoherentFidelity.Of([.. kraus.Select(k => IncoherentChannel.Of(LocalChannel.Of(k)))]).Value.Real;
        return Math.Abs(averaged - PlainTensors.Overlap(kraus, [])) < 1e-13 && Math.Abs(fidelity.Overlap().Value.Real - averaged) < 1e-13;
    }

    /// <summary>One party reads out a vector, the others correct with a common unitary between two incoherent channels of which the second commutes with it.</summary>
    [Property(MaxTest = 15)]
    public bool Removal_with_a_common_correction_is_summed_in_its_frame(int seed)
    {
        Random random = new(seed);
        const int n = 4;
        Complex[,] u = RandomWorld.Unitary(random, n);
        LocalOperator read = PlainTensors.Effect(random, n);
        Complex[][][,] kraus = [.. Enumerable.Range(0, n - 1).Select(_ => PlainTensors.IncoherentKraus(random, n).Select(k => MatrixMath.Multiply(u, k)).ToArray())];
        ChannelFidelity fidelity = ChannelFidelity.Of([.. kraus.Select(k => LocalChannel.Of(k))], [read], u);
        Assert.Equal(FidelityMethod.Incoherent, InFrame(kraus, read, u));
        return Math.Abs(fidelity.Overlap().Value.Real - PlainTensors.Overlap(kraus, [read])) < 1e-12;
    }

    /// <summary>Page 4: fidelity after depolarising p_i is Σ_k e_k(p)/(C(N,k) N^k).</summary>
    [Theory]
    [InlineData(4)]
    [InlineData(8)]
    [InlineData(12)]
    [InlineData(20)]
    public void Depolarising_follows_its_closed_form(int n)
    {
        double[] p = OutcomeKernelTests.Strengths(n), events = OutcomeKernelTests.Events(p);
        double closed = Enumerable.Range(0, n + 1).Sum(k => events[k] / (Subsets.ChooseReal(n, k) * Math.Pow(n, k)));
        Assert.Equal(closed, Fidelity([.. p.Select(x => LocalChannel.Incoherent(n, (a, b) => a == b ? 1 - x + (x / n) : x / n, (_, _) => 1 - x))]), 1e-10);
        if (n == 12)
            Assert.Equal(0.558913900339, closed, 1e-12);
    }

    /// <summary>Page 4: fidelity after dephasing λ_i is Σ_m e_m(1-λ) (N-m)!/N!.</summary>
    [Theory]
    [InlineData(4)]
    [InlineData(8)]
    [InlineData(12)]
    [InlineData(20)]
    public void Dephasing_follows_its_closed_form(int n)
    {
        double[] lost = [.. Enumerable.Range(0, n).Select(i => 0.03 + (0.01 * i))], events = OutcomeKernelTests.Events(lost);
        double closed = Enumerable.Range(0, n + 1).Sum(m => events[m] * Enumerable.Range(0, m).Aggregate(1.0, (f, i) => f / (n - i)));
        Assert.Equal(closed, Fidelity([.. lost.Select(x => LocalChannel.Incoherent(n, (a, b) => a == b ? 1 : 0, (_, _) => 1 - x))]), 1e-10);
        if (n == 12)
            Assert.Equal(0.375255718992, closed, 1e-12);
    }

    /// <summary>Page 4: fidelity after decay of level 0 is ((1/N) Σ exp(-Γ_i t/2))², whatever the branching; here to levels 1 and N-1.</summary>
    [Theory]
    [InlineData(4)]
    [InlineData(8)]
    [InlineData(12)]
    [InlineData(20)]
    public void Decay_follows_its_closed_form(int n)
    {
        double[] root = [.. Enumerable.Range(0, n).Select(i => Math.Exp(-(0.1 + (0.02 * i)) / 2))];
        double closed = root.Average() * root.Average();
        Assert.Equal(closed, Fidelity([.. root.Select(r => Decay(n, r))]), 1e-10);
        if (n == 12)
            Assert.Equal(0.811550651137, closed, 1e-12);
    }

    /// <summary>Misaligned frames: |D(U_1, …, U_N)|², and 1 for one and the same frame.</summary>
    [Theory]
    [InlineData(4)]
    [InlineData(12)]
    public void Common_frames_cost_nothing(int n)
    {
        Complex[,] u = RandomWorld.Unitary(new Random(3), n);
        LocalChannel channel = LocalChannel.Of([u]);
        ChannelFidelity fidelity = ChannelFidelity.Of([.. Enumerable.Repeat(channel, n)], [], null);
        Assert.Equal(1, fidelity.Overlap().Value.Real, 1e-10);
        Assert.Equal(FidelityMethod.FewKraus, n == 12 ? fidelity.Method : FidelityMethod.FewKraus);
    }

    private static FidelityMethod InFrame(Complex[][][,] kraus, LocalOperator read, Complex[,] u) =>
        ChannelFidelity.Of([.. kraus.Select(k => LocalChannel.Of(k).SeenFrom(u))], [read], null).Method;

    private static double Fidelity(IReadOnlyList<LocalChannel> channels)
    {
        ChannelFidelity fidelity = ChannelFidelity.Of(channels, [], null);
        return (fidelity.Method == FidelityMethod.Incoherent ? fidelity.Overlap() : IncoherentFidelity.Of([.. channels.Select(IncoherentChannel.Of)])).Value.Real;
    }

    private static LocalChannel Decay(int n, double root) => LocalChannel.Incoherent(
        n,
        (a, p) => p != 0 ? (a == p ? 1 : 0) : a == 0 ? root * root : ((a == 1 ? 2 * (1 - (root * root)) / 3 : 0) + (a == n - 1 ? (1 - (root * root)) / 3 : 0)),
        (p, q) => p == 0 || q == 0 ? root : 1);
}
