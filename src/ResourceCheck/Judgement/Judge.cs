using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Judgement;

/// <summary>The whole way from texts to results, one line a step. Findings whose code begins with E mean that no trustworthy result could be had (exit code 3).</summary>
public static class Judge
{
    /// <summary>Evaluates a protocol under conditions.</summary>
    public static Outcome<RunResult> Run(RunRequest request) => Setup.From(request) switch
    {
        { Value: { } setup } => RunJudgement.Of(setup),
        { Findings: var findings } => Outcome<RunResult>.Failed(findings),
    };

    /// <summary>Proves or refutes a protocol's claims under ideal conditions.</summary>
    public static Outcome<VerifyResult> Verify(RunRequest request) => Setup.From(request with { Conditions = null, Overrides = [] }) switch
    {
        { Value: { } setup } => VerifyJudgement.Of(setup),
        { Findings: var findings } => Outcome<VerifyResult>.Failed(findings),
    };

    /// <summary>Shares a loss out among its sources.</summary>
    public static Outcome<BudgetResult> Budget(RunRequest request) => Setup.From(request) switch
    {
        { Value: { } setup } => BudgetJudgement.Of(setup),
        { Findings: var findings } => Outcome<BudgetResult>.Failed(findings),
    };

    /// <summary>Evaluates a protocol at every point of a grid of one or two varied values.</summary>
    public static Outcome<SweepResult> Sweep(SweepRequest request) => SweepJudgement.Of(request);

    /// <summary>Finds the least number of copies that holds targets of failure and harm.</summary>
    public static Outcome<CopiesResult> Copies(CopiesRequest request) => CopiesJudgement.Of(request);

    /// <summary>Finds numbers of copies for several targets and, if asked for, values.</summary>
    public static Outcome<CopiesTable> Copies(CopiesTableRequest request) => CopiesTableJudgement.Of(request);

    /// <summary>Finds the values at which a goal is just met.</summary>
    public static Outcome<ToleranceResult> Tolerance(ToleranceRequest request) => ToleranceJudgement.Of(request);

    /// <summary>Works a study off.</summary>
    public static Outcome<ResourceCheck.Studies.StudyResult> Study(ResourceCheck.Studies.StudyRequest request) => ResourceCheck.Studies.StudyJudgement.Of(request);

    /// <summary>Follows storage side by side against time.</summary>
    public static Outcome<StorageResult> Storage(StorageRequest request) => StorageJudgement.Of(request);

    /// <summary>Follows preparation by relaxation against time.</summary>
    public static Outcome<RelaxationResult> Relaxation(RelaxationRequest request) => RelaxationJudgement.Of(request);

    /// <summary>Tells what would be computed, without computing it.</summary>
    public static Outcome<InspectResult> Inspect(RunRequest request) => Setup.From(request) switch
    {
        { Value: { } setup } => InspectJudgement.Of(setup),
        { Findings: var findings } => Outcome<InspectResult>.Failed(findings),
    };
}
