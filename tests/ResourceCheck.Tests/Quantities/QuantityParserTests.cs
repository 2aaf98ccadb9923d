using FsCheck.Xunit;
using ResourceCheck.Quantities;
using Xunit;

namespace ResourceCheck.Tests.Quantities;

public sealed class QuantityParserTests
{
    [Theory]
    [InlineData("80 us", 80e-6)]
    [InlineData("80 \u00b5s", 80e-6)]
    [InlineData("80 \u03bcs", 80e-6)]
    [InlineData("80us", 80e-6)]
    [InlineData("  3.3 ns ", 3.3e-9)]
    [InlineData("0.3 ms", 0.3e-3)]
    [InlineData("7 ps", 7e-12)]
    [InlineData("2 min", 120)]
    [InlineData("12 km", 12000)]
    [InlineData("2.3 cm", 0.023)]
    [InlineData("4.1 mm", 0.0041)]
    [InlineData("1.55 um", 1.55e-6)]
    [InlineData("852 nm", 852e-9)]
    [InlineData("6.07 MHz", 6.07e6)]
    [InlineData("3 mHz", 3e-3)]
    [InlineData("10 kHz", 1e4)]
    [InlineData("1.1 GHz", 1.1e9)]
    [InlineData("0.2 THz", 0.2e12)]
    [InlineData("20 /s", 20)]
    [InlineData("20 1/s", 20)]
    [InlineData("1/s", 1)]
    [InlineData("0.7 /us", 0.7e6)]
    [InlineData("2.04e8 m/s", 2.04e8)]
    [InlineData("204000 km/s", 2.04e8)]
    [InlineData("1 dB", 1)]
    [InlineData("0.2 dB/km", 0.2e-3)]
    [InlineData("3 mrad", 0.003)]
    [InlineData("180 deg", Math.PI)]
    [InlineData("-0.5", -0.5)]
    public void A_quantity_is_the_double_nearest_to_what_is_written(string text, double expected)
    {
        ParsedQuantity parsed = QuantityParser.Parse(text);
        Assert.Equal(QuantityProblem.None, parsed.Problem);
        Assert.Equal(expected, parsed.Value);
        Assert.Null(parsed.Uncertainty);
    }

    // concise form: JCGM 100:2008 (guide to the expression of uncertainty in measurement), 7.2.2
    [Theory]
    [InlineData("80(10) us", 80e-6, 10e-6)]
    [InlineData("1.234(56)e-3 s", 1.234e-3, 0.056e-3)]
    [InlineData("12.3(1.2) km", 12300, 1200)]
    [InlineData("0.92(1)", 0.92, 0.01)]
    [InlineData("90(3) deg", Math.PI / 2, Math.PI / 60)]
    public void Digits_in_brackets_count_in_the_last_place(string text, double value, double uncertainty)
    {
        ParsedQuantity parsed = QuantityParser.Parse(text);
        Assert.Equal(value, parsed.Value);
        Assert.Equal(uncertainty, parsed.Uncertainty!.Value, uncertainty * 1e-15);
    }

    [Theory]
    [InlineData("0,5", QuantityProblem.Comma)]
    [InlineData("12,5 km", QuantityProblem.Comma)]
    [InlineData("", QuantityProblem.NoNumber)]
    [InlineData("km", QuantityProblem.NoNumber)]
    [InlineData(".5 km", QuantityProblem.NoNumber)]
    [InlineData("NaN s", QuantityProblem.NoNumber)]
    [InlineData("Infinity", QuantityProblem.NoNumber)]
    [InlineData("0x10 s", QuantityProblem.UnknownUnit)]
    [InlineData("1 000 m", QuantityProblem.UnknownUnit)]
    [InlineData("5. km", QuantityProblem.UnknownUnit)]
    [InlineData("80(1 us", QuantityProblem.UnknownUnit)]
    [InlineData("3 KM", QuantityProblem.UnknownUnit)]
    [InlineData("3 s s", QuantityProblem.UnknownUnit)]
    [InlineData("1e400 s", QuantityProblem.OutOfRange)]
    [InlineData("1e-400 s", QuantityProblem.OutOfRange)]
    [InlineData("1e99999999999 s", QuantityProblem.OutOfRange)]
    public void What_is_no_quantity_is_refused(string text, object problem) =>
        Assert.Equal((QuantityProblem)problem, QuantityParser.Parse(text).Problem);

    [Fact]
    public void Every_unit_of_the_table_is_read_in_its_own_dimension() => Assert.All(UnitTable.All, unit =>
    {
        ParsedQuantity parsed = QuantityParser.Parse($"1 {unit.Symbol}");
        Assert.Same(unit, parsed.Unit);
        Assert.Equal(double.Parse($"1e{unit.PowerOfTen}") * unit.Factor, parsed.Value);
    });

    [Property(MaxTest = 1000)]
    public void No_text_throws(string? text) => Assert.True(Enum.IsDefined(QuantityParser.Parse(text ?? "").Problem));
}
