using System.Globalization;
using SurveyPlanner.Files.CoordinateSystems;
using SurveyPlanner.Files.Tests.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.CoordinateSystems;

/// <summary>
/// Texts of coordinate systems as GDAL and ESRI write them (reference-data/coordinate-systems/wkt.tsv, made by make-wkt.py beside it) against
/// the same systems by code, which are held against PROJ elsewhere.
/// </summary>
public class WellKnownText
{
    /// <summary>Systems whose projection or datum is not read; each must be refused with a reason.</summary>
    private static readonly string[] NotRead = ["5514", "27200"];

    [Fact]
    public void Texts_of_both_dialects_mean_the_same_as_their_codes()
    {
        var points = File.ReadLines(ReferenceFiles.CoordinateSystems("points.tsv")).Skip(1).Select(line => line.Split('\t')).ToLookup(cells => cells[0]);
        var wrong = new List<string>();
        var read = 0;
        foreach (var row in File.ReadLines(ReferenceFiles.CoordinateSystems("wkt.tsv")).Skip(1))
        {
            var cells = row.Split('\t');
            try
            {
                if (NotRead.Contains(cells[0]))
                {
                    Assert.Throws<FormatException>(() => WktSystem.Parse(cells[2]));
                    continue;
                }

                var system = WktSystem.Parse(cells[2]);
                read++;

                // 3650 is on a datum whose systems we know by text only: the same zone on NAD83 is the same but for the datum's name.
                var code = cells[0] == "3650" ? "EPSG:2271" : cells[0].Contains(':', StringComparison.Ordinal) ? cells[0] : "EPSG:" + cells[0];
                var byCode = SystemNames.Find(code)!;
                foreach (var point in points[cells[0]].DefaultIfEmpty(["", "", "", "2.5", "48"]))
                {
                    var (x, y) = (Number(point[3]), Number(point[4]));
                    var metres = Apart(system.ToWgs84(x, y), byCode.ToWgs84(x, y));
                    if (!(metres < 0.001) && double.IsFinite(byCode.ToWgs84(x, y).Lon))
                    {
                        wrong.Add($"{cells[0]} {cells[1]}: {metres} m apart at {x} {y}: {cells[2]}");
                        break;
                    }
                }
            }
            catch (FormatException error)
            {
                wrong.Add($"{cells[0]} {cells[1]}: {error.Message}: {cells[2]}");
            }
        }

        Assert.True(wrong.Count == 0, $"{wrong.Count} wrong:\n{string.Join("\n", wrong)}");
        Assert.True(read > 120, $"{read}");
    }

    private static double Apart(LonLat a, LonLat b)
    {
        var east = Math.IEEERemainder(a.Lon - b.Lon, 360) * Math.Cos(a.Lat * Math.PI / 180);
        return Math.Sqrt((east * east) + ((a.Lat - b.Lat) * (a.Lat - b.Lat))) * 111_195;
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
