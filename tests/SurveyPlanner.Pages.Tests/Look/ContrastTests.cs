using System.Globalization;
using SurveyPlanner.Pages.Look;
using SurveyPlanner.Pages.Maps;

namespace SurveyPlanner.Pages.Tests.Look;

/// <summary>Contrast ratio and its limits: WCAG 2.2, success criteria 1.4.3 (text, 4.5:1) and 1.4.11 (graphics, 3:1), and its definition of relative luminance.</summary>
public class ContrastTests
{
    public static TheoryData<string, string> TextPairs =>
    [
        (Tokens.Ink, Tokens.Ground), (Tokens.Ink, Tokens.Paper), (Tokens.Muted, Tokens.Ground), (Tokens.Muted, Tokens.Paper),
        (Tokens.Action, Tokens.Ground), (Tokens.Signal, Tokens.Ground),
        .. Tokens.StratumFills.SelectMany(fill => new (string, string)[] { (Tokens.Ink, fill), (Tokens.Muted, fill) }),
    ];

    public static TheoryData<string, string> LinePairs =>
    [
        (Tokens.Coast, Tokens.Paper), (Tokens.Hatch, Tokens.Paper), (Tokens.Sketch, Tokens.Paper), (Tokens.Muted, Tokens.Ground),
        (Tokens.Action, Tokens.Ground), (Tokens.Signal, Tokens.StratumFills[0]),
        (Tokens.Action, Tokens.StratumFills[0]), (Tokens.Coast, Tokens.Ground), (Tokens.Ink, Band), (Tokens.Action, Band), (Tokens.Muted, Band),
        .. Tokens.StratumFills.SelectMany(fill => new (string, string)[] { (Tokens.Ink, fill), (Tokens.Coast, fill), (Tokens.Signal, fill) }),
    ];

    /// <summary>The action colour at 18 % opacity on the page: the band of a chart.</summary>
    private static string Band => "#" + string.Concat(new[] { 1, 3, 5 }.Select(at => ((int)Math.Round((0.18 * Byte(Tokens.Action, at)) + (0.82 * Byte(Tokens.Ground, at)))).ToString("x2", CultureInfo.InvariantCulture)));

    [Theory]
    [MemberData(nameof(TextPairs))]
    public void Text_has_a_contrast_of_at_least_4_5_to_1(string text, string ground) => Assert.True(Contrast(text, ground) >= 4.5, $"{Contrast(text, ground):0.00}");

    [Theory]
    [MemberData(nameof(LinePairs))]
    public void Lines_have_a_contrast_of_at_least_3_to_1(string line, string ground) => Assert.True(Contrast(line, ground) >= 3, $"{Contrast(line, ground):0.00}");

    /// <summary>Black on white is 21:1 by definition; #767676 on white is the well-known lightest grey that passes 4.5:1 (WebAIM, 4.54:1).</summary>
    [Fact]
    public void The_contrast_formula_gives_the_known_values()
    {
        Assert.Equal(21, Contrast("#000000", "#ffffff"), 1e-12);
        Assert.Equal(4.54, Contrast("#767676", "#ffffff"), 0.005);
    }

    /// <summary>Legible in grey: each class is lighter than the one before by at least 8 of CIE L* (CIE 15:2004), of which 1 is just noticeable.</summary>
    [Fact]
    public void Classes_of_coverage_grow_lighter_step_by_step()
    {
        var lightness = Enumerable.Range(0, 6).Select(i => Lightness(CoverageClasses.ColourOf(i))).ToArray();
        Assert.All(lightness.Zip(lightness.Skip(1)), pair => Assert.True(pair.Second - pair.First >= 8, $"{pair.First:0.0} to {pair.Second:0.0}"));
    }

    /// <summary>The nine steps as published (see Cividis) are met exactly, and lightness never falls between them.</summary>
    [Fact]
    public void The_scale_runs_from_dark_blue_to_yellow_and_only_grows_lighter()
    {
        Assert.Equal("#002051", Cividis.At(0));
        Assert.Equal("#7f7c75", Cividis.At(0.5));
        Assert.Equal("#fdea45", Cividis.At(1));
        var lightness = Enumerable.Range(0, 101).Select(i => Lightness(Cividis.At(i / 100.0))).ToArray();
        Assert.All(lightness.Zip(lightness.Skip(1)), pair => Assert.True(pair.Second > pair.First));
    }

    private static double Contrast(string a, string b)
    {
        var (x, y) = (Luminance(a), Luminance(b));
        return (Math.Max(x, y) + 0.05) / (Math.Min(x, y) + 0.05);
    }

    private static double Luminance(string colour) => (0.2126 * Channel(colour, 1)) + (0.7152 * Channel(colour, 3)) + (0.0722 * Channel(colour, 5));

    private static int Byte(string colour, int at) => int.Parse(colour.AsSpan(at, 2), NumberStyles.HexNumber, CultureInfo.InvariantCulture);

    private static double Channel(string colour, int at)
    {
        var share = Byte(colour, at) / 255.0;
        return share <= 0.04045 ? share / 12.92 : Math.Pow((share + 0.055) / 1.055, 2.4);
    }

    private static double Lightness(string colour) => Luminance(colour) is var y && y > 0.008856 ? (116 * Math.Cbrt(y)) - 16 : 903.3 * y;
}
