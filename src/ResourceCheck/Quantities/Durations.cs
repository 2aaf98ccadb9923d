namespace ResourceCheck.Quantities;

/// <summary>Reads times as users write them, with their unit.</summary>
public static class Durations
{
    /// <summary>A time above 0 such as <c>5 ns</c>, in seconds.</summary>
    public static bool TryParse(string text, out double seconds)
    {
        ParsedQuantity parsed = QuantityParser.Parse(text);
        seconds = parsed.Value;
        return parsed.Problem == QuantityProblem.None && parsed.Unit!.Dimension == Dimension.Time && seconds > 0 && double.IsFinite(seconds);
    }
}
