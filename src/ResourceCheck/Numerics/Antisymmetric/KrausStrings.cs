using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// ⟨S_N|(Φ_1⊗…⊗Φ_N)(|S_N⟩⟨S_N|)|S_N⟩ for channels of few Kraus operators: Σ over strings of |D(K_1, …, K_N)|². Unitaries make one string.
/// </summary>
internal static class KrausStrings
{
    /// <summary>The fidelity.</summary>
    public static RoundedSum Fidelity(IReadOnlyList<LocalChannel> channels)
    {
        RoundedSum sum = default;
        foreach (LocalOperator[] operators in Strings(channels, 0, []))
        {
            RoundedSum amplitude = MixedDiscriminant.Of(operators);
            double magnitude = amplitude.Value.Magnitude;
            sum += new RoundedSum(magnitude * magnitude, ((2 * magnitude) + amplitude.Error) * amplitude.Error);
        }

        return sum;
    }

    /// <summary>Complex multiplications.</summary>
    public static double Work(IReadOnlyList<LocalChannel> channels) =>
        channels.Aggregate(1.0, (product, c) => product * c.Kraus().Count) * MixedDiscriminant.Work(channels.Count, channels.Count);

    private static IEnumerable<LocalOperator[]> Strings(IReadOnlyList<LocalChannel> channels, int at, LocalOperator[] chosen) =>
        at == channels.Count ? [chosen] : channels[at].Kraus().SelectMany(k => Strings(channels, at + 1, [.. chosen, k]));
}
