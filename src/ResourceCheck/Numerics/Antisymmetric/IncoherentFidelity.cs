using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// ⟨S_N|(Φ_1⊗…⊗Φ_N)(|S_N⟩⟨S_N|)|S_N⟩ for incoherent channels. Written out, four permutations run over the levels: of the state and of its
/// conjugate, of the target and of its conjugate. An incoherent channel either moves a population (state and conjugate use p, target
/// and conjugate use a) or keeps a coherence (state and target use p, their conjugates q); the signs of the four permutations then always
/// multiply to +1, so that no term is negative. After k parties a level is unused, used by two of the four in one of four ways, or by all.
/// Levels that may be exchanged without changing any channel form a class, of which only the numbers count.
/// </summary>
internal static class IncoherentFidelity
{
    /// <summary>Differences below this do not tell levels apart.</summary>
    private const double Nothing = 1e-13;

    /// <summary>The fidelity.</summary>
    public static RoundedSum Of(IReadOnlyList<IncoherentChannel> channels)
    {
        int[][] classes = Classes(channels);
        double sum = ClassStates(classes) <= PairedLevels.States(channels.Count) || channels.Count > PairedLevels.MostParties
            ? LevelClasses.Sum(channels, classes)
            : PairedLevels.Sum(channels);
        double factorial = AntisymmetricState.Factorial(channels.Count);
        double value = sum / factorial / factorial;
        return new RoundedSum(value, value * channels.Count * 1e-15);
    }

    /// <summary>Multiplications and bytes for these channels.</summary>
    public static (double Work, double Bytes) Cost(IReadOnlyList<IncoherentChannel> channels)
    {
        int n = channels.Count;
        double classes = ClassStates(Classes(channels)), pairs = PairedLevels.States(n);
        return classes <= pairs || n > PairedLevels.MostParties ? (classes * n * 100, classes * 100) : (pairs * n * n / 2, 16 * pairs);
    }

    /// <summary>Levels that may be exchanged without changing any channel.</summary>
    public static int[][] Classes(IReadOnlyList<IncoherentChannel> channels)
    {
        List<List<int>> classes = [];
        for (int l = 0; l < channels[0].Levels; l++)
        {
            if (classes.FirstOrDefault(c => channels.All(channel => channel.IsSymmetric(c[0], l, Nothing))) is { } same)
                same.Add(l);
            else
                classes.Add([l]);
        }

        return [.. classes.Select(c => c.ToArray())];
    }

    /// <summary>Counts per class of levels in six states: an upper bound of what <see cref="LevelClasses"/> holds.</summary>
    private static double ClassStates(int[][] classes) => classes.Aggregate(1.0, (product, c) => product * Subsets.ChooseReal(c.Length + 5, 5));
}
