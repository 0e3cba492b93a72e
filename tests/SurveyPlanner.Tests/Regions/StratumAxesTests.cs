using System.Collections.Immutable;
using CsCheck;
using NetTopologySuite.Algorithm;
using NetTopologySuite.Geometries;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Regions;

public class StratumAxesTests
{
    /// <summary>Second method: NetTopologySuite's minimum diameter, and the spread of the hull along and across the direction found.</summary>
    [Fact]
    public void The_narrowest_rectangle_is_as_narrow_as_another_library_finds_it() =>
        RandomShapes.Strata.Hold(
            300,
            seed: 1,
            stratum =>
            {
                var hull = PlaneGeometry.ConvexHull(stratum.Shape);
                var (longSide, shortSide, angle) = StratumAxes.Of(hull);
                var points = new GeometryFactory().CreateMultiPointFromCoords([.. hull.Select(point => new Coordinate(point.X, point.Y))]);
                var width = new MinimumDiameter(points).Length;
                Assert.Equal(width, Math.Min(Spread(hull, angle), Spread(hull, angle + (Math.PI / 2))), 1e-6 * width);
                Assert.Equal(longSide, Spread(hull, angle), 1e-6 * longSide);
                Assert.Equal(shortSide, Spread(hull, angle + (Math.PI / 2)), 1e-6 * shortSide);
            });

    [Fact]
    public void A_hull_of_a_hundred_thousand_vertices_is_measured_too()
    {
        var hull = Enumerable.Range(0, 100_000)
            .Select(i => new PlanePoint(3000 * Math.Cos(2 * Math.PI * i / 1e5), 1000 * Math.Sin(2 * Math.PI * i / 1e5)))
            .ToImmutableArray();
        var (longSide, shortSide, angle) = StratumAxes.Of(hull);
        Assert.Equal(6000, longSide, 0.01);
        Assert.Equal(2000, shortSide, 0.01);
        Assert.Equal(0, Math.Sin(angle), 1e-3);
    }

    private static double Spread(ImmutableArray<PlanePoint> hull, double angle)
    {
        var along = hull.Select(point => (point.X * Math.Cos(angle)) + (point.Y * Math.Sin(angle))).ToList();
        return along.Max() - along.Min();
    }
}
