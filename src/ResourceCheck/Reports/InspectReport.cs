using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Timeline;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>inspect</c>: who knows what, when what happens, which engine at what cost.</summary>
internal static class InspectReport
{
    /// <summary>What one core of an ordinary machine does in complex products on arrays; common practice, no source. Only for "about".</summary>
    private const double MultiplicationsPerSecond = 3e8;

    /// <summary>Builds the report.</summary>
    public static Report From(InspectResult inspection) => new(
        Headline(inspection),
        null,
        [
            Section.Of($"Parties: {string.Join(", ", inspection.Parties)}; each qudit has {inspection.Levels} levels."),
            .. Some("Requirements", Requirements(inspection.Requirements)),
            .. Some("Who knows what", Knowledge(inspection.Knowledge)),
            .. Some("Messages", Messages(inspection.Timeline)),
            .. Some("Timeline", Schedule(inspection.Timeline.Where(l => l.Kind != TimelineKind.Message))),
            .. Some("Cost by parameters", Costs(inspection.Costs)),
            Section.Of(Cost(inspection.Engine)),
        ],
        Schedule(inspection.Timeline),
        Provenance.Of(inspection),
        inspection.Warnings);

    /// <summary>A kind's name in every format.</summary>
    public static string Name(TimelineKind kind) => kind switch
    {
        TimelineKind.Storage => "storage",
        TimelineKind.Flight => "flight",
        TimelineKind.Waiting => "waiting",
        TimelineKind.Operation => "operation",
        TimelineKind.Detection => "detection",
        TimelineKind.Message => "message",
        TimelineKind.Interception => "interception",
        _ => "checkpoint",
    };

    private static string Headline(InspectResult inspection) =>
        $"No mistakes: \"{inspection.Title}\" takes {FigureText.Time(inspection.Duration)} per copy "
        + (inspection.Fits ? $"and would run on the {inspection.Engine.Name} engine." : "but would not run: no engine here can take it.");

    private static string Cost(EngineChoice engine) =>
        $"Engine {engine.Name}: {engine.Reason.TrimEnd('.')}. It would take {FigureText.Bytes(engine.MemoryBytes)} of memory and "
        + $"about {FigureText.About(engine.Work)} multiplications, some {FigureText.AboutTime(engine.Work / MultiplicationsPerSecond)} on one core.";

    private static Table Costs(IReadOnlyList<SettingCost> costs) => new(
        [new("parameters", "Parameters"), new("duration", "Time per copy", "s"), new("memory", "Memory", "B"), new("work", "Multiplications"), new("runs", "Would run")],
        [.. costs.Select(c => (IReadOnlyList<Cell>)
            [Cell.Of(c.Parameters), Cell.Of(c.Duration, "s"), Cell.Of(c.Engine.MemoryBytes, "B"), Cell.Of(FigureText.About(c.Engine.Work)), Cell.Of(c.Fits ? c.Engine.Name : "no")])]);

    private static Section[] Some(string title, Table table) => table.Rows.Count == 0 ? [] : [new Section(title, table, [])];

    private static Table Requirements(IReadOnlyList<RequirementLine> lines) => new(
        [new("condition", "Condition"), new("holds", "Holds"), new("figures", "Figures"), new("reason", "Reason")],
        [.. lines.Select(l => (IReadOnlyList<Cell>)[Cell.Of(l.Text), Cell.Of(l.Holds ? "holds" : "broken"), Cell.Of(l.Figures), Cell.Of(l.Reason)])]);

    private static Table Knowledge(IReadOnlyList<KnowledgeLine> lines) => new(
        [new("line", "Line"), new("statement", "Statement"), new("learned", "Learned")],
        [.. lines.Select(l => (IReadOnlyList<Cell>)[Cell.Of(l.Line, ""), Cell.Of(l.Statement), Cell.Of(l.Learned)])]);

    private static Table Messages(IReadOnlyList<ScheduleLine> timeline) => new(
        [new("sent", "Sent"), new("arrives", "Arrives"), new("from", "From"), new("to", "To"), new("content", "Content")],
        [.. timeline.Where(l => l.Kind == TimelineKind.Message).Select(l => (IReadOnlyList<Cell>)
            [Cell.Of(l.Start, "s"), Cell.Of(l.End, "s"), Cell.Of(l.Party), Cell.Of(l.To ?? "all"), Cell.Of(l.Text)])]);

    /// <summary>The schedule as a table.</summary>
    public static Table Schedule(IEnumerable<ScheduleLine> timeline) => new(
        [
            new("start", "From", "s"),
            new("end", "Until", "s"),
            new("party", "Party"),
            new("kind", "Kind"),
            new("text", "What happens"),
            new("to", "To"),
        ],
        [.. timeline.Select(l => (IReadOnlyList<Cell>)
            [Cell.Of(l.Start, "s"), Cell.Of(l.End, "s"), Cell.Of(l.Party), Cell.Of(Name(l.Kind)), Cell.Of(l.Text), Cell.Of(l.To)])]);
}
