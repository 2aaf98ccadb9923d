using System.Globalization;
using FsCheck.Xunit;
using ResourceCheck.Quantities;
using Xunit;

namespace ResourceCheck.Tests.Reports;

public sealed class FigureTextTests
{
    [Theory]
    [InlineData(0, "0")]
    [InlineData(1, "1")]
    [InlineData(0.02, "0.02")]
    [InlineData(0.87126, "0.8713")]
    [InlineData(0.081234, "0.08123")]
    [InlineData(0.980004, "0.9800")]
    [InlineData(0.999986, "0.999986")]
    [InlineData(0.9999859, "0.999986")]
    [InlineData(0.9999999999999998, "1")]
    [InlineData(0.99999999, "0.99999999")]
    [InlineData(1.23456e-15, "1.235e-15")]
    [InlineData(0.00009999999, "1e-4")]
    [InlineData(9.99996, "10.00")]
    [InlineData(2.8284271247461903, "2.828")]
    [InlineData(123456, "123456")]
    [InlineData(1234567.5, "1.235e6")]
    [InlineData(-0.028733, "-0.02873")]
    [InlineData(double.NaN, "undefined")]
    [InlineData(double.NegativeInfinity, "minus infinite")]
    public void Numbers_show_four_digits_or_those_of_the_loss(double value, string shown) => Assert.Equal(shown, FigureText.Number(value));

    [Theory]
    [InlineData(0, "0 s")]
    [InlineData(4.13e-5, "41.3 us")]
    [InlineData(3e-13, "0.3 ps")]
    [InlineData(0.0012, "1.2 ms")]
    [InlineData(599, "599 s")]
    [InlineData(5400, "90 min")]
    [InlineData(7200, "2 h")]
    [InlineData(172800, "2 d")]
    public void Times_carry_a_unit_that_suits_them(double seconds, string shown) => Assert.Equal(shown, FigureText.Time(seconds));

    [Theory]
    [InlineData(0, "0")]
    [InlineData(0.0126, "0.013")]
    [InlineData(0.00401, "0.0040")]
    [InlineData(0.0996, "0.10")]
    [InlineData(12.34, "12")]
    [InlineData(123.4, "120")]
    [InlineData(3.21e-7, "3.2e-7")]
    [InlineData(double.NaN, "undefined")]
    public void Uncertainties_show_two_digits(double value, string shown) => Assert.Equal(shown, FigureText.Uncertainty(value));

    [Theory]
    [InlineData(512, "512 B")]
    [InlineData(1_250_000, "1.25 MB")]
    [InlineData(6.4e10, "64 GB")]
    public void Memory_sizes_carry_a_unit_that_suits_them(double bytes, string shown) => Assert.Equal(shown, FigureText.Bytes(bytes));

    [Fact]
    public void Round_off_of_a_difference_does_not_show() => Assert.Equal(("0", "0.1288", "0.2"), (FigureText.Difference(2.2e-16), FigureText.Difference(0.12876), FigureText.Difference(1 - 0.8)));

    [Property(MaxTest = 2000)]
    public bool A_bound_is_never_shown_better_than_it_is(double value, int scale)
    {
        double number = value * Math.Pow(10, scale % 12);
        return !double.IsFinite(number)
            || (Read(FigureText.Number(number, Rounding.Down)) <= number && Read(FigureText.Number(number, Rounding.Up)) >= number);
    }

    [Property(MaxTest = 2000)]
    public bool A_bound_close_to_1_is_never_shown_better_than_it_is(ushort fraction, byte power)
    {
        double number = 1 - ((fraction + 1) / 65537.0 * Math.Pow(10, -(power % 16)));
        return Read(FigureText.Number(number, Rounding.Down)) <= number && Read(FigureText.Number(number, Rounding.Up)) >= number;
    }

    [Property(MaxTest = 2000)]
    public bool A_shown_number_is_within_half_of_its_last_digit(double value)
    {
        if (!double.IsFinite(value) || Math.Abs(value) is < 1e-290 or > 1e300)
            return true;
        return Math.Abs(Read(FigureText.Number(value)) - value) <= Math.Abs(value) * 5.001e-4;
    }

    private static double Read(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
