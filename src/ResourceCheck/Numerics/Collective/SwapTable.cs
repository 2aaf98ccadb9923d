using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// -iH with H = Σ_j Σ_ik (Ω^j_ik - iγ^j_ik/2) σ^j†_i σ^j_k on one block of words, σ^j = |j⟩⟨0|: the no-photon evolution of
/// J. Dalibard, Y. Castin and K. Mølmer, Phys. Rev. Lett. 68, 580 (1992) for the couplings of R. H. Lehmberg, Phys. Rev. A 2, 883 (1970).
/// The diagonal is -(Γ_tot/2) times the number of excited emitters, the same for every word; the rest swaps an excited emitter with another.
/// </summary>
internal sealed class SwapTable : IGenerator
{
    /// <summary>Words that one task works on: targets and their sums (34 KiB) stay in the nearest cache, and 6! keeps runs whole.</summary>
    private const int Chunk = 720;

    /// <summary>
    /// Words from which chunks go to several cores. Each core reads what the others have just written: for the 40320 words of 8 emitters
    /// fetching that takes as long as it saves, for the 362880 of 9 it pays.
    /// </summary>
    private const int ParallelFrom = 100_000;

    private readonly SwapLane[] _lanes;
    private readonly Complex[] _coefficients;
    private readonly Complex[] _conjugates;

    private SwapTable(WordBlock block, SwapLane[] lanes, Complex[] coefficients, double shift)
    {
        Block = block;
        _lanes = lanes;
        _coefficients = coefficients;
        _conjugates = [.. coefficients.Select(Complex.Conjugate)];
        Shift = shift;
        Bound = LargestRow();
    }

    /// <summary>The words it acts on.</summary>
    public WordBlock Block { get; }

    /// <inheritdoc/>
    public int Size => Block.Size;

    /// <inheritdoc/>
    public double Shift { get; }

    /// <summary>Largest row sum. The matrix is symmetric, so that this bounds the 2-norm.</summary>
    public double Bound { get; }

    /// <summary>One swap each.</summary>
    public IReadOnlyList<SwapLane> Lanes => _lanes;

    /// <summary>-iΩ - γ/2, with and without the sign of moving a letter past its like.</summary>
    public IReadOnlyList<Complex> Coefficients => _coefficients;

    /// <param name="block">Words; letter 0 is excited.</param>
    /// <param name="couplings">γ and Ω of all transitions; they give the common decay.</param>
    /// <param name="transitions">For letter l ≥ 1 the transition (from 1) whose couplings move it: entry l-1.</param>
    /// <param name="sign">What repeated letters stand for.</param>
    public static SwapTable From(WordBlock block, Couplings couplings, int[] transitions, ExchangeSign sign) => new(
        block,
        SwapLanes.Of(block, sign, Chunk),
        SwapLanes.Coefficients(couplings, transitions),
        -0.5 * couplings.TotalRate * block.Counts[0]);

    /// <inheritdoc/>
    public double Step(Complex[] source, Complex[] target, double scale, Complex[] sum)
    {
        int chunks = (Size + Chunk - 1) / Chunk;
        double[] squares = new double[chunks];
        if (Size < ParallelFrom)
        {
            for (int i = 0; i < chunks; i++)
                squares[i] = StepChunk(i, source, target, scale, sum);
        }
        else
        {
            ChunkLoop.Run(chunks, i => squares[i] = StepChunk(i, source, target, scale, sum));
        }

        return squares.Sum();
    }

    /// <summary>target += B·source on one column of amplitudes, or its conjugate map.</summary>
    public void Accumulate(ReadOnlySpan<Complex> source, Span<Complex> target, bool conjugate) =>
        SwapKernel.Accumulate(_lanes, conjugate ? _conjugates : _coefficients, source, target, 0);

    private double StepChunk(int index, Complex[] source, Complex[] target, double scale, Complex[] sum)
    {
        int start = index * Chunk, length = Math.Min(Chunk, Size - start);
        Span<Complex> rows = target.AsSpan(start, length);
        rows.Clear();
        SwapKernel.Accumulate(_lanes, _coefficients, source, rows, start);
        return AmplitudeLoops.Finish(rows, scale, sum.AsSpan(start, length));
    }

    private double LargestRow()
    {
        double[] sizes = [.. _coefficients.Select(Complex.Abs)];
        double largest = 0;
        for (int q = 0; q < Size; q++)
        {
            double row = 0;
            foreach (SwapLane lane in _lanes)
                row += sizes[lane.Coefficient(q)];
            largest = Math.Max(largest, row);
        }

        return largest;
    }
}
