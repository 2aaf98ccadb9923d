using System.Numerics;
using ResourceCheck.Numerics.Randomness;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Collective decay with photons by quantum jumps: J. Dalibard, Y. Castin and K. Mølmer, Phys. Rev. Lett. 68, 580 (1992). Between photons
/// the state follows exp(-iHt); the next photon comes when ‖ψ‖² has fallen to a uniform random number, and channel J is taken with
/// probability in proportion to ‖Jψ‖². The mean of |ψ⟩⟨ψ| over trajectories obeys the master equation.
/// Departure: the waiting time is solved for, where the paper steps by small times.
/// </summary>
internal sealed class QuantumJumps
{
    /// <summary>‖B‖h of the steps between looks at the norm: one Taylor step.</summary>
    private const double Look = 6;

    /// <summary>How near ‖ψ‖² must come to the random number: far below what any number of trajectories can resolve.</summary>
    private const double NormTolerance = 1e-9;

    /// <summary>Halvings alone reach the tolerance within this many; false position rarely takes ten.</summary>
    private const int MostSearches = 60;

    private readonly EmitterSpace _space;
    private readonly EmitterState _start;
    private readonly IReadOnlyList<JumpChannel> _channels;
    private readonly double _tolerance;

    /// <param name="couplings">γ and Ω.</param>
    /// <param name="start">d^N amplitudes of norm 1; the first emitter is the most significant digit.</param>
    /// <param name="tolerance">Truncation of each no-photon step.</param>
    public QuantumJumps(Couplings couplings, Complex[] start, double tolerance = TaylorEvolution.DefaultTolerance)
    {
        _space = new EmitterSpace(couplings);
        _start = EmitterState.From(_space, start);
        _channels = JumpChannel.Of(couplings);
        _tolerance = tolerance;
    }

    /// <summary>The blocks of the emitters, for observables of <see cref="EmitterState"/>.</summary>
    public EmitterSpace Space => _space;

    /// <summary>The trajectory of one index: the same for the same seed, whatever runs beside it.</summary>
    public Trajectory Run(double time, ulong seed, long index) => Run([time], seed, index, static (_, _, _) => { });

    /// <summary>The trajectory of one index, looked at on its way; looking changes nothing.</summary>
    /// <param name="times">When to look, ascending from 0 on; the trajectory ends at the last of them.</param>
    /// <param name="seed">Seed of all trajectories.</param>
    /// <param name="index">Its number.</param>
    /// <param name="look">Gets the number of the time, the state there (not normalised, not to be changed) and the photons so far.</param>
    public Trajectory Run(IReadOnlyList<double> times, ulong seed, long index, Action<int, EmitterState, int> look)
    {
        Xoshiro256 random = Xoshiro256.Stream(seed, (ulong)index);
        EmitterState state = _start.Copy();
        List<Photon> photons = [];
        EvolutionWork work = new(0, 0, 0, _tolerance);
        double now = 0, u = random.NextUnit();
        for (int i = 0; i < times.Count; i++)
        {
            now += UntilPhoton(ref state, times[i] - now, u, ref work, out bool emitted);
            while (emitted)
            {
                (JumpChannel channel, state) = Choose(state, random.NextUnit());
                photons.Add(new Photon(now, channel));
                u = random.NextUnit();
                now += UntilPhoton(ref state, times[i] - now, u, ref work, out emitted);
            }

            look(i, state, photons.Count);
        }

        return new Trajectory(index, Normalised(state), photons, work);
    }

    /// <summary>Goes on until ‖ψ‖² = u or the time is over; returns the time that passed.</summary>
    private double UntilPhoton(ref EmitterState state, double time, double u, ref EvolutionWork work, out bool emitted)
    {
        emitted = false;
        if (!state.Excited || time <= 0)
            return time;
        int looks = (int)Math.Clamp(Math.Ceiling(state.Bound * time / Look), 1, int.MaxValue);
        double step = time / looks;
        for (int i = 0; i < looks; i++)
        {
            EmitterState next = state.Copy();
            work += next.Advance(step, _tolerance);
            if (next.NormSquared <= u)
            {
                emitted = true;
                return (i * step) + Search(ref state, step, next.NormSquared, u, ref work);
            }

            state = next;
        }

        return time;
    }

    /// <summary>Illinois false position for ln‖ψ‖² = ln u within one step; the state ends at the time returned.</summary>
    private double Search(ref EmitterState state, double step, double normAtEnd, double u, ref EvolutionWork work)
    {
        double low = 0, high = step, atLow = Math.Log(state.NormSquared / u), atHigh = Math.Log(normAtEnd / u);
        int side = 0;
        for (int i = 0; i < MostSearches && atLow > NormTolerance; i++)
        {
            double middle = Middle(low, high, atLow, atHigh, i);
            EmitterState there = state.Copy();
            work += there.Advance(middle - low, _tolerance);
            double value = Math.Log(there.NormSquared / u);
            if (Math.Abs(value) <= NormTolerance)
            {
                state = there;
                return middle;
            }

            if (value > 0)
            {
                (state, low, atLow) = (there, middle, value);
                atHigh = side == 1 ? atHigh / 2 : atHigh;
                side = 1;
            }
            else
            {
                (high, atHigh) = (middle, value);
                atLow = side == -1 ? atLow / 2 : atLow;
                side = -1;
            }
        }

        return low;
    }

    /// <summary>Every third look halves, so that a norm that fell to zero cannot stall the search.</summary>
    private static double Middle(double low, double high, double atLow, double atHigh, int turn)
    {
        double weight = atLow / (atLow - atHigh);
        return turn % 3 == 2 || !double.IsFinite(weight) ? (low + high) / 2 : low + (weight * (high - low));
    }

    private (JumpChannel Channel, EmitterState State) Choose(EmitterState state, double u)
    {
        EmitterState[] after = [.. _channels.Select(state.After)];
        double[] weights = [.. after.Select(s => s.NormSquared)];
        double rest = u * weights.Sum();
        int chosen = 0;
        while (chosen < weights.Length - 1 && rest >= weights[chosen])
            rest -= weights[chosen++];
        return (_channels[chosen], Normalised(after[chosen]));
    }

    private static EmitterState Normalised(EmitterState state)
    {
        state.Scale(1 / Math.Sqrt(state.NormSquared));
        return state;
    }
}
