using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>Names of projections and parameters in well-known text, as the standard and the makers of programs write them.</summary>
internal static class WktProjection
{
    public static ProjectionParameters Of(WktNode system, double degreesPerUnit, double metresPerUnit)
    {
        var name = system.Find("PROJECTION")?.Name ?? throw new FormatException("the projected system has no PROJECTION");
        var values = new Values(system, degreesPerUnit, metresPerUnit);
        var parameters = Named(Plain(name), name, system, values);
        values.DemandAllUsed();
        return parameters with { FalseEastingMetres = values.FalseEasting, FalseNorthingMetres = values.FalseNorthing };
    }

    private static ProjectionParameters Named(string plain, string name, WktNode system, Values values) => plain switch
    {
        "transversemercator" or "gausskruger" or "transversemercatorcomplex" => values.All("transverse-mercator"),
        "albers" or "albersconicequalarea" or "albersequalarea" or "albersequalareaconic" => values.All("albers"),
        "lambertazimuthalequalarea" => values.All("azimuthal-equal-area"),
        "lambertconformalconic" or "lambertconformalconic1sp" or "lambertconformalconic2sp" => values.All("lambert-conformal-conic"),
        "mercator1sp" or "mercator2sp" or "mercator" or "mercatorauxiliarysphere" or "popularvisualisationpseudomercator" => Mercator(plain, system, values),
        "cylindricalequalarea" or "lambertcylindricalequalarea" => values.All("cylindrical-equal-area"),
        "behrmann" when values.All("cylindrical-equal-area") is var behrmann => behrmann with { Lat1 = behrmann.Lat1 ?? 30 },
        "polarstereographic" or "polarstereographicvarianta" or "polarstereographicvariantb" or "stereographicnorthpole" or "stereographicsouthpole" => Polar(values),
        "obliquestereographic" or "doublestereographic" => values.All("oblique-stereographic"),
        "polyconic" or "americanpolyconic" => values.All("polyconic"),
        "hotineobliquemercator" or "hotineobliquemercatorazimuthnaturalorigin" or "rectifiedskeworthomorphicnaturalorigin" => values.All("hotine-oblique-mercator"),
        "obliquemercator" or "hotineobliquemercatorazimuthcenter" or "hotineobliquemercatorvariantb" or "rectifiedskeworthomorphiccenter"
            => values.All("oblique-mercator"),
        _ => throw new FormatException($"the projection {Wording.Quote(name)} is not known here"),
    };

    /// <summary>Web Mercator hides under several names, and under that of the real Mercator with a note at the end.</summary>
    private static ProjectionParameters Mercator(string plain, WktNode system, Values values)
    {
        var spoken = Plain(system.Name);
        var isWeb = plain is "mercatorauxiliarysphere" or "popularvisualisationpseudomercator"
            || spoken.Contains("pseudomercator", StringComparison.Ordinal) || spoken.Contains("webmercator", StringComparison.Ordinal) || spoken.Contains("googlemaps", StringComparison.Ordinal)
            || system.Nodes.Any(node => node.Keyword == "EXTENSION" && node.Texts.Any(text => text.Contains("+b=6378137", StringComparison.Ordinal)))
            || (system.Find("AUTHORITY")?.Texts.ElementAtOrDefault(1) is "3857" or "3785" or "900913" or "102100" or "102113");
        if (isWeb)
        {
            values.DemandZero("auxiliaryspheretype");
            var web = values.All("pseudo-mercator");
            return web.Lat1 is null or 0 && web.Lat0 is null or 0 && web.Scale is null or 1
                ? web with { Lat1 = null }
                : throw new FormatException("it calls itself web Mercator but has parameters that this has not");
        }

        var mercator = values.All("mercator");

        // One maker writes the parallel of true scale as latitude of origin, another means a shift of the origin: only 0 is clear.
        return mercator.Lat0 is null or 0 ? mercator : throw new FormatException("it is a Mercator projection with a latitude of origin, which programs read in different ways");
    }

    private static ProjectionParameters Polar(Values values)
    {
        // The standard writes the parallel of true scale as latitude of origin, and a pole with a scale factor for the other variant.
        var all = values.All("polar-stereographic");
        var parallel = all.Lat1 ?? (all.Lat0 is { } origin && Math.Abs(origin) < 89.999 ? origin : null);
        if (parallel is null)
        {
            return all;
        }

        return all.Scale is null or 1
            ? all with { Lat1 = parallel, Scale = null }
            : throw new FormatException("it is a polar stereographic projection with both a standard parallel and a scale factor");
    }

    private static string Plain(string name) => string.Concat(name.Where(char.IsLetterOrDigit)).ToLowerInvariant();

    private sealed class Values(WktNode system, double degreesPerUnit, double metresPerUnit)
    {
        private readonly Dictionary<string, double> _left = Read(system);

        public double FalseEasting => Take("falseeasting") * metresPerUnit ?? 0;

        public double FalseNorthing => Take("falsenorthing") * metresPerUnit ?? 0;

        public ProjectionParameters All(string method) => new(method)
        {
            Lat0 = Angle("latitudeoforigin", "latitudeofcenter", "latitudeofcentre", "latitudeofnaturalorigin", "latitudeoffalseorigin", "centralparallel"),
            Lon0 = Angle("centralmeridian", "longitudeoforigin", "longitudeofcenter", "longitudeofcentre", "longitudeofnaturalorigin", "longitudeoffalseorigin", "straightverticallongitudefrompole"),
            Lat1 = Angle("standardparallel1", "standardparallel", "latitudeofstandardparallel", "latitudeof1ststandardparallel"),
            Lat2 = Angle("standardparallel2", "latitudeof2ndstandardparallel"),
            Scale = Take("scalefactor", "scalefactoratnaturalorigin"),
            Azimuth = Angle("azimuth"),
            Gamma = Angle("rectifiedgridangle", "xyplanerotation"),
        };

        public void DemandZero(string name)
        {
            if (Take(name) is { } value and not 0)
            {
                throw new FormatException($"its parameter {name} is {Wording.Number(value)}, which is not known here");
            }
        }

        public void DemandAllUsed()
        {
            // The false origin is taken after this; everything else must have been understood, unless it says nothing.
            var odd = _left.FirstOrDefault(pair => pair.Value != 0 && pair.Key is not ("falseeasting" or "falsenorthing"));
            if (odd.Key is not null)
            {
                throw new FormatException($"its parameter {Wording.Quote(odd.Key)} is not known here");
            }
        }

        private double? Angle(params string[] names) => Take(names) * degreesPerUnit;

        private double? Take(params string[] names)
        {
            double? found = null;
            foreach (var name in names)
            {
                if (_left.Remove(name, out var value))
                {
                    found = found is null || found == value ? value : throw new FormatException($"its parameters give {name} twice");
                }
            }

            return found;
        }

        private static Dictionary<string, double> Read(WktNode system)
        {
            var values = new Dictionary<string, double>();
            foreach (var node in system.Nodes.Where(node => node.Keyword == "PARAMETER"))
            {
                if (node.Numbers.Count != 1 || !values.TryAdd(Plain(node.Name), node.Numbers[0]))
                {
                    throw new FormatException($"its parameter {Wording.Quote(node.Name)} has no number, or stands twice");
                }
            }

            return values;
        }
    }
}
