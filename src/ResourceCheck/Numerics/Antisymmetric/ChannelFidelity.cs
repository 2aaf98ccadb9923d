using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Overlap of m of N parties with |S_m⟩ on the lowest m levels after a channel on each, the others having been read out with given operators. Picks the
/// cheapest sum that applies: incoherent channels, few Kraus operators, or any.
/// </summary>
internal sealed class ChannelFidelity
{
    private readonly IReadOnlyList<LocalChannel> _channels;
    private readonly IReadOnlyList<LocalOperator> _others;
    private readonly Complex[,]? _frame;

    private ChannelFidelity(IReadOnlyList<LocalChannel> channels, IReadOnlyList<LocalOperator> others, Complex[,]? frame)
    {
        (_channels, _others, _frame) = (channels, others, frame);
        (Method, Work, Bytes) = Cheapest();
    }

    /// <summary>How the sum is made.</summary>
    public FidelityMethod Method { get; }

    /// <summary>Multiplications.</summary>
    public double Work { get; }

    /// <summary>Bytes held.</summary>
    public double Bytes { get; }

    /// <summary>Prepares the sum; nothing large is allocated.</summary>
    /// <param name="channels">m channels.</param>
    /// <param name="others">Operators of the N-m parties that were read out.</param>
    /// <param name="frame">A unitary that all m parties were meant to apply, in which the channels may look simpler; null for none.</param>
    public static ChannelFidelity Of(IReadOnlyList<LocalChannel> channels, IReadOnlyList<LocalOperator> others, Complex[,]? frame)
    {
        ChannelFidelity plain = new(channels, others, null);
        if (frame is null || plain.Method == FidelityMethod.Incoherent || others.Count == 0)
            return plain;
        ChannelFidelity turned = new([.. channels.Select(c => c.SeenFrom(frame))], others, frame);
        return turned.Method == FidelityMethod.Incoherent && turned.Work < plain.Work ? turned : plain;
    }

    /// <summary>The overlap, an unnormalised probability.</summary>
    public RoundedSum Overlap() => Method switch
    {
        FidelityMethod.Incoherent => IncoherentFidelity.Of([.. All().Select(IncoherentChannel.Of)]).Times(Norm()),
        FidelityMethod.FewKraus => KrausStrings.Fidelity([.. All()]).Times(Norm()),
        _ => FourSubsets.Overlap(_channels, Minors()),
    };

    private (FidelityMethod Method, double Work, double Bytes) Cheapest()
    {
        List<(FidelityMethod Method, double Work, double Bytes)> ways = [];
        int m = _channels.Count, n = m + _others.Count;
        LocalChannel[] all = [.. All()];
        if (n <= Subsets.MostElements)
            ways.Add((FidelityMethod.Any, FourSubsets.Work(n, m), FourSubsets.Bytes(n, m)));
        if (all.Count(c => !c.IsIncoherent) <= 1)
            ways.Add(Incoherent(all));
        else if (n <= MostKrausLevels)
            ways.Add((FidelityMethod.FewKraus, KrausStrings.Work(all), 16.0 * n * n * n));
        return ways.Count == 0 ? (FidelityMethod.Any, double.PositiveInfinity, double.PositiveInfinity) : ways.MinBy(w => w.Work + (w.Bytes > LargeBytes ? double.MaxValue : 0));
    }

    /// <summary>Beyond, finding the Kraus operators themselves (d²×d² eigenvectors) would be the work.</summary>
    private const int MostKrausLevels = 16;

    /// <summary>A sum that holds more than this is taken only when there is no other.</summary>
    private const double LargeBytes = 4e9;

    private static (FidelityMethod Method, double Work, double Bytes) Incoherent(LocalChannel[] all)
    {
        (double work, double bytes) = IncoherentFidelity.Cost([.. all.Select(IncoherentChannel.Of)]);
        return (FidelityMethod.Incoherent, work, bytes);
    }

    /// <summary>
    /// |S_m⟩⟨S_m| is N!/m! times what is left of |S_N⟩⟨S_N| when the others hold levels m … N-1: they read out and put their level in place.
    /// </summary>
    private IEnumerable<LocalChannel> All() => _channels.Concat(_others.Select((e, j) => LocalChannel.MeasureAndPrepare(e, Level(_channels.Count + j))));

    private Complex[] Level(int level) =>
        [.. Enumerable.Range(0, _channels[0].Levels).Select(a => _frame is null ? (a == level ? Complex.One : Complex.Zero) : Complex.Conjugate(_frame[level, a]))];

    private double Norm()
    {
        double product = 1;
        for (int i = _channels.Count + 1; i <= _channels.Count + _others.Count; i++)
            product *= i;
        return product;
    }

    private MixedMinors Minors() => _others.Aggregate(MixedMinors.None(_channels[0].Levels), (minors, e) => minors.With(e));
}
