using FsCheck.Fluent;
using FsCheck.Xunit;
using ResourceCheck.Quantities;
using Xunit;

namespace ResourceCheck.Tests.Quantities;

public sealed class QuantityTextTests
{
    [Theory]
    [InlineData(41.3e-6, "41.3 us")]
    [InlineData(0, "0 s")]
    [InlineData(999.9e-9, "1 us")]
    [InlineData(12.5e-12, "12.5 ps")]
    [InlineData(0.0012345, "1.23 ms")]
    [InlineData(75, "75 s")]
    [InlineData(86400, "86400 s")]
    [InlineData(-3e-6, "-3 us")]
    [InlineData(4e-15, "0.004 ps")]
    [InlineData(3e20, "3e20 s")]
    public void A_time_is_printed_in_the_unit_that_reads_best(double seconds, string expected) =>
        Assert.Equal(expected, QuantityText.Of(Duration.FromSeconds(seconds)));

    [Theory]
    [InlineData(6000, "6 km")]
    [InlineData(2.5, "2.5 m")]
    [InlineData(1.55e-6, "1.55 um")]
    public void A_length_is_printed_in_the_unit_that_reads_best(double metres, string expected) =>
        Assert.Equal(expected, QuantityText.Of(Length.FromMetres(metres)));

    [Property(MaxTest = 2000)]
    public void What_is_printed_exactly_is_read_back_as_the_same_number(double value)
    {
        if (!double.IsFinite(value))
            return;
        Assert.Equal(value, QuantityParser.Parse(QuantityText.Exact(Duration.FromSeconds(value))).Value);
        Assert.Equal(value, QuantityParser.Parse(QuantityText.Exact(Length.FromMetres(value))).Value);
        Assert.Equal(value, QuantityParser.Parse(QuantityText.Exact(Rate.FromPerSecond(value))).Value);
        Assert.Equal(value, QuantityParser.Parse(QuantityText.Exact(Speed.FromMetresPerSecond(value))).Value);
    }

    [Property(MaxTest = 2000)]
    public FsCheck.Property Rounding_keeps_the_asked_number_of_digits() =>
        Prop.ForAll(Gen.Choose(-120, 120).SelectMany(e => Gen.Choose(100, 999).Select(m => m * Math.Pow(10, e / 10.0))).ToArbitrary(), value =>
        {
            double read = QuantityParser.Parse(QuantityText.Of(Duration.FromSeconds(value))).Value;
            Assert.Equal(value, read, value * 0.0051);
        });
}
