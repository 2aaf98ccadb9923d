using MathNet.Numerics.Distributions;
using MathNet.Numerics.Statistics;
using ResourceCheck.Numerics.Randomness;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>
/// Laws of figures from draws of the uncertain values (JCGM 101:2008): independent normal laws, truncated to what the conditions allow
/// by drawing anew whatever they refuse. Every draw has a stream of its own, so that results do not depend on threads.
/// </summary>
internal sealed class SampledPropagation
{
    /// <summary>A draw that the conditions refuse so often lies outside them for good.</summary>
    private const int MostRedraws = 1000;

    /// <summary>2^-54: moves a uniform number from [0, 1) into the middle of its cell, so that no normal one is infinite.</summary>
    private const double HalfUlp = 1.0 / (1UL << 54);

    private readonly Dictionary<FigureKey, double>?[] _draws;

    private SampledPropagation(int samples) => _draws = new Dictionary<FigureKey, double>?[samples];

    /// <summary>Draws that were refused.</summary>
    public int Redrawn { get; private set; }

    /// <summary>Draws and evaluates.</summary>
    public static SampledPropagation Of(RunRequest request, IReadOnlyList<UncertainInput> inputs, int samples, FigureSource source)
    {
        SampledPropagation sampled = new(samples);
        int[] redrawn = new int[samples];
        Parallel.For(0, samples, LinearPropagation.Options(request), i =>
        {
            Setup? setup = Draw(request, inputs, Xoshiro256.Stream(unchecked((ulong)request.Seed), (ulong)i), out redrawn[i]);
            sampled._draws[i] = (setup is null ? null : source(setup))?.ToDictionary(f => f.Key, f => f.Value.Value);
        });
        sampled.Redrawn = redrawn.Sum();
        return sampled;
    }

    /// <summary>The law of a figure; null when it is defined at no two draws.</summary>
    public SampledBand? Band(FigureKey key)
    {
        double[] values = [.. _draws.Select(d => d?.GetValueOrDefault(key, double.NaN) ?? double.NaN).Where(double.IsFinite).Order()];
        const double tail = (1 - UncertaintyResult.Confidence) / 2;
        return values.Length < 2 ? null : new SampledBand(
            values.Mean(), values.StandardDeviation(), SortedArrayStatistics.Quantile(values, tail), SortedArrayStatistics.Quantile(values, 1 - tail), _draws.Length - values.Length);
    }

    private static Setup? Draw(RunRequest request, IReadOnlyList<UncertainInput> inputs, Xoshiro256 stream, out int redrawn)
    {
        for (redrawn = 0; redrawn < MostRedraws; redrawn++)
        {
            (UncertainInput, double)[] values = [.. inputs.Select(i => (i, i.Base + (i.BaseUncertainty * Normal.InvCDF(0, 1, stream.NextUnit() + HalfUlp))))];
            if (Setup.From(UncertainInputs.Into(request, values)).Value is { } setup)
                return setup;
        }

        return null;
    }
}
