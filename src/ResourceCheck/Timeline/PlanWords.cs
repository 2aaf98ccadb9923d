using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Timeline;

/// <summary>What the schedule says of a step: the script's own words, with the actor left out.</summary>
internal sealed class PlanWords(Protocol protocol)
{
    public string Of(MeasureStep step) => $"measures {Written(step.Basis.Span, step)} as {protocol.Slots[step.Slot].Name}";

    public string Of(ApplyStep step) => $"applies {Written(step.Unitary.Span, step)}";

    public string Of(SendStep step) => $"{(step.Announced ? "announces" : "sends")} {protocol.Slots[step.Slot].Name}";

    public string Of(InterceptStep step) => $"intercepts {protocol.Parties[step.Victim]} in {Written(step.Basis.Span, step)} as {protocol.Slots[step.Slot].Name}";

    private string Written(Scripts.Span span, Step step) => TurnText.Of(protocol.Source.Text.Substring(span.Start, span.Length), step.Counters);
}
