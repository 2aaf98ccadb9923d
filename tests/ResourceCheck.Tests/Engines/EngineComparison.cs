using ResourceCheck.Engines;
using Xunit;

namespace ResourceCheck.Tests.Engines;

/// <summary>Compares what two exact engines found, figure by figure.</summary>
internal static class EngineComparison
{
    private const double Tolerance = 1e-10;

    public static void AssertEqual(Evaluation expected, Evaluation actual)
    {
        Near(expected.Heralded, actual.Heralded, "heralded");
        Near(expected.Seen, actual.Seen, "seen");
        Near(expected.Kept, actual.Kept, "kept");
        Near(expected.Success, actual.Success, "success");
        Near(expected.Failure, actual.Failure, "failure");
        Near(expected.Abort, actual.Abort, "abort");
        Assert.Equal(expected.Checkpoints.Select(c => c.Label), actual.Checkpoints.Select(c => c.Label));
        foreach ((CheckpointEvaluation a, CheckpointEvaluation b) in expected.Checkpoints.Zip(actual.Checkpoints))
        {
            Near(a.Fidelity, b.Fidelity, a.Label);
            Near(a.Kept, b.Kept, a.Label + ", kept");
        }

        foreach (((Estimate a, Estimate b), int i) in expected.Reports.Zip(actual.Reports).Select((pair, i) => (pair, i)))
            Near(a, b, $"report {i}");
        foreach (((Estimate Left, Estimate Right) a, (Estimate Left, Estimate Right) b) in expected.Claims.Zip(actual.Claims))
        {
            Near(a.Left, b.Left, "claim");
            Near(a.Right, b.Right, "claim");
        }

        Assert.Equal(expected.Copies.Count, actual.Copies.Count);
        foreach ((var a, var b) in expected.Copies.Zip(actual.Copies))
            Near(a.Probability, b.Probability, "copy");
    }

    private static void Near(Estimate expected, Estimate actual, string name)
    {
        Assert.True(actual.Label == expected.Label, $"{name}: {actual.Label} instead of {expected.Label}");
        Near(expected.Value, actual.Value, name);
        Near(expected.Present, actual.Present, name + ", present");
    }

    private static void Near(double expected, double actual, string name) =>
        Assert.True(double.IsNaN(expected) ? double.IsNaN(actual) : Math.Abs(expected - actual) <= Tolerance, $"{name}: {actual:R} instead of {expected:R}");
}
