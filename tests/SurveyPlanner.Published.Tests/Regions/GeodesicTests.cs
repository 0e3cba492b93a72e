using SurveyPlanner.Regions;

namespace SurveyPlanner.Published.Tests.Regions;

/// <summary>
/// Sources: the Flinders Peak to Buninyong line of the Australian geodetic datum manual and the lines of Vincenty 1975 (Survey Review 22(176)),
/// as quoted in public geodesy test suites.
/// </summary>
public class GeodesicTests
{
    private static readonly Ellipsoid Grs80 = new("GRS 1980", 6378137, 298.257222101);
    private static readonly Ellipsoid Bessel = new("Bessel 1841", 6377397.155, 299.1528128);
    private static readonly Ellipsoid International = new("International 1924", 6378388, 297);

    [Fact]
    public void Flinders_Peak_to_Buninyong()
    {
        var from = new LonLat(Dms(144, 25, 29.52440), -Dms(37, 57, 3.72030));
        var to = new LonLat(Dms(143, 55, 35.38390), -Dms(37, 39, 10.15610));
        var (metres, start, end) = Geodesic.Inverse(from, to, Grs80);
        Assert.Equal(54972.271, metres, 5e-4);
        Assert.Equal(Dms(306, 52, 5.37), start, 2e-6);
        Assert.Equal(Dms(307, 10, 25.07), end, 2e-6);
    }

    [Fact]
    public void Vincentys_own_lines()
    {
        var (metres, start, end) = Geodesic.Inverse(new LonLat(0, Dms(55, 45, 0)), new LonLat(Dms(108, 13, 0), -Dms(33, 26, 0)), Bessel);
        Assert.Equal(14110526.170, metres, 1e-3);
        Assert.Equal(Dms(96, 36, 8.79960), start, 3e-9);
        Assert.Equal(Dms(137, 52, 22.01454), end, 3e-9);

        var b = Geodesic.Inverse(
            new LonLat(0, Dms(37, 19, 54.95367)), new LonLat(Dms(41, 28, 35.50729), Dms(26, 7, 42.83946)), International);
        Assert.Equal(4085966.703, b.Metres, 1e-3);
        var c = Geodesic.Inverse(
            new LonLat(0, Dms(35, 16, 11.24862)), new LonLat(Dms(137, 47, 28.31435), Dms(67, 22, 14.77638)), International);
        Assert.Equal(8084823.839, c.Metres, 1e-3);
    }

    [Fact]
    public void A_line_of_five_metres() // GeographicLib 2.1.2
        => Assert.Equal(4.94420828, Geodesic.Inverse(new LonLat(0, -30.12345), new LonLat(0.00005, -30.12344)).Metres, 1e-6);

    private static double Dms(int degrees, int minutes, double seconds) => degrees + (minutes / 60.0) + (seconds / 3600);
}
