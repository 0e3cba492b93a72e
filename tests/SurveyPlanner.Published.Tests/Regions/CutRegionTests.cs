using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Published.Tests.Regions;

/// <summary>Fiji (Natural Earth, public domain), cut at 180° as RFC 7946 wants it: three of its islands lie on both sides.</summary>
public class CutRegionTests
{
    private static readonly Region Fiji = RegionBuilder.Build(
        BoundaryReader.Read(ReferenceData.Path("regions", "antimeridian_fiji.geojson"), new BoundaryOptions()), new RegionDesign(), []);

    /// <summary>44 polygons in the file; Vanua Levu, Taveuni and Rabi (names from memory) are cut, one of them with a vertex on one side only.</summary>
    [Fact]
    public void Its_cut_islands_are_whole_again()
    {
        Assert.Equal(41, Fiji.Strata[0].Shape.PartCount);
        Assert.Equal(0, Fiji.Strata[0].Shape.HoleCount);
    }

    /// <summary>
    /// But for a stretch that the file has on one side only: there one outline leaves 180° at 16.490089° S, the other's at 16.491777° S (read in the file).
    /// </summary>
    [Fact]
    public void The_cut_is_no_edge_of_it()
    {
        var shape = Fiji.Strata[0].Shape;
        var along = 0.0;
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
            for (var i = start; i < end; i++)
            {
                var (from, to) = (At(i), At(i + 1 == end ? start : i + 1));
                along += IsOn180(from) && IsOn180(to) ? Math.Abs(to.Lat - from.Lat) : 0;
            }
        }

        Assert.Equal(16.491777 - 16.490089, along, 1e-9);

        LonLat At(int vertex) => Fiji.Projection.Unproject(new PlanePoint(shape.X[vertex], shape.Y[vertex]));
        static bool IsOn180(LonLat position) => Math.Abs(Math.Abs(position.Lon) - 180) < 1e-9;
    }
}
