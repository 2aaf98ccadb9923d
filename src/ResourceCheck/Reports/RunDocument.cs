using System.Text.Json;
using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>run</c>; docs/schema/result.schema.json describes it.</summary>
internal static class RunDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(RunResult run, TextWriter writer) => JsonParts.WriteDocument(writer, "result", run.Version, json =>
    {
        json.WriteString("verdict", Name(run.Verdict));
        json.WriteString("verdictText", run.VerdictText);
        json.WriteString("hint", run.Hint);
        JsonParts.Protocol(json, run.Protocol, run.Title);
        JsonParts.Conditions(json, run.Conditions, run.Overrides);
        JsonParts.Engine(json, run.Engine);
        JsonParts.Number(json, "integrationError", run.IntegrationError);
        Seed(json, run.Seed);
        JsonParts.Parameters(json, run.Parameters);
        JsonParts.Objects(json, "cases", run.Cases, c => Case(json, c));
        JsonParts.Objects(json, "attacks", run.Attacks, a => Attack(json, a));
        json.WriteString("listMethod", run.ListMethod);
        if (run.Drift is { } drift)
            JsonParts.Object(json, "drift", () => Drift(json, drift));
        else
            json.WriteNull("drift");
        JsonParts.Objects(json, "levels", run.Levels, l => Levels(json, l));
        JsonParts.Objects(json, "checkpoints", run.Checkpoints, c => Checkpoint(json, c));
        JsonParts.Object(json, "yield", () => Yield(json, run.Yield));
        JsonParts.Object(json, "copies", () =>
        {
            JsonParts.Number(json, "secondsPerKept", run.SecondsPerKeptCopy);
            Range(json, run.SecondsPerKeptCopyRange);
            JsonParts.Number(json, "list", run.List?.Copies);
            JsonParts.Number(json, "secondsPerList", run.List?.Seconds);
        });
        RateTable.Write(json, run.Rates);
        JsonParts.Number(json, "duration", run.Duration);
        Range(json, run.DurationRange, "durationRange");
        JsonParts.Objects(json, "goals", run.Goals, g => Goal(json, g));
        UncertaintyDocument.Write(json, run.Uncertainty);
        JsonParts.Objects<object>(json, "claims", [], _ => { });
        JsonParts.Objects<object>(json, "sources", [], _ => { });
        JsonParts.Timeline(json, run.Timeline);
        JsonParts.Warnings(json, run.Warnings);
    });

    private static string Name(Verdict verdict) => verdict switch
    {
        Verdict.Met => "met",
        Verdict.NotMet => "not met",
        Verdict.Undecided => "undecided",
        _ => "no goals",
    };

    private static void Seed(Utf8JsonWriter json, long? seed)
    {
        if (seed is { } number)
            json.WriteNumber("seed", number);
        else
            json.WriteNull("seed");
    }

    private static void Case(Utf8JsonWriter json, CaseResult of)
    {
        json.WriteString("case", of.Case);
        JsonParts.Array(json, "dishonest", of.Dishonest, json.WriteStringValue);
        JsonParts.Objects(json, "metrics", of.Metrics, m => Metric(json, m));
    }

    internal static void Attack(Utf8JsonWriter json, AttackResult attack)
    {
        json.WriteString("case", attack.Case);
        json.WriteString("at", attack.At);
        JsonParts.Objects(json, "choices", attack.Choices, c =>
        {
            json.WriteString("name", c.Key);
            json.WriteString("value", c.Value);
        });
        JsonParts.EstimateFields(json, attack.Value);
        if (attack.Average is { } average)
            JsonParts.Object(json, "average", () => JsonParts.EstimateFields(json, average));
        else
            json.WriteNull("average");
        json.WriteString("method", attack.Method);
    }

    private static void Levels(Utf8JsonWriter json, LevelsResult levels)
    {
        JsonParts.Array(json, "levels", levels.Levels, json.WriteNumberValue);
        json.WriteBoolean("today", levels.Today);
        JsonParts.Objects(json, "figures", levels.Figures, f =>
        {
            json.WriteString("case", f.Case);
            json.WriteString("name", f.Name);
            JsonParts.EstimateFields(json, f.Value);
        });
    }

    private static void Drift(Utf8JsonWriter json, DriftResult drift)
    {
        JsonParts.Number(json, "fraction", drift.Fraction);
        json.WriteString("conditions", drift.Conditions.Name);
        json.WriteString("sha256", drift.Conditions.Sha256);
        JsonParts.Objects(json, "figures", drift.Figures, f =>
        {
            json.WriteString("case", f.Case);
            json.WriteString("name", f.Name);
            JsonParts.Object(json, "whole", () => JsonParts.EstimateFields(json, f.Whole));
            JsonParts.Object(json, "floor", () => JsonParts.EstimateFields(json, f.Floor));
        });
    }

    private static void Metric(Utf8JsonWriter json, MetricResult metric)
    {
        json.WriteString("name", metric.Name);
        JsonParts.EstimateFields(json, metric.Estimate);
        JsonParts.Number(json, "ideal", metric.Ideal);
        Range(json, metric.Range);
        json.WriteString("worstAt", metric.WorstAt);
    }

    private static void Range(Utf8JsonWriter json, (double Low, double High)? range, string name = "range")
    {
        if (range is not { } ends)
        {
            json.WriteNull(name);
            return;
        }

        JsonParts.Object(json, name, () =>
        {
            JsonParts.Number(json, "low", ends.Low);
            JsonParts.Number(json, "high", ends.High);
        });
    }

    private static void Checkpoint(Utf8JsonWriter json, CheckpointResult checkpoint)
    {
        json.WriteString("name", checkpoint.Name);
        json.WriteBoolean("builtIn", checkpoint.BuiltIn);
        JsonParts.Object(json, "fidelity", () => JsonParts.EstimateFields(json, checkpoint.Fidelity));
        Range(json, checkpoint.Range);
        JsonParts.Number(json, "ideal", checkpoint.Ideal);
        JsonParts.Number(json, "loss", checkpoint.Loss);
        JsonParts.Number(json, "kept", checkpoint.Kept);
        JsonParts.Number(json, "at", checkpoint.At);
        JsonParts.Branches(json, "branches", checkpoint.Branches);
    }

    private static void Yield(Utf8JsonWriter json, YieldResult yield)
    {
        JsonParts.EstimateFields(json, yield.Value);
        Range(json, yield.Range);
        JsonParts.Number(json, "heralded", yield.Heralded);
        JsonParts.Number(json, "seen", yield.Seen);
        JsonParts.Number(json, "kept", yield.Kept);
        json.WriteBoolean("onlySeen", yield.OnlySeen);
    }

    private static void Goal(Utf8JsonWriter json, GoalResult goal)
    {
        json.WriteString("text", goal.Text);
        JsonParts.EstimateFields(json, goal.Value);
        JsonParts.Number(json, "threshold", goal.Threshold);
        json.WriteBoolean("met", goal.Met);
        json.WriteBoolean("undecided", goal.Undecided);
        JsonParts.Number(json, "margin", goal.Margin);
    }
}
