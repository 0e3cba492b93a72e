using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Tests.Maps;

public class GraticuleTests
{
    [Fact]
    public void Across_180_degrees_meridians_are_counted_through_and_named_east_and_west()
    {
        var labels = LabelsAt(new LonLat(179.5, -17), widthKm: 900);
        Assert.Contains("180°", labels);
        Assert.Contains(labels, label => label.EndsWith("° E", StringComparison.Ordinal));
        Assert.Contains(labels, label => label.EndsWith("° W", StringComparison.Ordinal));
        Assert.DoesNotContain(labels, label => label.StartsWith("18", StringComparison.Ordinal) && label.Length > 4 && label != "18° S");
    }

    [Fact]
    public void Round_the_pole_every_meridian_is_drawn_once_and_parallels_are_circles()
    {
        var labels = LabelsAt(new LonLat(20, 90), widthKm: 2000);
        Assert.Equal(labels.Count, labels.Distinct().Count());
        var meridians = labels.Where(label => label.EndsWith('E') || label.EndsWith('W') || label is "0°" or "180°").ToArray();
        Assert.InRange(meridians.Length, 10, 12);
        Assert.Contains("85° N", labels);
        Assert.DoesNotContain("90° N", labels);
    }

    [Theory]
    [InlineData(0.5, "′ N")]
    [InlineData(20, "′ N")]
    [InlineData(1000, "° N")]
    public void Steps_suit_the_size_of_the_region(double widthKm, string ending)
    {
        var labels = LabelsAt(new LonLat(21, 60.3), widthKm);
        Assert.InRange(labels.Count, 4, 30);
        Assert.Contains(labels, label => label.EndsWith(ending, StringComparison.Ordinal));
    }

    /// <summary>Each line runs where the projection puts it: every vertex of the path, taken back to degrees, lies on a labelled meridian or parallel.</summary>
    [Fact]
    public void Lines_lie_on_round_degrees()
    {
        var projection = new AzimuthalEqualArea(new LonLat(-19, 65));
        var frame = MapFrame.Around(-250_000, 250_000, -150_000, 150_000);
        var graticule = Graticule.For(projection, frame, new LabelPlacer(frame.Width, frame.Height));
        foreach (var vertex in Vertices(graticule.Path))
        {
            var position = projection.Unproject(frame.ToPlane(vertex));
            var off = Math.Min(FromWhole(position.Lon / 2) * 2, FromWhole(position.Lat));
            Assert.True(off < 0.002, $"{position} is {off}° off");
        }
    }

    [Theory]
    [InlineData(180, 1, "180°")]
    [InlineData(-180, 1, "180°")]
    [InlineData(540, 1, "180°")]
    [InlineData(181, 1, "179° W")]
    [InlineData(0, 1, "0°")]
    [InlineData(-0.5, 0.5, "0°30′ W")]
    [InlineData(20.9999999999, 0.5, "21°00′ E")]
    [InlineData(20.005, 0.005, "20°00.3′ E")]
    public void Longitudes_are_named_as_charts_do(double lon, double step, string expected) => Assert.Equal(expected, DegreeText.Longitude(lon, step));

    [Fact]
    public void The_equator_has_no_hemisphere() => Assert.Equal("0°", DegreeText.Latitude(0, 1));

    private static double FromWhole(double value) => Math.Abs(value - Math.Round(value));

    private static IReadOnlyList<string> LabelsAt(LonLat centre, double widthKm)
    {
        var frame = MapFrame.Around(-widthKm * 500, widthKm * 500, -widthKm * 350, widthKm * 350);
        var graticule = Graticule.For(new AzimuthalEqualArea(centre), frame, new LabelPlacer(frame.Width, frame.Height));
        Assert.All(graticule.Labels, label => Assert.True(frame.Contains(label.Place)));
        return [.. graticule.Labels.Select(label => label.Text)];
    }

    internal static IEnumerable<Pixel> Vertices(string path)
    {
        var (x, y) = (0.0, 0.0);
        foreach (System.Text.RegularExpressions.Match step in System.Text.RegularExpressions.Regex.Matches(path, @"([Ml])(-?[\d.]+) ?(-?[\d.]+)"))
        {
            var (dx, dy) = (Number(step.Groups[2].Value), Number(step.Groups[3].Value));
            (x, y) = step.Groups[1].Value == "M" ? (dx, dy) : (x + dx, y + dy);
            yield return new Pixel(x, y);
        }

        static double Number(string text) => double.Parse(text, System.Globalization.CultureInfo.InvariantCulture);
    }
}
