using NetTopologySuite.Geometries;
using NetTopologySuite.Operation.OverlayNG;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>Exact coverage of random islands with holes, held against ways that share no code with it.</summary>
public class ExactSecondMethodTests
{
    /// <summary>The definition itself: of very many offsets, the share at which some line within the half-width has its foot inside.</summary>
    [Theory]
    [InlineData(900, EdgeRule.Minus)]
    [InlineData(900, EdgeRule.Plus)]
    [InlineData(1600, EdgeRule.Minus)] // strips overlap
    [InlineData(4500, EdgeRule.Minus)] // each place lies in the strips of four or five lines
    public void Parallel_lines_cover_at_the_share_of_offsets_that_the_formula_says(double halfWidth, EdgeRule edge)
    {
        const int offsets = 4001;
        const double spacing = 2000;
        foreach (var stratum in RandomShapes.Sample(10))
        {
            var lines = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(spacing, halfWidth) with { Edge = edge });
            var (region, clip) = (lines.Stratum.Region, lines.Stratum.Clip);
            foreach (var (x, y) in Inside(region, 12))
            {
                var covered = 0;
                for (var i = 0; i < offsets; i++)
                {
                    // Lines at this offset that come within the half-width of the place.
                    var first = clip.MinY + ((i + 0.5) / offsets * spacing);
                    var isCovered = false;
                    for (var k = Math.Ceiling((y - halfWidth - first) / spacing); first + (k * spacing) <= y + halfWidth && !isCovered; k++)
                    {
                        isCovered = clip.Contains(x, first + (k * spacing));
                    }

                    covered += isCovered ? 1 : 0;
                }

                // Each end of a stretch of offsets costs up to half an offset; few places have more than eight.
                var exact = ExactCoverage.At(lines, CellGrid.OfPlaces([(x, y)], out _))![0];
                Assert.Equal((double)covered / offsets, exact, 4.0 / offsets);
            }
        }
    }

    /// <summary>General overlay: area that the region shares with a disk of 2,000 corners (3e-6 too small) over the grid's cell.</summary>
    [Theory]
    [InlineData(300)]
    [InlineData(900)]
    public void Point_grids_cover_by_the_area_that_general_overlay_finds(double radius)
    {
        foreach (var stratum in RandomShapes.Sample(12))
        {
            var grid = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(2_000, radius, LayoutKind.PointGrid));
            var region = grid.Stratum.Region;
            foreach (var (x, y) in Inside(region, 40))
            {
                var exact = ExactCoverage.At(grid, CellGrid.OfPlaces([(x, y)], out _))![0];
                var place = grid.Stratum.Frame.ToPlane(x, y);
                Assert.Equal(SharedWithDisk(stratum.Shape, place, radius) / 4e6, exact, 1e-5 * Math.PI * radius * radius / 4e6);
            }
        }
    }

    private static IEnumerable<(double X, double Y)> Inside(FrameShape shape, int count)
    {
        var random = new PhiloxStream(7, 99, 0, 0);
        while (count > 0)
        {
            var (x, y) = (shape.MinX + (random.NextDouble() * (shape.MaxX - shape.MinX)), shape.MinY + (random.NextDouble() * (shape.MaxY - shape.MinY)));
            if (shape.Contains(x, y))
            {
                count--;
                yield return (x, y);
            }
        }
    }

    private static double SharedWithDisk(PlaneShape shape, PlanePoint centre, double radius)
    {
        const int corners = 2000;
        var ring = Enumerable.Range(0, corners + 1).Select(i => new Coordinate(
            centre.X + (radius * Math.Cos(2 * Math.PI * (i % corners) / corners)), centre.Y + (radius * Math.Sin(2 * Math.PI * (i % corners) / corners))));
        var disk = GeometryFactory.Default.CreatePolygon([.. ring]);
        return PlaneGeometry.ToPolygons(shape)
            .Sum(part => OverlayNGRobust.Overlay(part, disk, NetTopologySuite.Operation.Overlay.SpatialFunction.Intersection).Area);
    }
}
