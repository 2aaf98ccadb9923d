using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Part of the collective master equation dρ/dt = -i[Σ_j Σ_ik Ω^j_ik σ^j†_i σ^j_k, ρ] + Σ_j Σ_ik γ^j_ik (σ^j_i ρ σ^j†_k - ½{σ^j†_k σ^j_i, ρ})
/// (R. H. Lehmberg, Phys. Rev. A 2, 883 (1970)) that is closed in itself: row and column differ by the same numbers of emitters in
/// each level, and every entry can be reached from where the start has entries. A photon moves rows and columns alike.
/// </summary>
internal sealed class LiouvilleSector : IGenerator
{
    /// <summary>Entries from which rows are shared between cores.</summary>
    private const int ParallelFrom = 20_000;

    /// <summary>Enough that cores finish together, few enough that taking one costs nothing.</summary>
    private const int Chunks = 64;

    private readonly double _totalRate;
    private readonly (PairLinks Links, int Row)[] _rows;

    /// <param name="space">Blocks of the emitters.</param>
    /// <param name="pairs">Pairs of blocks, closed under photons, starts ascending without gaps.</param>
    /// <param name="photons">False leaves out σρσ†: what is then left is the part without a photon.</param>
    public LiouvilleSector(EmitterSpace space, IReadOnlyList<BlockPair> pairs, bool photons)
    {
        _totalRate = space.Couplings.TotalRate;
        Size = pairs.Sum(pair => pair.Size);
        Dictionary<ulong, BlockPair> byRow = pairs.ToDictionary(pair => pair.Row);
        PairLinks[] links = [.. pairs.Select(pair => PairLinks.From(space, pair, byRow, photons))];
        _rows = [.. links.SelectMany(link => Enumerable.Range(0, link.Pair.Rows).Select(row => (link, row)))];
        Shift = (pairs.Min(Diagonal) + pairs.Max(Diagonal)) / 2;
        Bound = Math.Sqrt(links.Max(RowSum) * links.Max(link => ColumnSum(link, photons)));
    }

    /// <inheritdoc/>
    public int Size { get; }

    /// <inheritdoc/>
    public double Shift { get; }

    /// <summary>√(largest row sum · largest column sum), each from the numbers of emitters in each level.</summary>
    public double Bound { get; }

    /// <inheritdoc/>
    public double Step(Complex[] source, Complex[] target, double scale, Complex[] sum)
    {
        double[] squares = new double[_rows.Length];
        int chunks = Size < ParallelFrom ? 1 : Math.Min(Chunks, squares.Length);
        ChunkLoop.Run(chunks, chunk =>
        {
            int end = (int)((long)squares.Length * (chunk + 1) / chunks);
            for (int i = (int)((long)squares.Length * chunk / chunks); i < end; i++)
                squares[i] = StepRow(i, source, target, scale, sum);
        });
        return squares.Sum();
    }

    private double StepRow(int index, Complex[] source, Complex[] target, double scale, Complex[] sum)
    {
        (PairLinks links, int row) = _rows[index];
        BlockPair pair = links.Pair;
        int start = pair.Start + (row * pair.Columns);
        Span<Complex> result = target.AsSpan(start, pair.Columns);
        result.Clear();
        SwapKernel.Add(Diagonal(pair) - Shift, source.AsSpan(start, pair.Columns), result);
        AddRows(links, row, source, result);
        links.Columns.Accumulate(source.AsSpan(start, pair.Columns), result, conjugate: true);
        foreach (PhotonLink photon in links.Photons)
            AddPhotons(photon, row, source, result);
        return AmplitudeLoops.Finish(result, scale, sum.AsSpan(start, pair.Columns));
    }

    private static void AddRows(PairLinks links, int row, Complex[] source, Span<Complex> result)
    {
        BlockPair pair = links.Pair;
        foreach (SwapLane lane in links.Rows.Lanes)
        {
            int from = pair.Start + (lane.Target(row) * pair.Columns);
            SwapKernel.Add(links.Rows.Coefficients[lane.Coefficient(row)], source.AsSpan(from, pair.Columns), result);
        }
    }

    private static void AddPhotons(PhotonLink photon, int row, Complex[] source, Span<Complex> result)
    {
        (BlockPair parent, Lift rows, Lift columns, double[,] gamma) = photon;
        for (int k = row * rows.PerWord; k < (row + 1) * rows.PerWord; k++)
        {
            ReadOnlySpan<Complex> line = source.AsSpan(parent.Start + (rows.Parents[k] * parent.Columns), parent.Columns);
            int place = rows.Places[k], next = 0;
            for (int column = 0; column < result.Length; column++)
            {
                Complex sum = Complex.Zero;
                for (int l = 0; l < columns.PerWord; l++, next++)
                    sum += gamma[place, columns.Places[next]] * line[columns.Parents[next]];
                result[column] += sum;
            }
        }
    }

    private double Diagonal(BlockPair pair) =>
        -0.5 * _totalRate * (EmitterSpace.Count(pair.Row, 0) + EmitterSpace.Count(pair.Column, 0));

    private double Swaps(PairLinks links) => Math.Abs(Diagonal(links.Pair) - Shift) + links.Rows.Bound + links.Columns.Bound;

    /// <summary>|γ^j_ik| ≤ Γ_j, once for each place of level j in the row's word and in the column's.</summary>
    private double RowSum(PairLinks links) =>
        Swaps(links) + links.Photons.Sum(photon => photon.Gamma[0, 0] * photon.Rows.PerWord * photon.Columns.PerWord);

    private double ColumnSum(PairLinks links, bool photons) => Swaps(links)
        + (photons ? _totalRate * EmitterSpace.Count(links.Pair.Row, 0) * EmitterSpace.Count(links.Pair.Column, 0) : 0);
}
