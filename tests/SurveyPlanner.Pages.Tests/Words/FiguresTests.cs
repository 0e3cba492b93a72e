using System.Globalization;
using CsCheck;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Pages.Tests.Words;

public class FiguresTests
{
    /// <summary>A figure as the pages should show it, by another way than theirs: the framework's general format of three digits.</summary>
    internal static string Shown(double value)
    {
        var text = ((decimal)value).ToString("G3", System.Globalization.CultureInfo.InvariantCulture);
        var digits = text.TrimStart('0', '.').Count(char.IsDigit);
        return digits >= 3 ? text : text + (text.Contains('.', StringComparison.Ordinal) ? "" : ".") + new string('0', 3 - digits);
    }

    [Theory]
    [InlineData(0.0, "0")]
    [InlineData(1e-12, "0")]
    [InlineData(0.0034567, "0.00346")]
    [InlineData(0.12, "0.120")]
    [InlineData(9.996, "10.0")]
    [InlineData(99.96, "100")]
    [InlineData(123.4, "123")]
    [InlineData(999.6, "1\u202f000")]
    [InlineData(12345.0, "12\u202f300")]
    [InlineData(-2.5049, "-2.50")]
    [InlineData(double.NaN, "–")]
    [InlineData(double.PositiveInfinity, "–")]
    public void Figures_have_three_significant_digits(double value, string expected) => Assert.Equal(expected, Figures.Three(value));

    [Fact]
    public void A_missing_figure_is_a_dash() => Assert.Equal("–", Figures.Three(null));

    [Fact]
    public void Three_significant_digits_are_never_off_by_more_than_half_of_the_last()
        => Gen.Double[1e-6, 1e9].Hold(
            20_000, seed: 1,
            value =>
            {
                var shown = double.Parse(Figures.Three(value).Replace("\u202f", "", StringComparison.Ordinal), System.Globalization.CultureInfo.InvariantCulture);
                Assert.True(Math.Abs(shown - value) <= 0.005001 * value);
            });

    [Theory]
    [InlineData(0.0, "0.0")]
    [InlineData(359.96, "0.0")]
    [InlineData(-0.04, "0.0")]
    [InlineData(-10.0, "350.0")]
    [InlineData(89.95, "90.0")]
    public void Bearings_stay_on_the_circle(double degrees, string expected) => Assert.Equal(expected, Figures.Bearing(degrees));

    [Theory]
    [InlineData(60.1234567, 21.5, "60.12346, 21.50000", "60°07.407′ N 021°30.000′ E")]
    [InlineData(-17.99999999, 179.99999999, "-18.00000, 180.00000", "18°00.000′ S 180°00.000′ E")]
    [InlineData(-0.5, -0.25, "-0.50000, -0.25000", "00°30.000′ S 000°15.000′ W")]
    [InlineData(59.9999999, 190, "60.00000, -170.00000", "60°00.000′ N 170°00.000′ W")]
    [InlineData(1, -540, "1.00000, 180.00000", "01°00.000′ N 180°00.000′ E")]
    public void Positions_carry_minutes_into_degrees_and_longitudes_into_the_half_circle(double lat, double lon, string degrees, string minutes)
    {
        Assert.Equal(degrees, Positions.Decimal(new LonLat(lon, lat)));
        Assert.Equal(minutes, Positions.Minutes(new LonLat(lon, lat)));
    }

    [Theory]
    [InlineData("a&#x1;b&#x202E;c", "a\uFFFDb\uFFFDc")]
    [InlineData("&#xE9;&#xB0;&#x1F600;", "é°😀")]
    [InlineData("&#x27;&#x2B;", "&#x27;&#x2B;")]
    [InlineData("a&#xA;b&#x9;c", "a b c")]
    [InlineData("&amp;#x1;", "&amp;#x1;")]
    public void References_of_forbidden_characters_are_replaced_and_the_others_spelled_out(string html, string expected)
        => Assert.Equal(expected, PlainText.SettleReferences(html));

    [Theory]
    [InlineData(0, "0")]
    [InlineData(1.01e-7, "under 0.001")]
    [InlineData(0.00001, "0.00100")]
    [InlineData(0.0137, "1.37")]
    [InlineData(1, "100")]
    public void A_sliver_of_area_is_not_given_digits(double share, string expected) => Assert.Equal(expected, Figures.AreaShare(share));

    [Theory]
    [InlineData("Outer sound")]
    [InlineData("Administrativebezirkgrenzüberschreitenderzusammenarbeitsgebiet nordwestlich")]
    [InlineData("👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬👩‍🔬")]
    [InlineData("")]
    public void A_text_may_be_broken_where_it_has_no_space_for_long_and_nowhere_else(string text)
    {
        var pieces = PlainText.Pieces(text);
        Assert.Equal(text, string.Concat(pieces));
        Assert.All(pieces.SelectMany(piece => piece.Split(' ')), run => Assert.InRange(new StringInfo(run).LengthInTextElements, 0, 24));
        Assert.Equal(new StringInfo(text).LengthInTextElements, pieces.Sum(piece => new StringInfo(piece).LengthInTextElements));
        Assert.Equal(text.Split(' ').Sum(run => Math.Max(0, (new StringInfo(run).LengthInTextElements - 1) / 24)), pieces.Count - 1);
    }

    [Fact]
    public void Shortening_never_cuts_a_character_in_two()
    {
        Assert.Equal("Bay", PlainText.Shorten("Bay", 3));
        Assert.Equal("Ba…", PlainText.Shorten("Bay of", 3));
        Assert.Equal("😀…", PlainText.Shorten("😀😀😀", 2));
        Assert.Equal("Northern waters of…th, west", PlainText.Shorten("Northern waters of the great firth, west", 27));
        Assert.Equal("Northern waters of…th, east", PlainText.Shorten("Northern waters of the great firth, east", 27));
    }
}
