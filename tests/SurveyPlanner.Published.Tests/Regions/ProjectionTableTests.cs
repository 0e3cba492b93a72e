using System.Globalization;
using System.IO.Compression;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Published.Tests.Regions;

/// <summary>
/// 100,000 random positions in 20 planes, both hemispheres, across 180°, at the poles, computed with PROJ 9.1.1 by
/// tests/reference-data/projections/make-projections.py: within 1 mm, forward and back.
/// </summary>
public class ProjectionTableTests
{
    private const double MetresPerDegree = 111_320;

    [Fact]
    public void A_hundred_thousand_positions_are_within_a_millimetre_of_PROJ()
    {
        var planes = new Dictionary<string, EqualAreaProjection>();
        var (rows, worstForward, worstBack) = (0, 0.0, 0.0);
        foreach (var cells in Rows())
        {
            if (!planes.TryGetValue(cells[0], out var plane))
            {
                planes[cells[0]] = plane = Plane(cells[0]);
            }

            var (lon, lat) = (Number(cells[1]), Number(cells[2]));
            var point = plane.Project(new LonLat(lon, lat));
            worstForward = Math.Max(worstForward, Math.Max(Math.Abs(point.X - Number(cells[3])), Math.Abs(point.Y - Number(cells[4]))));
            var back = plane.Unproject(point);
            var east = Math.Abs(back.Lon - lon) % 360;
            east = Math.Min(east, 360 - east) * Math.Cos(lat * Math.PI / 180);
            worstBack = Math.Max(worstBack, MetresPerDegree * Math.Max(east, Math.Abs(back.Lat - lat)));
            rows++;
        }

        Assert.Equal(100_000, rows);
        Assert.Equal(20, planes.Count);

        // The table has four decimals: half a unit of the last is its own rounding.
        Assert.InRange(worstForward, 0, 1e-3);
        Assert.InRange(worstBack, 0, 1e-3);
    }

    private static EqualAreaProjection Plane(string name)
    {
        var parts = name.Split(':');
        var centre = new LonLat(Number(parts[1]), Number(parts[2]));
        return parts[0] == "laea" ? new AzimuthalEqualArea(centre) : new ConicEqualArea(centre, Number(parts[3]), Number(parts[4]));
    }

    private static IEnumerable<string[]> Rows()
    {
        using var file = File.OpenRead(ReferenceData.Path("projections", "projections.tsv.gz"));
        using var text = new StreamReader(new GZipStream(file, CompressionMode.Decompress));
        while (text.ReadLine() is { } line)
        {
            yield return line.Split('\t');
        }
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
