using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>The datum of a well-known text: by its own shift, else by its name, else by an ellipsoid that leaves no doubt.</summary>
internal static class WktDatum
{
    // What names say that programs write when they do not know the datum.
    private static readonly string[] Unknown = ["unknown", "unnamed", "not_specified", "not specified", "undefined", "custom"];

    public static Datum Of(WktNode node, Ellipsoid ellipsoid, double primeMeridian)
    {
        var known = Register.FindDatum(node.Name);
        if (known is not null && !SameSize(known.Ellipsoid, ellipsoid))
        {
            throw new FormatException($"its datum is {known.Name}, but its SPHEROID is another one");
        }

        if (known?.IsWgs84 == true)
        {
            return known with { PrimeMeridian = primeMeridian };
        }

        if (node.Find("TOWGS84") is { } shift)
        {
            return Shifted(node.Name, shift.Numbers, ellipsoid, primeMeridian);
        }

        if (known is not null)
        {
            return known with { PrimeMeridian = primeMeridian };
        }

        if (SameSize(ellipsoid, Ellipsoid.Wgs84) && Unknown.Any(word => Spells(node.Name, word)))
        {
            return new Datum("a datum without a name, on an ellipsoid like that of WGS 84,", ellipsoid, primeMeridian, [], IsWgs84: false);
        }

        throw new FormatException($"the datum {Boundaries.Wording.Quote(node.Name)} is not known here, and it gives no shift to WGS 84");
    }

    private static Datum Shifted(string name, IReadOnlyList<double> values, Ellipsoid ellipsoid, double primeMeridian)
    {
        if (values.Count is not (3 or 7))
        {
            throw new FormatException("its TOWGS84 has neither three nor seven numbers");
        }

        var v = values.Concat(Enumerable.Repeat(0.0, 4)).ToArray();
        if (v.Take(3).Any(metres => Math.Abs(metres) > 2000) || v.Skip(3).Take(4).Any(small => Math.Abs(small) > 100))
        {
            throw new FormatException("its TOWGS84 is impossibly large");
        }

        var shift = new HelmertShift("by the file's own TOWGS84", v[0], v[1], v[2], v[3], v[4], v[5], v[6], AccuracyMetres: 5);
        var isNone = v.Take(7).All(value => value == 0);
        return new Datum(name.Replace('_', ' '), ellipsoid, primeMeridian, isNone && SameSize(ellipsoid, Ellipsoid.Wgs84) ? [] : [shift], IsWgs84: false);
    }

    /// <summary>GRS 80 and WGS 84 count as the same: they differ by a tenth of a millimetre.</summary>
    private static bool SameSize(Ellipsoid a, Ellipsoid b)
        => Math.Abs(a.SemiMajorMetres - b.SemiMajorMetres) < 0.5 && Math.Abs(a.SemiMinorMetres - b.SemiMinorMetres) < 0.5;

    private static bool Spells(string name, string word) => name.Contains(word, StringComparison.OrdinalIgnoreCase);
}
