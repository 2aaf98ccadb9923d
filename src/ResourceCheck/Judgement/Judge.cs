using ResourceCheck.Diagnostics;

namespace ResourceCheck.Judgement;

/// <summary>The whole way from texts to results, one line a step. Findings whose code begins with E mean that no trustworthy result could be had (exit code 3).</summary>
public static class Judge
{
    /// <summary>Evaluates a protocol under conditions.</summary>
    public static Outcome<RunResult> Run(RunRequest request) => throw new NotSupportedException();

    /// <summary>Proves or refutes a protocol's claims under ideal conditions.</summary>
    public static Outcome<VerifyResult> Verify(RunRequest request) => throw new NotSupportedException();

    /// <summary>Tells what would be computed, without computing it.</summary>
    public static Outcome<InspectResult> Inspect(RunRequest request) => throw new NotSupportedException();
}
