namespace SurveyPlanner.Regions;

/// <summary>
/// Equal-area geometry of an ellipsoid of revolution: the authalic latitude and what follows from it.
/// Angles in radians. Accuracy: authalic latitude forward and back to 1e-15 rad (1e-8 m), tested by round trip and against PROJ.
/// Source: Snyder 1987, Map Projections: A Working Manual, USGS Professional Paper 1395, p. 16 (definition);
/// the series is fitted here to the definition instead of copied.
/// </summary>
public sealed class Ellipsoid
{
    /// <summary>The ellipsoid of WGS 84.</summary>
    public static readonly Ellipsoid Wgs84 = new("WGS 84", 6378137.0, 298.257223563);

    // The coefficients fall by a factor of 600 each: eight leave nothing above 1e-20.
    private const int SeriesTerms = 8;

    private readonly double[] _authalicSeries = new double[SeriesTerms];
    private readonly double _e;

    /// <param name="name">Name for WKT.</param>
    /// <param name="semiMajorMetres">Equatorial radius.</param>
    /// <param name="inverseFlattening">1/f; 0 means a sphere.</param>
    public Ellipsoid(string name, double semiMajorMetres, double inverseFlattening)
    {
        Name = name;
        SemiMajorMetres = semiMajorMetres;
        InverseFlattening = inverseFlattening;
        var flattening = inverseFlattening == 0 ? 0 : 1 / inverseFlattening;
        SemiMinorMetres = semiMajorMetres * (1 - flattening);
        EccentricitySquared = flattening * (2 - flattening);
        _e = Math.Sqrt(EccentricitySquared);
        QPole = Q(1);
        AuthalicRadiusMetres = semiMajorMetres * Math.Sqrt(QPole / 2);
        FitSeries();
    }

    public string Name { get; }

    public double SemiMajorMetres { get; }

    public double SemiMinorMetres { get; }

    public double InverseFlattening { get; }

    public double EccentricitySquared { get; }

    /// <summary>Radius of the sphere with the same surface.</summary>
    public double AuthalicRadiusMetres { get; }

    /// <summary>Snyder's q at the pole.</summary>
    public double QPole { get; }

    /// <summary>Snyder's q (3-12): twice the area between the equator and a latitude, per radian of longitude and squared semi-axis.</summary>
    public double Q(double sinLatitude)
    {
        if (_e == 0)
        {
            return 2 * sinLatitude;
        }

        var es = _e * sinLatitude;
        return (1 - EccentricitySquared) * ((sinLatitude / (1 - (es * es))) + (Math.Atanh(es) / _e));
    }

    /// <summary>Radius of the parallel divided by the semi-major axis (Snyder's m, 14-15).</summary>
    public double ParallelRadius(double latitude)
    {
        var sin = Math.Sin(latitude);
        return Math.Cos(latitude) / Math.Sqrt(1 - (EccentricitySquared * sin * sin));
    }

    /// <summary>Geodetic to authalic latitude.</summary>
    public double Authalic(double latitude) => latitude + Series(latitude);

    /// <summary>Authalic to geodetic latitude.</summary>
    public double FromAuthalic(double authalic)
    {
        // authalic = latitude + Series(latitude), and the series' slope is below e²: each round gains two digits or more.
        var latitude = authalic;
        for (var round = 0; round < 12; round++)
        {
            var next = authalic - Series(latitude);
            if (next == latitude)
            {
                break;
            }

            latitude = next;
        }

        return latitude;
    }

    private double Series(double latitude)
    {
        // Clenshaw's recurrence for a sine series in 2·latitude.
        var twoCos = 2 * Math.Cos(2 * latitude);
        double b1 = 0, b2 = 0;
        for (var k = SeriesTerms - 1; k >= 0; k--)
        {
            (b1, b2) = ((twoCos * b1) - b2 + _authalicSeries[k], b1);
        }

        return b1 * Math.Sin(2 * latitude);
    }

    /// <summary>Discrete sine transform of (authalic − geodetic latitude), which is odd and smooth round the whole meridian.</summary>
    private void FitSeries()
    {
        if (_e == 0)
        {
            return;
        }

        const int samples = 32;
        for (var j = 0; j < samples; j++)
        {
            var latitude = (j + 0.5) * Math.PI / (2 * samples);
            var q = Q(Math.Sin(latitude));
            var difference = Math.Atan2(q, Math.Sqrt((QPole - q) * (QPole + q))) - latitude;
            for (var k = 0; k < SeriesTerms; k++)
            {
                _authalicSeries[k] += 2.0 / samples * difference * Math.Sin(2 * (k + 1) * latitude);
            }
        }
    }
}
