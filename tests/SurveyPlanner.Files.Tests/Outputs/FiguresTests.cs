using System.Globalization;
using CsCheck;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class FiguresTests
{
    [Theory]
    [InlineData(0.00001, 7, "0.00001")]
    [InlineData(-0.00000001, 7, "0")]
    [InlineData(-0.0, 3, "0")]
    [InlineData(-1.5, 3, "-1.5")]
    [InlineData(63.1, 7, "63.1")]
    [InlineData(100, 0, "100")]
    [InlineData(1e21, 2, "1000000000000000000000")]
    [InlineData(12.9999999999, 7, "13")]
    [InlineData(-1e-40, 30, "0")]
    [InlineData(0.5, 0, "1")]
    [InlineData(-2.5, 0, "-3")]
    [InlineData(123456789012345678, 2, "123456789012345680")]
    public void Fixed_figures_have_no_exponent_no_minus_zero_and_no_needless_zeros(double value, int decimals, string expected) =>
        Assert.Equal(expected, Figures.Fixed(value, decimals));

    [Theory]
    [InlineData(0, 9, "0")]
    [InlineData(1234567890123.4, 9, "1234567890123")]
    [InlineData(0.000012345678949, 9, "0.0000123456789")]
    [InlineData(9.9999999996, 9, "10")]
    [InlineData(103125.12345678912, 12, "103125.123457")]
    [InlineData(-0.5, 3, "-0.5")]
    public void Significant_figures_keep_their_digits(double value, int digits, string expected) =>
        Assert.Equal(expected, Figures.Significant(value, digits));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void What_is_no_number_is_never_printed(double value)
    {
        Assert.Throws<InvalidOperationException>(() => Figures.Fixed(value, 3));
        Assert.Throws<InvalidOperationException>(() => Figures.Significant(value, 3));
    }

    [Theory]
    [InlineData(180, "-180")]
    [InlineData(179.99999999, "-180")]
    [InlineData(-180.00000001, "-180")]
    [InlineData(539.5, "179.5")]
    [InlineData(-181, "179")]
    [InlineData(-0.00000001, "0")]
    public void A_longitude_stays_below_180(double lon, string expected) => Assert.Equal(expected, Figures.Longitude(lon));

    [Theory]
    [InlineData(359.9999999, 360, "0")]
    [InlineData(179.9999999, 180, "0")]
    [InlineData(179.9999999, 360, "180")]
    [InlineData(90.25, 360, "90.25")]
    public void A_bearing_never_rounds_up_to_a_full_turn(double bearing, double turn, string expected) =>
        Assert.Equal(expected, Figures.Bearing(bearing, turn));

    [Fact]
    public void Any_number_reads_back_to_within_its_rounding() =>
        Gen.Double[-1e9, 1e9].Hold(10_000, seed: 1, value =>
        {
            Assert.Equal(value, double.Parse(Figures.Metres(value), CultureInfo.InvariantCulture), 0.00051);
            Assert.Equal(value, double.Parse(Figures.Area(value), CultureInfo.InvariantCulture), (Math.Abs(value) * 5e-12) + 1e-33);
        });

    [Fact]
    public void Figures_are_the_same_in_a_culture_that_writes_commas()
    {
        // Invariant globalization leaves no other culture in the program itself; a hand-made one stands for it.
        var comma = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        comma.NumberFormat.NumberDecimalSeparator = ",";
        comma.NumberFormat.NegativeSign = "~";
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = comma;
            Assert.Equal("-1.5", Figures.Fixed(-1.5, 3));
            Assert.Equal("0.0000123", Figures.Significant(1.23e-5, 3));
            Assert.Equal("S01 30.000 W000 30.000", DegreesMinutes.Of(new(-0.5, -1.5)));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }
}
