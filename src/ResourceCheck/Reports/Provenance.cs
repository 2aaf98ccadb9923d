using System.Globalization;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Where numbers come from, in lines.</summary>
internal static class Provenance
{
    private const int ShownHash = 16;

    /// <summary>Of a run.</summary>
    public static IReadOnlyList<string> Of(RunResult run) =>
    [
        Inputs(run.Version, run.Title, run.Protocol, run.Conditions, Ideal(run.Overrides)),
        .. run.Overrides.Select(o => $"Set: {o.Key} = {o.Value}"),
        .. Parameters(run.Parameters),
        .. run.IntegrationError > 0 ? [$"Collective decay is integrated with an estimated error of {FigureText.Number(run.IntegrationError, Rounding.Up)} in probabilities"] : Array.Empty<string>(),
        Engine(run.Engine) + (run.Seed is { } seed ? string.Create(CultureInfo.InvariantCulture, $"; seed {seed}") : ""),
    ];

    /// <summary>Of a verification.</summary>
    public static IReadOnlyList<string> Of(VerifyResult verification) =>
        [Inputs(verification.Version, verification.Title, verification.Protocol, null, ideal: "ideal conditions")];

    /// <summary>Of a budget.</summary>
    public static IReadOnlyList<string> Of(BudgetResult budget) =>
    [
        Inputs(budget.Version, budget.Title, budget.Protocol, budget.Conditions, Ideal(budget.Overrides)),
        .. budget.Overrides.Select(o => $"Set: {o.Key} = {o.Value}"),
        .. Parameters(budget.Parameters),
        Engine(budget.Engine),
    ];

    /// <summary>Of a sweep.</summary>
    public static IReadOnlyList<string> Of(Judgement.Studies.SweepResult sweep) => Of(sweep.Version, sweep.Title, sweep.Protocol, sweep.Conditions, sweep.Overrides);

    /// <summary>Of a number of copies.</summary>
    public static IReadOnlyList<string> Of(Judgement.Studies.CopiesResult copies) => Of(copies.Version, copies.Title, copies.Protocol, copies.Conditions, copies.Overrides);

    /// <summary>Of a tolerance.</summary>
    public static IReadOnlyList<string> Of(Judgement.Studies.ToleranceResult tolerance) =>
        [.. Of(tolerance.Version, tolerance.Title, tolerance.Protocol, tolerance.Conditions, tolerance.Overrides), Engine(tolerance.Engine)];

    private static IReadOnlyList<string> Of(string version, string title, InputFile protocol, InputFile? conditions, IReadOnlyList<KeyValuePair<string, string>> overrides) =>
        [Inputs(version, title, protocol, conditions, ideal: "ideal conditions except what is set or varied"), .. overrides.Select(o => $"Set: {o.Key} = {o.Value}")];

    /// <summary>Of an inspection.</summary>
    public static IReadOnlyList<string> Of(InspectResult inspection) =>
    [
        Inputs(inspection.Version, inspection.Title, inspection.Protocol, inspection.Conditions, Ideal(inspection.Overrides)),
        .. inspection.Overrides.Select(o => $"Set: {o.Key} = {o.Value}"),
        .. Parameters(inspection.Parameters),
    ];

    /// <summary>A file and the start of its hash.</summary>
    public static string File(string name, string sha256) => $"{name} (SHA-256 {sha256[..Math.Min(ShownHash, sha256.Length)]})";

    private static string Ideal(IReadOnlyList<KeyValuePair<string, string>> overrides) => overrides.Count == 0 ? "ideal conditions" : "ideal conditions except what is set";

    private static string Inputs(string version, string title, InputFile protocol, InputFile? conditions, string ideal) =>
        $"ResourceCheck {version}; \"{title}\" from {File(protocol.Name, protocol.Sha256)}; "
        + (conditions is null ? ideal : $"under {File(conditions.Name, conditions.Sha256)}");

    private static string Engine(EngineChoice engine) => $"Engine {engine.Name}: {engine.Reason.TrimEnd('.')}";

    private static IEnumerable<string> Parameters(IReadOnlyList<ParameterUse> parameters) => parameters.Count == 0 ? [] :
        [$"Parameters: {string.Join("; ", parameters.Select(p => $"{p.Name} = {string.Join(", ", p.Values)}{(p.IsDefault ? " (default)" : "")}"))}"];
}
