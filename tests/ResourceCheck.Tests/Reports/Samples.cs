using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Resources;
using ResourceCheck.Timeline;

namespace ResourceCheck.Tests.Reports;

/// <summary>Made-up results that use every field: the numbers mean nothing.</summary>
internal static class Samples
{
    private const string Hash = "9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08";

    public static Diagnostic Warning { get; } = new(
        "C034", Severity.Warning, "`P[7]` is given a flight, but the protocol has 4 parties.", "leave it out, or raise n.", new Place("winter.conditions.json", 12, 5, "\"P[7]\": { }", 0, 6));

    private static EngineChoice Engine { get; } = new("product", "every step acts on one qudit, so 4 small matrices a branch are enough.", 1_250_000, 4.2e7);

    private static InputFile Script { get; } = new("removal.protocol", Hash);

    private static IReadOnlyList<ScheduleLine> Timeline { get; } =
    [
        new(0, 2.94e-5, "Dov", TimelineKind.Flight, "flies 6 km", null),
        new(2.94e-5, 3.44e-5, "Dov", TimelineKind.Detection, "measures fourier as k", null),
        new(3.44e-5, 6.2e-5, "Dov", TimelineKind.Message, "k", "Ada"),
        new(6.2e-5, 6.4e-5, "Ada", TimelineKind.Operation, "applies complement(fourier, k)", null),
    ];

    private static BranchEvaluation Branch(double probability, double? fidelity, params (string, string)[] outcomes) =>
        new([.. outcomes.Select(o => new KeyValuePair<string, string>(o.Item1, o.Item2))], probability, fidelity);

    private static CheckpointResult BuiltIn(string name, double fidelity, double at) => new(name, Estimate.Exact(fidelity), 1, 1 - fidelity, 0.81, at, [], true);

    /// <summary>A goal missed, a bound, a sampled figure, a range, a cheat, dropped copies.</summary>
    public static RunResult Full { get; } = new()
    {
        Version = "0.1.0",
        Protocol = Script,
        Title = "Party removal",
        Conditions = new("winter.conditions.json", Hash),
        Overrides = [new("flight.Dov.length", "5 km")],
        Engine = Engine,
        IntegrationError = 3.21e-11,
        Seed = 1,
        Parameters = [new("n", ["4"], true), new("x", ["0", "1"], false)],
        Cases =
        [
            new("honest", [],
            [
                new("success", Estimate.Exact(0.94123456789), 1, (0.94123456789, 0.95), "x = 1"),
                new("failure", Estimate.Exact(0.05876543211), 0, (0.05, 0.05876543211), "x = 1"),
                new("abort", Estimate.Exact(0), 0, null, null),
                new("mean of k", new(1.4962, TruthLabel.Sampled, 1.49021, 1.50219, 0.99, 0.97), 1.5, null, null),
            ]),
            new("split the receivers", ["Ada", "Ben"], [new("harm", Estimate.AtMost(0.155332982), 0, null, null)]),
        ],
        Checkpoints =
        [
            BuiltIn("prepared", 0.985, 0), BuiltIn("stored", 0.985, 0), BuiltIn("arrived", 0.9012345, 2.94e-5),
            new("after removal", Estimate.AtLeast(0.871267), 1, 0.128733, 0.8123, 6.4e-5,
            [
                Branch(0.75, 0.8283560, ("Dov.k", "0"), ("Dov.note", "late")),
                Branch(0.25, 0.999986, ("Dov.k", "1")),
            ], false),
        ],
        Yield = new(Estimate.Exact(0.8123), 0.85, 0.9556470588235294, 1, true),
        Duration = 6.4e-5,
        SecondsPerKeptCopy = 0.000615536,
        Goals = [new("\"after removal\" >= 0.90", Estimate.AtLeast(0.871267), 0.9, false, -0.028733), new("success >= 0.9", Estimate.Exact(0.94123456789), 0.9, true, 0.04123456789)],
        Verdict = Verdict.NotMet,
        VerdictText = "Goal not met: fidelity after removal is at least 0.871, the goal is 0.900.",
        Hint = "Most is lost while Ada waits for Dov's message (0.061).",
        Timeline = Timeline,
        Warnings = [Warning],
    };

    /// <summary>No goals, no metrics, no checkpoints, ideal conditions.</summary>
    public static RunResult Bare { get; } = Full with
    {
        Conditions = null,
        Overrides = [],
        Seed = null,
        Parameters = [],
        Cases = [new("honest", [], [])],
        Checkpoints = [],
        Yield = new(Estimate.Exact(1), 1, 1, 1, false),
        Duration = 0,
        SecondsPerKeptCopy = null,
        Goals = [],
        Verdict = Verdict.NoGoals,
        VerdictText = "No goals are set.",
        Hint = null,
        Timeline = [],
        Warnings = [],
    };

    /// <summary>Numbers that are none, and names that try to break each format.</summary>
    public static RunResult Odd { get; } = Bare with
    {
        Title = "a | b\u001b[31m <b>*bold*</b>, \"quoted\"\u202e",
        Cases =
        [
            new("honest", [],
            [
                new("success", new(double.NaN, TruthLabel.Sampled, double.NaN, double.NaN, 0.99), double.NaN, null, null),
                new("a very long label, \"with\" quotes | pipes, <tags> & a line\nbreak that goes on for much longer than any column should be", Estimate.Exact(double.PositiveInfinity), null, null, null),
                new("failure", Estimate.Exact(1.234e-15), 0, null, null),
                new("almost one", Estimate.Exact(0.9999999867), 1, null, null),
                new("=cmd()", Estimate.Exact(-2.5e7), null, (double.NegativeInfinity, -2.5e7), "x = 1/3"),
            ]),
        ],
        Checkpoints = [new("[link](x) `code`", Estimate.Exact(0.9999999999999998), 1, 2.2e-16, 1, double.NaN, [], false)],
        VerdictText = "No goals are set for \"a | b\u001b[31m\".",
    };

    /// <summary>One claim of each verdict.</summary>
    public static VerifyResult Verification { get; } = new(
        "0.1.0", Script, "Party removal",
        [
            new("success = 1", "n = 3", ClaimVerdict.Proved, 1, 1, [], null),
            new("success = 1", "n = 4", ClaimVerdict.Refuted, 0.75, 1, [Branch(0.125, null, ("Dov.k", "1"), ("Ada.v", "2")), Branch(0.125, 0.5, ("Dov.k", "3"))], null),
            new("guess(Dov.k from Ada.v) <= 1/3", "n = 4", ClaimVerdict.NotVerified, null, null, [], "9.1 GB are needed, 4 GB may be used"),
            new("success = 1", "n = 2", ClaimVerdict.OutsideRequirements, null, null, [], "requirement n > 2"),
        ],
        ClaimVerdict.Refuted, [Warning]);

    /// <summary>All that an inspection tells.</summary>
    public static InspectResult Inspection { get; } = new()
    {
        Version = "0.1.0",
        Protocol = Script,
        Title = "Party removal",
        Conditions = new("winter.conditions.json", Hash),
        Parameters = [new("n", ["4"], true)],
        Parties = ["Ada", "Ben", "Cyd", "Dov"],
        Levels = 4,
        Knowledge = [new(8, "Dov measures fourier as k", "Dov knows k"), new(9, "Dov announces k", "Ada, Ben, Cyd know Dov.k")],
        Timeline = Timeline,
        Duration = 6.4e-5,
        Engine = Engine,
        Fits = true,
        Costs = [new("n = 3", 5e-5, Engine, true), new("n = 4", 6.4e-5, Engine with { MemoryBytes = 9e10 }, false)],
        Requirements = [new("a < 1/3", "a third of the positions hold each value", "0.25 < 0.3333", true)],
        Warnings = [Warning],
    };

    /// <summary>Storage in which dark is not stable.</summary>
    public static StorageResult Storage { get; } = new()
    {
        Version = "0.1.0",
        Conditions = new("winter.conditions.json", Hash),
        Overrides = [new("storage.spacing", "0.05 wavelengths")],
        Emitters = 3,
        Heralded = true,
        WithoutShifts = true,
        InitialRates = (2.93e6, 1.479e8, 7.54e7),
        Points = [new(0, 1, 1, 1, 1, 1), new(1e-9, 0.9911, 0.9099, 0.8902, 0.8338, 0.9415), new(2e-9, 0.98409123, 0.953187, 0.7526, 0.7239, 0.86)],
        ErrorEstimate = 9.61e-12,
        Warnings = [Warning],
    };

    /// <summary>Relaxation of which some figures are sampled.</summary>
    public static RelaxationResult Relaxation { get; } = new()
    {
        Version = "0.1.0",
        Conditions = new("winter.conditions.json", Hash),
        Overrides = [new("resource.relaxed.spacing", "0.05 wavelengths")],
        Emitters = 6,
        Start = "emitters in levels 0, 0, 1, 2, 3, 4",
        Heralded = true,
        WithoutShifts = true,
        Method = "copies without a photon are one state vector and exact; what photons add is sampled by 400 quantum-jump trajectories",
        Seed = -7,
        Samples = 400,
        Points =
        [
            new(0, Estimate.Exact(0), Estimate.Exact(0), Estimate.Exact(0), 1, 0, Estimate.Exact(2)),
            new(1e-8, Sampled(0.0213, 0.0101, 0.0421), Sampled(0.1, 0.07, 0.13), Estimate.Exact(0.0123), 0.3333333333333, 0, Sampled(1.41, 1.2, 1.6)),
            new(2e-8, Sampled(0.01123456, 0.002, 0.0312), Sampled(0, 0, 0.03), Estimate.Exact(0.0023), 0.125, 0.25, Sampled(0.4, 0.2, 0.6)),
        ],
        ErrorEstimate = 4.2e-12,
        Warnings = [Warning],
    };

    private static Estimate Sampled(double value, double low, double high) => new(value, TruthLabel.Sampled, low, high, 0.99);

    /// <summary>Two sources of which one costs nothing.</summary>
    public static BudgetResult Budget { get; } = new()
    {
        Version = "0.1.0",
        Protocol = Script,
        Title = "Party removal",
        Conditions = new("winter.conditions.json", Hash),
        Overrides = [new("flight.Dov.length", "5 km")],
        Parameters = [new("n", ["4"], true)],
        Engine = Engine,
        Metric = "fidelity \"after removal\"",
        At = "n = 4",
        Figures = (0.7828, 1),
        Loss = 0.2172,
        Shares = [new(Source.FlightNoise, 0.2172, 0.2172, 0.2172), new(Source.Loss, 0, 1e-17, 0)],
        Advice = "Improve first what is lost to noise in flight: without it fidelity \"after removal\" would be 1 (exact), with half of it 0.8914 (exact).",
        Warnings = [Warning],
    };

    /// <summary>One path; a bound, an undefined figure and a point that failed.</summary>
    public static SweepResult Sweep { get; } = new()
    {
        Version = "0.1.0",
        Protocol = Script,
        Title = "a | b <b>",
        Conditions = null,
        Overrides = [],
        Varied = [new("flight.default.length", false, 1, 3, "km", 3, false, false)],
        Points =
        [
            new([1], [new("success", Estimate.Exact(0.9)), new("Bell value", Estimate.AtLeast(2.4312))], true, null),
            new([2], [new("success", Estimate.Exact(double.NaN)), new("Bell value", Estimate.AtLeast(2.1))], false, null),
            new([3], [], null, "No copy is kept. (E003)"),
        ],
        Warnings = [],
    };

    /// <summary>Copies with harms.</summary>
    public static CopiesResult Copies { get; } = new()
    {
        Version = "0.1.0",
        Protocol = Script,
        Title = "Detectable broadcast",
        Conditions = new("winter.conditions.json", Hash),
        Overrides = [],
        Thresholds = [new("a", "1/4"), new("b", "3/40")],
        Parameter = "M",
        Targets = (0.01, 0.05),
        Copies = 548,
        CheckedUpTo = 575,
        Steps = [new(541, Estimate.Exact(2.6e-5), Estimate.AtMost(0.05212)), new(548, Estimate.Exact(1.94e-5), null)],
        Attacks = [new("sender splits", "x = 0", [new("n", "137"), new("k1", "0")], Estimate.AtMost(0.04994), Estimate.AtLeast(0.031), "a search")],
        Seconds = 1.25,
        Warnings = [Warning],
    };

    /// <summary>A curve that is crossed twice.</summary>
    public static ToleranceResult Tolerance { get; } = new()
    {
        Version = "0.1.0",
        Protocol = Script,
        Title = "Party removal",
        Conditions = new("winter.conditions.json", Hash),
        Overrides = [],
        Varied = new("flight.Dov.length", false, 0, 60, "km", null, false, false),
        Goal = "\"after removal\" >= 0.75",
        Engine = Engine,
        Crossings = [new(12.345678, true, Estimate.Exact(0.75), (12345.678, 6.05e-5)), new(40, false, Estimate.AtLeast(0.75), null)],
        MetAt = (true, true),
        Evaluations = 58,
        Warnings = [Warning],
    };

    /// <summary>A state that was mended.</summary>
    public static StateDescription State { get; } = new()
    {
        File = "three.npy",
        Sha256 = Hash,
        Parties = 3,
        Levels = 3,
        IsVector = false,
        Validity = (1.2e-9, 3e-7, -0.0021),
        Figures =
        [
            new("fidelity", 0.9512345, 0.950123, TruthLabel.Exact),
            new("fidelity after local unitaries", 0.96789, 0.9671, TruthLabel.Bound),
            new("purity", 0.91, 0.912, TruthLabel.Exact),
        ],
        IsStateAsRead = false,
        Populations = [new("0-1-2", 0.1634, 0.164), new("2-1-0", 0.16, 0.1602)],
        MendedBy = 0.0042,
    };
}
