using System.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Numerics.States;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class QuantumJumpsTests
{
    private const ulong Seed = 20240607;

    [Fact]
    public void Channels_add_up_to_the_shared_decay()
    {
        Couplings c = CollectiveCases.Uneven(4);
        IReadOnlyList<JumpChannel> channels = JumpChannel.Of(c);
        Assert.Equal(12, channels.Count);
        for (int at = 0; at < 48; at++)
        {
            (int j, int i, int k) = (at / 16, at / 4 % 4, at % 4);
            double sum = channels.Where(ch => ch.Transition == j + 1).Sum(ch => ch.Amplitudes[i] * ch.Amplitudes[k]);
            Assert.Equal(c.Decay[j][i, k], sum, 1e-13);
        }
    }

    [Fact]
    public void Emitters_at_one_point_have_one_channel_for_each_transition()
    {
        IReadOnlyList<JumpChannel> channels = JumpChannel.Of(Couplings.From(EmitterShape.Point(5), CollectiveCases.Equal(4)));
        Assert.Equal([1, 2, 3], channels.Select(ch => ch.Transition));
        Assert.All(channels, ch => Assert.Equal(5, ch.Rate, 1e-12));
    }

    /// <summary>Intervals hold with 1 - 1e-9 each, so that a miss is an error and not bad luck.</summary>
    [Fact]
    public void Trajectories_average_to_the_master_equation()
    {
        Couplings c = CollectiveCases.General;
        Complex[] start = StartStates.Product([0, 0, 1], 3);
        Complex[] rho = new MasterEquation(c).Evolve(StartStates.Operator(start), 0.8).State;
        int[] levels = [1, 5, 14, 25];
        IReadOnlyList<SampledMean> means = new QuantumJumps(c, start).Average(
            0.8, Seed, 3000, 1 - 1e-9, [.. levels.Select<int, Func<Trajectory, double>>(i => t => Population(t, i))]);
        for (int k = 0; k < levels.Length; k++)
        {
            Assert.InRange(rho[levels[k] * 28].Real, means[k].Low, means[k].High);
            Assert.True(Math.Abs(rho[levels[k] * 28].Real - means[k].Mean) < 6 * means[k].StandardError + 1e-4);
        }
    }

    [Fact]
    public void A_trajectory_depends_on_its_seed_and_index_alone()
    {
        QuantumJumps jumps = new(CollectiveCases.General, StartStates.Inverted(3, 3));
        Trajectory alone = jumps.Run(2, Seed, 17);
        Trajectory[] crowd = new Trajectory[40];
        Parallel.For(0, 40, i => crowd[i] = jumps.Run(2, Seed, i));
        Assert.Equal(alone.State.Ket(), crowd[17].State.Ket());
        Assert.Equal(alone.Photons.Select(p => p.Time), crowd[17].Photons.Select(p => p.Time));
        Assert.NotEqual(alone.Photons.Select(p => p.Time), jumps.Run(2, Seed + 1, 17).Photons.Select(p => p.Time));
        Assert.NotEqual(alone.Photons.Select(p => p.Time), crowd[16].Photons.Select(p => p.Time));
    }

    [Fact]
    public void Every_excitation_leaves_as_one_photon_in_the_end()
    {
        QuantumJumps jumps = new(Couplings.From(EmitterShape.Chain(3, 0.4), CollectiveCases.Equal(3)), StartStates.Inverted(3, 3));
        for (int i = 0; i < 20; i++)
        {
            Trajectory trajectory = jumps.Run(300, Seed, i);
            Assert.Equal(3, trajectory.Photons.Count);
            Assert.False(trajectory.State.Excited);
            Assert.Equal(1, trajectory.State.NormSquared, 1e-12);
            Assert.Equal(trajectory.Photons.Select(p => p.Time).Order(), trajectory.Photons.Select(p => p.Time));
        }
    }

    /// <summary>Times of the only photon of independent emitters are exponential: mean 1/Γ_tot and the tail exp(-Γ_tot t).</summary>
    [Fact]
    public void Waiting_times_are_exponential_for_independent_emitters()
    {
        QuantumJumps jumps = new(Couplings.Independent(3, [1, 1]), AntisymmetricState.Ket(3));
        double[] times = [.. Enumerable.Range(0, 2000).Select(i => jumps.Run(50, Seed, i).Photons[0].Time)];
        Assert.Equal(0.5, times.Average(), 6 * 0.5 / Math.Sqrt(2000));
        Assert.Equal(Math.Exp(-1), times.Count(t => t > 0.5) / 2000.0, 6 * Math.Sqrt(0.25 / 2000));
    }

    [Fact]
    public void Looking_on_the_way_changes_nothing()
    {
        QuantumJumps jumps = new(CollectiveCases.General, StartStates.Inverted(3, 3));
        for (int index = 0; index < 20; index++)
        {
            List<int> photons = [];
            Trajectory looked = jumps.Run([0, 0.3, 0.3, 0.9, 2], Seed, index, (_, _, seen) => photons.Add(seen)), alone = jumps.Run(2, Seed, index);
            Assert.Equal(alone.Photons.Select(p => p.Channel), looked.Photons.Select(p => p.Channel));
            Assert.Equal(alone.Photons.Select(p => p.Time), looked.Photons.Select(p => p.Time), (a, b) => Math.Abs(a - b) < 1e-7);
            Assert.Equal(new[] { 0, 0.3, 0.3, 0.9, 2 }.Select(t => alone.Photons.Count(p => p.Time <= t)), photons);
            Assert.Equal(alone.State.Ket(), looked.State.Ket(), (a, b) => (a - b).Magnitude < 1e-6);
        }
    }

    [Fact]
    public void Six_emitters_follow_their_no_photon_probability()
    {
        Couplings c = Couplings.From(EmitterShape.Ring(6, 0.15), CollectiveCases.Unequal(6));
        Complex[] start = AntisymmetricState.Ket(6);
        QuantumJumps jumps = new(c, start);
        SampledMean quiet = jumps.Average(0.5, Seed, 200, 1 - 1e-9, t => t.Photons.Count == 0 ? 1 : 0)[0];
        Assert.InRange(PhotonFreeStorage.Antisymmetric(c).AdvanceTo(0.5).NoPhoton, quiet.Low, quiet.High);
        Assert.Equal(PhotonFreeStorage.Antisymmetric(c).AdvanceTo(0.5).NoPhoton, quiet.Mean, 6 * Math.Sqrt(0.25 / 200));
    }

    [Fact]
    public void Kets_come_back_as_they_went_in()
    {
        Complex[] ket = [.. Enumerable.Range(0, 27).Select(i => new Complex(Math.Sin(i), i % 5))];
        QuantumJumps jumps = new(CollectiveCases.General, ket);
        Assert.Equal(ket, EmitterState.From(jumps.Space, ket).Ket());
    }

    [Fact]
    public void Few_values_leave_a_wide_interval_and_many_a_narrow_one()
    {
        Assert.Equal((0.0, 1.0), (SampledMean.From([0.3], 0.95).Low, SampledMean.From([0.3], 0.95).High));
        SampledMean coin = SampledMean.From([.. Enumerable.Range(0, 10000).Select(i => i % 2.0)], 0.95);
        Assert.Equal(0.5, coin.Mean);
        Assert.InRange(coin.High - coin.Low, 2 * 1.96 * coin.StandardError, 8 * coin.StandardError);
    }

    private static double Population(Trajectory trajectory, int index) => Math.Min(1, Math.Pow(trajectory.State.Ket()[index].Magnitude, 2));
}
