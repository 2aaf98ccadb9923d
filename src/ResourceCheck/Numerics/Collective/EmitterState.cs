using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>A state vector of N emitters as the blocks of words that it has amplitudes in.</summary>
internal sealed class EmitterState(EmitterSpace space, SortedDictionary<ulong, Complex[]> blocks)
{
    /// <summary>Amplitudes of each block, by key.</summary>
    public SortedDictionary<ulong, Complex[]> Blocks => blocks;

    /// <summary>⟨ψ|ψ⟩.</summary>
    public double NormSquared => blocks.Values.Sum(block => AmplitudeLoops.NormSquared(block));

    /// <summary>Splits d^N amplitudes; the first emitter is the most significant digit.</summary>
    public static EmitterState From(EmitterSpace space, Complex[] ket)
    {
        SortedDictionary<ulong, Complex[]> blocks = [];
        for (int index = 0; index < ket.Length; index++)
        {
            if (ket[index] == Complex.Zero)
                continue;
            ulong code = WordBlock.FromFullIndex(index, space.Levels, space.Emitters), key = space.KeyOf(code);
            WordBlock block = space.Block(key);
            if (!blocks.TryGetValue(key, out Complex[]? amplitudes))
                blocks.Add(key, amplitudes = new Complex[block.Size]);
            amplitudes[block.Rank(code)] = ket[index];
        }

        return new EmitterState(space, blocks);
    }

    /// <summary>The d^N amplitudes.</summary>
    public Complex[] Ket()
    {
        Complex[] ket = new Complex[States.AntisymmetricState.Power(space.Levels, space.Emitters)];
        foreach ((ulong key, Complex[] amplitudes) in blocks)
        {
            WordBlock block = space.Block(key);
            for (int q = 0; q < amplitudes.Length; q++)
                ket[block.FullIndex(block.Codes[q], space.Levels)] = amplitudes[q];
        }

        return ket;
    }

    /// <summary>A state of its own with the same amplitudes.</summary>
    public EmitterState Copy() => new(space, new(blocks.ToDictionary(block => block.Key, block => block.Value.ToArray())));

    /// <summary>Goes on for a time without a photon.</summary>
    public EvolutionWork Advance(double time, double tolerance)
    {
        EvolutionWork work = new(0, 0, 0, tolerance);
        foreach ((ulong key, Complex[] amplitudes) in blocks)
            work += TaylorEvolution.Advance(space.Table(key), amplitudes, time, tolerance);
        return work;
    }

    /// <summary>J|ψ⟩ of one channel.</summary>
    public EmitterState After(JumpChannel channel)
    {
        SortedDictionary<ulong, Complex[]> result = [];
        foreach ((ulong key, Complex[] amplitudes) in blocks)
        {
            if (EmitterSpace.Count(key, 0) > 0)
                result.Add(EmitterSpace.After(key, channel.Transition), Lowered(key, amplitudes, channel));
        }

        return new EmitterState(space, result);
    }

    /// <summary>Multiplies all amplitudes.</summary>
    public void Scale(double factor)
    {
        foreach (Complex[] amplitudes in blocks.Values)
            AmplitudeLoops.Scale(amplitudes, factor);
    }

    /// <summary>Largest ‖B‖ among the blocks: how fast the state can turn.</summary>
    public double Bound => blocks.Keys.Max(key => space.Table(key).Bound);

    /// <summary>Whether a photon can still be emitted.</summary>
    public bool Excited => blocks.Keys.Any(key => EmitterSpace.Count(key, 0) > 0);

    private Complex[] Lowered(ulong key, Complex[] amplitudes, JumpChannel channel)
    {
        ulong after = EmitterSpace.After(key, channel.Transition);
        Lift lift = space.Lift(after, channel.Transition);
        Complex[] lowered = new Complex[space.Block(after).Size];
        for (int k = 0; k < lift.Parents.Length; k++)
            lowered[k / lift.PerWord] += channel.Amplitudes[lift.Places[k]] * amplitudes[lift.Parents[k]];
        return lowered;
    }
}
