using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Collective decay with photons: exact evolution of any density operator of N emitters with d levels, by Taylor series of the
/// Liouvillian of each <see cref="LiouvilleSector"/>. Operators are d^N × d^N, row after row; the first emitter is the most significant
/// digit.
/// </summary>
internal sealed class MasterEquation
{
    /// <summary>Share of the largest sector, equal numbers in rows and columns, for two two-level emitters; larger spaces have less.</summary>
    private const double LargestShare = 6.0 / 16;

    /// <summary>Most emitters: keys of sectors stay apart, and more would not fit memory with three levels.</summary>
    public const int MostEmitters = 8;

    private readonly EmitterSpace _space;
    private readonly Sectors _sectors;

    /// <summary>Prepares the evolution; d^N levels must fit an index and d^2N entries must fit memory.</summary>
    public MasterEquation(Couplings couplings)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(couplings.Emitters, MostEmitters);
        _space = new EmitterSpace(couplings);
        _sectors = new Sectors(_space);
    }

    /// <summary>At most this many bytes for a general operator: it and its image, and three arrays of its largest sector.</summary>
    public static double Bytes(int emitters, int levels) => 16 * (2 + (3 * LargestShare)) * Math.Pow(levels, 2 * emitters);

    /// <summary>ρ after a time, and the work it took.</summary>
    /// <param name="rho">Hermitian operator of any trace; not changed.</param>
    /// <param name="time">t ≥ 0.</param>
    /// <param name="photons">
    /// True for the state whatever was emitted. False for the part without a photon: its trace is the probability of that.
    /// </param>
    /// <param name="tolerance">Truncation, relative to the 2-norm of each sector and for each step.</param>
    public (Complex[] State, EvolutionWork Work) Evolve(
        Complex[] rho, double time, bool photons = true, double tolerance = TaylorEvolution.DefaultTolerance)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(time);
        return Follow(rho, [time], photons, tolerance).Single();
    }

    /// <summary>
    /// ρ at each of the times, which ascend from 0 on, and the work up to there. The operator is the same object every time: what is to
    /// be kept of it must be read before the next time is asked for.
    /// </summary>
    public IEnumerable<(Complex[] State, EvolutionWork Work)> Follow(
        Complex[] rho, IEnumerable<double> times, bool photons = true, double tolerance = TaylorEvolution.DefaultTolerance)
    {
        Part[] parts = [.. _sectors.Occupied(rho, photons).Select(pairs => new Part(pairs, new LiouvilleSector(_space, pairs, photons), _sectors.Take(rho, pairs)))];
        Complex[] result = new Complex[rho.Length];
        EvolutionWork work = new(0, 0, 0, tolerance);
        double now = 0;
        foreach (double time in times)
        {
            foreach (Part part in parts)
            {
                work += TaylorEvolution.Advance(part.Sector, part.Entries, time - now, tolerance);
                _sectors.Put(part.Entries, part.Pairs, result);
            }

            now = time;
            yield return (result, work);
        }
    }

    /// <summary>A sector with its entries now.</summary>
    private sealed record Part(IReadOnlyList<BlockPair> Pairs, LiouvilleSector Sector, Complex[] Entries);
}
