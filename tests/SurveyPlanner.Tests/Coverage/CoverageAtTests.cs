using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Tests.Coverage;

public class CoverageAtTests
{
    private static readonly SurveyInputs TwoBoxes = new(
        new Boundary("boxes", [Box(1, "west", 10, 10.5), Box(2, "east", 10.6, 11)], "WGS 84", []), [], null);

    /// <summary>The same draws: at the place of a cell the answer is the cell's, exact and simulated.</summary>
    [Theory]
    [InlineData(LayoutKind.Parallel)]
    [InlineData(LayoutKind.Zigzag)]
    [InlineData(LayoutKind.PointGrid)]
    public void At_the_place_of_a_cell_it_is_the_cells_coverage(LayoutKind kind)
    {
        var design = Design(kind);
        var plan = PlanSurvey.Run(design, TwoBoxes, new RunOptions());
        var cells = plan.Strata.SelectMany(stratum => stratum.Coverage!.Cells.Select(cell => (stratum.Stratum.Name, cell))).ToArray();
        var at = PlanSurvey.CoverageAt(design, TwoBoxes, [.. cells.Select(one => one.cell.Position)], new RunOptions(Threads: 2));
        foreach (var ((name, cell), found) in cells.Zip(at))
        {
            Assert.Equal((name, cell.Position), (found.Stratum, found.Position));
            Assert.Equal(cell.Exact is null, found.Exact is null);
            Assert.Equal(cell.Best, found.Best!.Value, 1e-9);
            Assert.Equal((cell.Simulated, cell.ExpectedTimes, cell.StandardError), (found.Simulated, found.ExpectedTimes, found.StandardError));
        }
    }

    [Fact]
    public void Positions_outside_are_kept_and_marked()
    {
        LonLat[] positions = [new(10.55, 55.2), new(10.2, 55.2), new(-169.8, -55.2), new(10.2, 89.9), new(10.8, 55.2)];
        var at = PlanSurvey.CoverageAt(Design(LayoutKind.Parallel), TwoBoxes, positions, new RunOptions());

        Assert.Equal(positions, at.Select(one => one.Position));
        Assert.Equal([null, "west", null, null, "east"], at.Select(one => one.Stratum));
        Assert.Equal([true, false, true, true, false], at.Select(one => one.IsOutside));
        Assert.All(at.Where(one => one.IsOutside), one => Assert.Null(one.Best));
    }

    [Fact]
    public void No_positions_give_no_answers()
        => Assert.Empty(PlanSurvey.CoverageAt(Design(LayoutKind.Zigzag), TwoBoxes, [], new RunOptions()));

    private static SurveyDesign Design(LayoutKind kind) => new(
        "Lisbet Sound",
        20270401,
        "zone",
        [],
        new LayoutDesign(kind, new Sizing.Spacing(4_000), new Bearing.Degrees(30), 400),
        ImmutableSortedDictionary<string, LayoutDesign>.Empty,
        EffortDesign.None,
        new CoverageDesign(Cells: 2000, Replicates: 300));

    private static BoundaryFeature Box(int number, string zone, double west, double east) => new(
        number,
        ImmutableSortedDictionary<string, string>.Empty.Add("zone", zone),
        [new GeographicPolygon([new(west, 55), new(east, 55), new(east, 55.4), new(west, 55.4), new(west, 55)], [])]);
}
