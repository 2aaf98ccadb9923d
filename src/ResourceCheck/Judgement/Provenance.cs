using System.Reflection;
using ResourceCheck.Engines;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>What a result was made from.</summary>
internal static class Provenance
{
    /// <summary>Version of the program.</summary>
    public static string Version { get; } =
        typeof(Provenance).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "unknown";

    public static InputFile? Conditions(Setup setup) => setup.Request.Conditions is { } file ? new InputFile(file.Name, file.Sha256) : null;

    /// <summary>Every parameter with the value or values used.</summary>
    public static IReadOnlyList<ParameterUse> Parameters(Setup setup) =>
        [.. setup.Settings[0].Protocol.Parameters.Select(p => setup.Choices.Chosen.TryGetValue(p.Name, out IReadOnlyList<Rational>? values)
            ? new ParameterUse(p.Name, [.. values.Select(v => v.ToString())], false)
            : new ParameterUse(p.Name, [p.Value.ToString()], true))];

    /// <summary>The schedule with names in place of indices.</summary>
    public static IReadOnlyList<ScheduleLine> Schedule(Setting setting) => [.. setting.Plan.Timeline.Select(e => Line(e, setting.Protocol))];

    private static ScheduleLine Line(TimelineEntry entry, Protocol protocol) => new(
        entry.Start.Seconds,
        entry.End.Seconds,
        entry.Party < 0 ? "all" : protocol.Parties[entry.Party],
        entry.Kind,
        entry.Text,
        entry.To < 0 ? null : protocol.Parties[entry.To]);
}
