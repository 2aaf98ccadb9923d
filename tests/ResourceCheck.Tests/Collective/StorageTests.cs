using System.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class StorageTests
{
    /// <summary>Tables hold 15 digits and are good to 1e-12.</summary>
    private const double TableTolerance = 1e-11;

    /// <summary>SciPy's expm_multiply on full d^N matrices; see tests/reference/collective.py.</summary>
    [Theory]
    [InlineData("no-photon")]
    [InlineData("fidelity")]
    [InlineData("symmetric-no-photon")]
    [InlineData("symmetric-fidelity")]
    public void Stored_states_agree_with_the_table(string kind)
    {
        TableRow[] rows = [.. TableRow.Of("collective").Where(r => r.Kind == kind)];
        Assert.True(rows.Length >= 9);
        foreach (TableRow row in rows)
        {
            foreach (bool reduce in new[] { true, false })
                Assert.Equal(row.Value, Figure(row, reduce), TableTolerance);
        }
    }

    [Theory]
    [InlineData("rate", ExchangeSign.Odd)]
    [InlineData("symmetric-rate", ExchangeSign.Even)]
    internal void Initial_rates_agree_with_the_table(string kind, ExchangeSign sign)
    {
        TableRow[] rows = [.. TableRow.Of("collective").Where(r => r.Kind == kind && r.Name != "two-three-level")];
        Assert.NotEmpty(rows);
        Assert.All(rows, row => Assert.Equal(row.Value, PhotonFreeStorage.InitialRate(CollectiveCases.Of(row), sign), 1e-12));
    }

    [Theory]
    [InlineData(0.3, 1, 1.1733, 5e-5)]
    [InlineData(0.1, 1, 0.154606303235, 1e-12)]
    [InlineData(0.05, 1, 0.0393, 5e-5)]
    [InlineData(0.1, 0.7, 0.231621440349, 1e-12)]
    public void A_triangle_decays_exponentially_at_its_initial_rate(double spacing, double second, double rate, double tolerance)
    {
        Transition[] transitions = [new(1, 1, CollectiveCases.Normal), new(1, second, CollectiveCases.Normal)];
        Couplings c = Couplings.From(EmitterShape.Ring(3, spacing), transitions);
        Assert.Equal(rate, PhotonFreeStorage.InitialRate(c, ExchangeSign.Odd), tolerance);
        StorageFigures figures = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(3);
        Assert.Equal(Math.Exp(-3 * PhotonFreeStorage.InitialRate(c, ExchangeSign.Odd)), figures.NoPhoton, 1e-11);
        Assert.Equal(1, figures.ConditionalFidelity, 1e-11);
        Assert.True(PhotonFreeStorage.InitialRate(c, ExchangeSign.Even) > c.TotalRate);
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    [InlineData(6)]
    public void At_one_point_the_antisymmetric_state_stays_and_its_counterpart_decays_twice_as_fast_at_first(int n)
    {
        Transition[] transitions = [.. Enumerable.Range(1, n - 1).Select(j => new Transition(0.5 + (0.3 * j), 1, CollectiveCases.Normal))];
        Couplings c = Couplings.From(EmitterShape.Point(n), transitions);
        StorageFigures dark = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(10);
        Assert.Equal((1.0, 1.0), (Math.Round(dark.NoPhoton, 11), Math.Round(dark.Fidelity, 11)));
        Assert.Equal(2 * c.TotalRate, PhotonFreeStorage.InitialRate(c, ExchangeSign.Even), 1e-12);
        double left = PhotonFreeStorage.Symmetric(c).AdvanceTo(1e-6).NoPhoton;
        Assert.Equal(2 * c.TotalRate, (1 - left) / 1e-6, 1e-3);
    }

    /// <summary>A second open channel: the pair decays at Γ_2 whatever transition 1 does.</summary>
    [Fact]
    public void Two_three_level_emitters_are_never_dark()
    {
        Couplings c = Couplings.From(EmitterShape.Point(2), [new(1, 1, CollectiveCases.Normal), new(0.4, 1, CollectiveCases.Normal)]);
        Assert.Equal(0.4, PhotonFreeStorage.InitialRate(c, ExchangeSign.Odd), 1e-15);
        Assert.Equal(Math.Exp(-0.8), PhotonFreeStorage.Antisymmetric(c).AdvanceTo(2).NoPhoton, 1e-12);
    }

    [Fact]
    public void A_general_geometry_keeps_its_printed_values()
    {
        StorageFigures figures = PhotonFreeStorage.Antisymmetric(CollectiveCases.General).AdvanceTo(2);
        Assert.Equal(0.123855361114, figures.NoPhoton, 6e-13);
        Assert.Equal(0.115611030730, figures.Fidelity, 6e-13);
    }

    [Theory]
    [InlineData(3, 3)]
    [InlineData(5, 5)]
    [InlineData(7, 7)]
    public void Equal_transitions_leave_as_many_amplitudes_as_emitters_and_the_same_result(int n, int dimension)
    {
        Couplings c = Couplings.From(EmitterShape.Chain(n, 0.12), CollectiveCases.Equal(n));
        PhotonFreeStorage few = PhotonFreeStorage.Antisymmetric(c), all = PhotonFreeStorage.Antisymmetric(c, reduce: false);
        Assert.Equal(dimension, few.Dimension);
        Assert.Equal((int)Numerics.States.AntisymmetricState.Factorial(n), all.Dimension);
        AssertClose(few.AdvanceTo(0.9), all.AdvanceTo(0.9));
        Assert.Equal(all.Ket(), few.Ket(), (a, b) => (a - b).Magnitude < 1e-10);
    }

    [Fact]
    public void Transitions_that_agree_in_groups_reduce_by_groups()
    {
        Transition[] transitions = [new(1, 1, [1, 0, 0]), new(0.6, 1, [0, 1, 1]), new(1, 1, [2, 0, 0]), new(1, 1, [1, 0, 0]), new(0.6, 1, [0, 3, 3])];
        Couplings c = Couplings.From(EmitterShape.Chain(6, 0.13), transitions);
        foreach (bool odd in new[] { true, false })
        {
            PhotonFreeStorage few = odd ? PhotonFreeStorage.Antisymmetric(c) : PhotonFreeStorage.Symmetric(c);
            PhotonFreeStorage all = odd ? PhotonFreeStorage.Antisymmetric(c, false) : PhotonFreeStorage.Symmetric(c, false);
            Assert.Equal(60, few.Dimension);
            AssertClose(few.AdvanceTo(0.7), all.AdvanceTo(0.7));
            Assert.Equal(all.Ket(), few.Ket(), (a, b) => (a - b).Magnitude < 1e-10);
        }
    }

    [Fact]
    public void Far_apart_emitters_decay_each_alone()
    {
        Couplings c = Couplings.From(EmitterShape.Ring(4, 1e7), CollectiveCases.Unequal(4));
        StorageFigures alone = PhotonFreeStorage.Independent(c, 0.8);
        Assert.Equal(Math.Exp(-2.4), alone.NoPhoton, 1e-15);
        StorageFigures stored = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(0.8);
        Assert.Equal(alone.NoPhoton, stored.NoPhoton, 1e-6);
        Assert.Equal(alone.Fidelity, stored.Fidelity, 1e-6);
        AssertClose(alone, PhotonFreeStorage.Antisymmetric(Couplings.Independent(4, [1, 1, 1])).AdvanceTo(0.8));
    }

    [Theory]
    [InlineData(1e-3)]
    [InlineData(1e-6)]
    [InlineData(1e-9)]
    public void The_error_estimate_bounds_the_error_and_follows_the_tolerance(double tolerance)
    {
        Couplings c = Couplings.From(EmitterShape.Ring(6, 0.09), CollectiveCases.Unequal(6));
        StorageFigures rough = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(1.5, tolerance), fine = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(1.5, 1e-14);
        Assert.InRange(Math.Abs(rough.NoPhoton - fine.NoPhoton), 0, rough.ErrorEstimate + fine.ErrorEstimate);
        Assert.InRange(Math.Abs(rough.Fidelity - fine.Fidelity), 0, rough.ErrorEstimate + fine.ErrorEstimate);
        Assert.InRange(rough.ErrorEstimate, fine.ErrorEstimate, 200 * tolerance);
    }

    [Fact]
    public void Times_in_between_change_nothing()
    {
        PhotonFreeStorage at_once = PhotonFreeStorage.Antisymmetric(CollectiveCases.General), by_steps = PhotonFreeStorage.Antisymmetric(CollectiveCases.General);
        foreach (double time in new[] { 0, 0.1, 0.1, 0.7, 1.3 })
            by_steps.AdvanceTo(time);
        AssertClose(at_once.AdvanceTo(2), by_steps.AdvanceTo(2));
    }

    /// <summary>Every run and coefficient of the fast kernel against H written out on d^N levels.</summary>
    [Theory]
    [InlineData(new[] { 1, 1, 1, 1 })]
    [InlineData(new[] { 2, 1, 1 })]
    [InlineData(new[] { 2, 2 })]
    [InlineData(new[] { 0, 3, 1 })]
    public void The_swap_kernel_does_what_the_written_out_Hamiltonian_does(int[] counts)
    {
        Couplings c = CollectiveCases.Uneven(counts.Length);
        WordBlock block = WordBlock.Of(counts);
        SwapTable table = SwapTable.From(block, c, [.. Enumerable.Range(1, c.Levels - 1)], ExchangeSign.Even);
        Complex[,] h = PlainReference.EffectiveHamiltonian(c);
        Complex[] source = [.. block.Codes.Select((_, q) => new Complex(Math.Sin(q), Math.Cos(3 * q)))];
        Complex[] target = new Complex[block.Size], sum = new Complex[block.Size];
        double norm = table.Step(source, target, 0.5, sum);
        for (int r = 0; r < block.Size; r++)
        {
            Complex expected = -0.5 * table.Shift * source[r];
            for (int q = 0; q < block.Size; q++)
                expected += 0.5 * -Complex.ImaginaryOne * h[Full(r), Full(q)] * source[q];
            Assert.Equal(0, (expected - target[r]).Magnitude, 1e-13);
        }

        Assert.Equal(target, sum);
        Assert.Equal(target.Sum(z => z.Magnitude * z.Magnitude), norm, 1e-12);
        int Full(int word) => block.FullIndex(block.Codes[word], c.Levels);
    }

    [Theory]
    [InlineData(new[] { 1, 1, 1, 1, 1 })]
    [InlineData(new[] { 2, 0, 3, 1 })]
    [InlineData(new[] { 1, 5 })]
    [InlineData(new[] { 0, 0, 4 })]
    public void Words_are_numbered_as_they_stand(int[] counts)
    {
        WordBlock block = WordBlock.Of(counts);
        Assert.Equal(WordBlock.Multinomial(counts), block.Size);
        Assert.Equal(block.Size, block.Codes.Distinct().Count());
        Assert.All(Enumerable.Range(0, block.Size), q => Assert.Equal(q, block.Rank(block.Codes[q])));
        Assert.All(block.Codes, code => Assert.Equal(code, WordBlock.FromFullIndex(block.FullIndex(code, counts.Length), counts.Length, block.Emitters)));
    }

    [Fact]
    public void Eight_emitters_with_unequal_dipoles_take_all_permutations_and_long_runs()
    {
        Couplings c = Couplings.From(EmitterShape.Ring(8, 0.1), CollectiveCases.Unequal(8));
        PhotonFreeStorage storage = PhotonFreeStorage.Antisymmetric(c);
        Assert.Equal(40320, storage.Dimension);
        Assert.Equal([720, 120, 24, 6, 2, 1, 1], storage.Generator.Lanes.Select(lane => lane.Length));
        StorageFigures figures = storage.AdvanceTo(0.2), finer = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(0.2, 1e-14);
        Assert.Equal(finer.NoPhoton, figures.NoPhoton, 1e-11);
        Assert.InRange(figures.Fidelity, 0, figures.NoPhoton);
    }

    [Fact]
    public void Nine_emitters_with_equal_dipoles_take_nine_amplitudes()
    {
        Couplings c = Couplings.From(EmitterShape.Ring(9, 0.1), CollectiveCases.Equal(9, 1.0 / 8));
        PhotonFreeStorage storage = PhotonFreeStorage.Antisymmetric(c);
        StorageFigures figures = storage.AdvanceTo(1);
        Assert.Equal(9, storage.Dimension);
        Assert.InRange(figures.NoPhoton, Math.Exp(-1), 1);
    }

    /// <summary>The figures at time 0 are 1 to the last digits, however many amplitudes share them.</summary>
    [Fact]
    public void Sums_over_all_permutations_of_nine_keep_their_digits()
    {
        const int Count = 362_880;
        Complex[] equal = new Complex[Count];
        Array.Fill(equal, 1 / Math.Sqrt(Count));
        Assert.Equal(1, AmplitudeLoops.NormSquared(equal), 1e-14);
        Assert.Equal(1, AmplitudeLoops.Overlap(equal, equal).Real, 1e-14);
        Assert.Equal(1.0 / 3, AmplitudeLoops.NormSquared(equal.AsSpan(1, Count / 3)), 1e-14); // a length that does not halve evenly
    }

    private static double Figure(TableRow row, bool reduce)
    {
        Couplings c = CollectiveCases.Of(row);
        PhotonFreeStorage storage = row.Kind.StartsWith("symmetric", StringComparison.Ordinal)
            ? PhotonFreeStorage.Symmetric(c, reduce) : PhotonFreeStorage.Antisymmetric(c, reduce);
        StorageFigures figures = storage.AdvanceTo(row.Number("time", 0));
        return row.Kind.EndsWith("fidelity", StringComparison.Ordinal) ? figures.Fidelity : figures.NoPhoton;
    }

    private static void AssertClose(StorageFigures expected, StorageFigures actual)
    {
        Assert.Equal(expected.NoPhoton, actual.NoPhoton, 1e-11);
        Assert.Equal(expected.Fidelity, actual.Fidelity, 1e-11);
    }
}
