using SurveyPlanner.Files.Plans;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>Keys that belong to one or two kinds of layout.</summary>
public class LayoutKeysTests
{
    private const string LineKind = "half_width = \"100 m\"\nspacing = \"2 km\"";
    private const string PointKind = "radius = \"100 m\"\npoints = 30";

    private static readonly LayoutDesign Lines = new(LayoutKind.Parallel, new Sizing.Spacing(2000), new Bearing.ShortAxis(), 100);
    private static readonly LayoutDesign Points = Lines with { Sizing = new Sizing.Number(30) };

    public static TheoryData<string, LayoutDesign> Right => new()
    {
        { $"kind = \"random-parallel\"\nplacement = \"one-per-band\"\n{LineKind}", Lines with { Kind = LayoutKind.RandomParallel, Placement = LinePlacement.OnePerBand } },
        { $"kind = \"segments\"\nlength = \"800 m\"\nbearing = \"random\"\ncrossing = \"keep\"\n{LineKind}", Lines with { Kind = LayoutKind.Segments, SegmentMetres = 800, Bearing = new Bearing.Random(), Crossing = CrossingRule.Keep } },
        { $"kind = \"loops\"\nside = \"500 m\"\n{LineKind}", Lines with { Kind = LayoutKind.Loops, SideMetres = 500 } },
        { $"kind = \"points-on-lines\"\nstep = \"400 m\"\n{PointKind}", Points with { Kind = LayoutKind.PointsOnLines, StepMetres = 400 } },
        { $"kind = \"random-points\"\n{PointKind}", Points with { Kind = LayoutKind.RandomPoints } },
        { $"kind = \"balanced-points\"\nreserve = 15\n{PointKind}", Points with { Kind = LayoutKind.BalancedPoints, Reserve = 15 } },
    };

    [Theory]
    [MemberData(nameof(Right))]
    public void They_reach_the_design(string layout, LayoutDesign expected)
        => Assert.Equal(expected, Read(layout));

    [Theory]
    [InlineData("kind = \"segments\"", LineKind, "layout.length: is missing: write length = \"1 km\" under [layout]")]
    [InlineData("kind = \"loops\"", LineKind, "layout.side: is missing: write side = \"500 m\" under [layout]")]
    [InlineData("kind = \"points-on-lines\"", PointKind, "layout.step: is missing: write step = \"400 m\" under [layout]")]
    [InlineData("kind = \"parallel\"\nreserve = 5", LineKind, "layout.reserve: belongs to random-points and balanced-points, and the kind here is parallel: take it out")]
    [InlineData("kind = \"point-grid\"\nreserve = 5", PointKind, "layout.reserve: belongs to random-points and balanced-points, and the kind here is point-grid: take it out")]
    [InlineData("kind = \"parallel\"\ncrossing = \"keep\"", LineKind, "layout.crossing: belongs to segments and loops, and the kind here is parallel: take it out")]
    [InlineData("kind = \"loops\"\nside = \"0 m\"", LineKind, "layout.side: \"0 m\" is not more than 0")]
    public void A_slip_is_told_at_its_key(string kind, string rest, string expected)
    {
        var refusal = Assert.Throws<InputException>(() => Read($"{kind}\n{rest}"));
        Assert.Contains(expected, refusal.Problems.Single().ToString(), StringComparison.Ordinal);
    }

    private static LayoutDesign Read(string layout)
        => PlanFileReader.Parse($"[region]\nboundary = \"moor.geojson\"\n[layout]\n{layout}\n", "a.toml", []).Design.Layout;
}
