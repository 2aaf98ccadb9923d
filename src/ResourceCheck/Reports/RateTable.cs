using System.Text.Json;
using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>Shows a rate chain.</summary>
internal static class RateTable
{
    private const string PerSecond = "1/s";

    /// <summary>The section for people; none where no rate is known.</summary>
    public static IReadOnlyList<Section> Sections(RateChain? chain) => chain?.Pace is not { } pace ? [] :
    [
        new Section("Rates, from attempts to the verdict", Of(chain), [pace, .. chain.At.Length == 0 ? Array.Empty<string>() : [$"At {chain.At}, where the rate is lowest."]]),
    ];

    /// <summary>The table.</summary>
    public static Table Of(RateChain chain) => new(
        [new("stage", "Stage"), new("probability", "Probability"), new("label", "Label"), new("rate", "Rate behind it, 1/s", PerSecond), new("note", "What happens")],
        [.. chain.Stages.Select(s => (IReadOnlyList<Cell>)
        [
            Cell.Of(s.Name),
            s.Probability is { } probability ? Truth.CellOf(probability) : Cell.Empty,
            Cell.Of(s.Probability is { } labelled ? Truth.Describe(labelled) : null),
            Cell.Of(s.Rate, ""),
            Cell.Of(s.Note),
        ])]);

    /// <summary>Writes the field <c>rates</c>.</summary>
    public static void Write(Utf8JsonWriter json, RateChain? chain)
    {
        if (chain is null)
        {
            json.WriteNull("rates");
            return;
        }

        JsonParts.Object(json, "rates", () =>
        {
            JsonParts.Number(json, "preparationPeriod", chain.PreparationPeriod);
            JsonParts.Number(json, "occupied", chain.Occupied);
            json.WriteString("pace", chain.Pace);
            json.WriteString("at", chain.At);
            JsonParts.Objects(json, "stages", chain.Stages, s => Stage(json, s));
        });
    }

    private static void Stage(Utf8JsonWriter json, RateStage stage)
    {
        json.WriteString("name", stage.Name);
        if (stage.Probability is { } probability)
            JsonParts.Object(json, "probability", () => JsonParts.EstimateFields(json, probability));
        else
            json.WriteNull("probability");
        JsonParts.Number(json, "rate", stage.Rate);
        json.WriteString("note", stage.Note);
    }
}
