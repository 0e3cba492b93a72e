using System.Globalization;
using SurveyPlanner.Files.CoordinateSystems;
using SurveyPlanner.Files.Tests.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.CoordinateSystems;

/// <summary>Datum shifts against PROJ 9.1.1: reference-data/coordinate-systems/shifts.tsv, made by make-shifts.py beside it.</summary>
public class DatumShifts
{
    public static TheoryData<string, string, double, double, double, double> Rows
    {
        get
        {
            var data = new TheoryData<string, string, double, double, double, double>();
            foreach (var cells in File.ReadLines(ReferenceFiles.CoordinateSystems("shifts.tsv")).Skip(1).Select(line => line.Split('\t')))
            {
                var v = cells.Skip(2).Select(cell => double.Parse(cell, CultureInfo.InvariantCulture)).ToArray();
                data.Add(cells[0], cells[1], v[0], v[1], v[2], v[3]);
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Rows))]
    public void A_position_on_an_old_datum_comes_to_WGS_84_where_PROJ_brings_it(string kind, string code, double x, double y, double lon, double lat)
    {
        var found = kind == "epsg" ? SystemNames.Find(code)!.ToWgs84(x, y) : Register.FindDatumByCode(code)!.ToWgs84(x - Register.FindDatumByCode(code)!.PrimeMeridian, y);

        // By its own choice PROJ may take another operation than we do; for ED50 one for Spain alone, where ours is the mean of Europe.
        var tolerance = kind != "epsg" ? 0.001 : code == "EPSG:23030" ? 10 : 1;
        Assert.InRange(Apart(found, new LonLat(lon, lat)), 0, tolerance);
    }

    [Fact]
    public void An_old_datum_far_from_its_country_is_refused_because_its_shift_means_nothing_there()
        => Assert.True(double.IsNaN(Register.FindDatum("OSGB_1936")!.ToWgs84(25, 60).Lon));

    private static double Apart(LonLat a, LonLat b)
    {
        var east = Math.IEEERemainder(a.Lon - b.Lon, 360) * Math.Cos(a.Lat * Math.PI / 180);
        return Math.Sqrt((east * east) + ((a.Lat - b.Lat) * (a.Lat - b.Lat))) * 111_195;
    }
}
