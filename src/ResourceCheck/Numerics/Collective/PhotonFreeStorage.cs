using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Storage of |S_N⟩, or of its counterpart with all signs +, in emitters side by side until a photon is emitted. With one excitation
/// the no-photon state stays within the N! ways of handing N levels to N emitters, fewer when transitions share their couplings.
/// A photon leaves all emitters in lower levels, orthogonal to |S_N⟩, so that the fidelity of all copies needs no more than this.
/// </summary>
internal sealed class PhotonFreeStorage
{
    /// <summary>Most emitters: 10 would take 3628800 amplitudes and 200 MB of targets.</summary>
    public const int MostEmitters = 9;

    private readonly Couplings _couplings;
    private readonly PermutationState _frame;
    private readonly SwapTable _generator;
    private readonly Complex[] _start;

    private PhotonFreeStorage(Couplings couplings, LevelGroups groups, ExchangeSign sign)
    {
        WordBlock block = WordBlock.Of(groups.Counts);
        _couplings = couplings;
        _frame = new PermutationState(groups, block, sign);
        _generator = SwapTable.From(block, couplings, groups.Transitions, sign);
        _start = _frame.Amplitudes();
        State = [.. _start];
    }

    /// <summary>Amplitudes now; unnormalised.</summary>
    public Complex[] State { get; }

    /// <summary>Storage time so far.</summary>
    public double Time { get; private set; }

    /// <summary>Work and error so far.</summary>
    public EvolutionWork Work { get; private set; }

    /// <summary>Number of amplitudes: N when all transitions share their couplings, up to N!.</summary>
    public int Dimension => _generator.Size;

    /// <summary>The generator in use.</summary>
    public SwapTable Generator => _generator;

    /// <summary>Starts at time 0 with |S_N⟩ in levels 0 … N-1; needs d ≥ N ≥ 2.</summary>
    /// <param name="couplings">Couplings of N emitters.</param>
    /// <param name="reduce">False keeps every level for itself: slower, and the same result.</param>
    public static PhotonFreeStorage Antisymmetric(Couplings couplings, bool reduce = true) => From(couplings, reduce, ExchangeSign.Odd);

    /// <summary>Starts at time 0 with (1/√N!) Σ_π |π(0) … π(N-1)⟩.</summary>
    public static PhotonFreeStorage Symmetric(Couplings couplings, bool reduce = true) => From(couplings, reduce, ExchangeSign.Even);

    /// <summary>Figures of emitters with the same rates that decay each alone: both are exp(-Γ_tot t).</summary>
    public static StorageFigures Independent(Couplings couplings, double time)
    {
        double left = Math.Exp(-couplings.TotalRate * time);
        return new StorageFigures(time, left, left, 0);
    }

    /// <summary>
    /// Rate -d(no-photon probability)/dt at the start: Σ_j Γ_j ∓ (1/(N(N-1))) Σ_{j&lt;N} Σ_{i≠k} γ^j_ik, minus for |S_N⟩, plus for its
    /// counterpart; it is Σ_j Γ_j when each decays alone. Where |S_N⟩ is an eigenvector this is its rate for ever.
    /// </summary>
    public static double InitialRate(Couplings couplings, ExchangeSign sign)
    {
        int n = couplings.Emitters;
        double shared = 0;
        foreach (double[,] gamma in couplings.Decay.Take(n - 1))
            shared += gamma.Cast<double>().Sum() - (n * gamma[0, 0]);
        shared /= n * (n - 1.0);
        return couplings.TotalRate + (sign == ExchangeSign.Odd ? -shared : shared);
    }

    /// <summary>Goes on to a later time and returns the figures there.</summary>
    public StorageFigures AdvanceTo(double time, double tolerance = TaylorEvolution.DefaultTolerance)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(time, Time);
        Work += TaylorEvolution.Advance(_generator, State, time - Time, tolerance);
        Time = time;
        return Figures();
    }

    /// <summary>
    /// The unnormalised no-photon state as d^N amplitudes; the first emitter is the most significant digit. With 8 emitters they take
    /// 256 MiB; 9 are refused.
    /// </summary>
    public Complex[] Ket()
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(_couplings.Emitters, States.AntisymmetricState.MostParties);
        return _frame.Expand(State, _couplings.Levels);
    }

    private StorageFigures Figures()
    {
        double norm = AmplitudeLoops.NormSquared(State), overlap = AmplitudeLoops.Overlap(_start, State).Magnitude;
        return new StorageFigures(Time, norm, overlap * overlap, 2 * Work.ErrorEstimate);
    }

    private static PhotonFreeStorage From(Couplings couplings, bool reduce, ExchangeSign sign)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(couplings.Emitters, 2);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(couplings.Emitters, MostEmitters);
        ArgumentOutOfRangeException.ThrowIfLessThan(couplings.Levels, couplings.Emitters);
        return new PhotonFreeStorage(couplings, reduce ? LevelGroups.Of(couplings) : LevelGroups.Single(couplings.Emitters), sign);
    }
}
