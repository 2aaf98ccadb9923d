using System.Globalization;
using System.Text.RegularExpressions;

namespace ResourceCheck.Quantities;

/// <summary>
/// Reads quantities such as <c>80 us</c>, <c>2.04e8 m/s</c> and, with the standard uncertainty in units of the last digits,
/// <c>1.234(56)e-3 s</c> (JCGM 100:2008, 7.2.2). The decimal scale of the unit is added to the exponent before the one
/// conversion to binary, so that <c>80 us</c> is the double nearest to 80e-6.
/// </summary>
internal static partial class QuantityParser
{
    /// <summary>Exponents of more digits than this lie far outside double and could overflow the sum with the unit's.</summary>
    private const int MaxExponentDigits = 4;

    /// <summary>Reads a text; blanks around it and before the unit do not matter.</summary>
    public static ParsedQuantity Parse(string text)
    {
        Match match = Form().Match(text.Trim());
        if (!match.Success)
            return Failed(QuantityProblem.NoNumber);
        string unitText = match.Groups["unit"].Value;
        if (unitText.StartsWith(',') && unitText.Length > 1 && char.IsAsciiDigit(unitText[1]))
            return Failed(QuantityProblem.Comma);
        Unit? unit = unitText.Length == 0 ? UnitTable.None : UnitTable.Find(unitText);
        if (unit is null)
            return new ParsedQuantity(QuantityProblem.UnknownUnit, 0, null, null, unitText);
        return Scale(match, unit, unitText);
    }

    private static ParsedQuantity Scale(Match match, Unit unit, string unitText)
    {
        string mantissa = match.Groups["mantissa"].Value;
        string exponentText = match.Groups["exponent"].Value;
        if (exponentText.TrimStart('+', '-').Length > MaxExponentDigits)
            return Failed(QuantityProblem.OutOfRange);
        int exponent = unit.PowerOfTen + (exponentText.Length == 0 ? 0 : int.Parse(exponentText, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture));
        double value = ToDouble(mantissa, exponent) * unit.Factor;
        double? uncertainty = match.Groups["uncertainty"] is { Success: true } group ? ToDouble(group.Value, exponent - Decimals(mantissa, group.Value)) * unit.Factor : null;
        bool lost = value == 0 && mantissa.Any(c => c is >= '1' and <= '9');
        return !double.IsFinite(value) || lost || uncertainty is { } u && !double.IsFinite(u)
            ? Failed(QuantityProblem.OutOfRange)
            : new ParsedQuantity(QuantityProblem.None, value, uncertainty, unit, unitText);
    }

    /// <summary>Digits in brackets count in the last place of the mantissa, unless they bring a point of their own.</summary>
    private static int Decimals(string mantissa, string uncertainty)
    {
        int point = mantissa.IndexOf('.', StringComparison.Ordinal);
        return point < 0 || uncertainty.Contains('.', StringComparison.Ordinal) ? 0 : mantissa.Length - point - 1;
    }

    private static double ToDouble(string mantissa, int exponent) =>
        double.Parse(
            string.Create(CultureInfo.InvariantCulture, $"{mantissa}e{exponent}"),
            NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent,
            CultureInfo.InvariantCulture);

    private static ParsedQuantity Failed(QuantityProblem problem) => new(problem, 0, null, null, "");

    [GeneratedRegex(@"^(?<mantissa>[+-]?[0-9]+(\.[0-9]+)?)(\((?<uncertainty>[0-9]+(\.[0-9]+)?)\))?([eE](?<exponent>[+-]?[0-9]+))?\s*(?<unit>\S.*)?$", RegexOptions.ExplicitCapture | RegexOptions.Singleline)]
    private static partial Regex Form();
}
