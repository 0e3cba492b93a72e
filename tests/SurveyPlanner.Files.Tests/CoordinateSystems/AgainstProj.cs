using System.Globalization;
using SurveyPlanner.Files.CoordinateSystems;
using SurveyPlanner.Files.Tests.Boundaries;

namespace SurveyPlanner.Files.Tests.CoordinateSystems;

/// <summary>
/// Every plane system of our table against PROJ 9.1.1: reference-data/coordinate-systems/points.tsv, made by make-points.py beside it.
/// </summary>
public class AgainstProj
{
    private const double MetresPerDegree = 111_320;

    [Fact]
    public void Every_plane_system_comes_back_to_where_PROJ_came_from_within_a_millimetre()
    {
        var systems = new Dictionary<string, PlaneSystem>();
        var (worst, worstRow) = (0.0, "");
        var wrong = new List<string>();
        foreach (var row in File.ReadLines(ReferenceFiles.CoordinateSystems("points.tsv")).Skip(1))
        {
            var cells = row.Split('\t');
            if (!systems.TryGetValue(cells[0], out var system))
            {
                system = Assert.IsType<PlaneSystem>(Register.Find(cells[0]));
                systems.Add(cells[0], system);
            }

            var v = cells.Skip(1).Select(cell => double.Parse(cell, CultureInfo.InvariantCulture)).ToArray();
            var (lon, lat) = system.ToOwnDatum(v[2], v[3]);
            var east = Math.IEEERemainder(lon - v[0], 360) * Math.Cos(v[1] * Math.PI / 180);
            var metres = Math.Sqrt((east * east) + ((lat - v[1]) * (lat - v[1]))) * MetresPerDegree;
            if (!(metres < 0.001))
            {
                wrong.Add($"{row}: {lon} {lat}, {metres:g3} m");
            }

            if (metres > worst)
            {
                (worst, worstRow) = (metres, row);
            }
        }

        Assert.True(wrong.Count == 0, $"{wrong.Count} wrong:\n" + string.Join("\n", wrong.Take(40)));
        TestContext.Current.TestOutputHelper?.WriteLine($"{systems.Count} systems, worst {worst:g3} m: {worstRow}");
        Assert.True(systems.Count > 2700);
    }
}
