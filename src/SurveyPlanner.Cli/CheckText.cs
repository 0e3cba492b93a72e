using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Cli;

/// <summary>What was understood of a plan and its boundary.</summary>
internal static class CheckText
{
    public static void Write(TextWriter output, SurveyPlan plan)
    {
        var region = plan.Region;
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"The plan can be carried out: {region.Strata.Length} {(region.Strata.Length == 1 ? "stratum" : "strata")}, {region.AreaKm2:#,0.###} km² ({100 * region.AreaKm2:#,0} ha)."));
        output.WriteLine();
        output.WriteLine($"place        {Extent(region)}");
        output.WriteLine($"coordinates  {region.CoordinateSystem}");
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"plane        {region.Projection.Method}, centred on {Position(region.Projection.Centre)}"));
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"             lengths off by {AtMost(region.MaxScaleErrorPercent)} %; grid north off true north by at most {region.MaxConvergenceDegrees:0.##}°"));
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"area         {region.AreaKm2:#,0.######} km² in the plane, {region.GeodesicAreaKm2:#,0.######} km² on the ellipsoid"));
        if (region.Strata.Any(stratum => !stratum.Closed.IsEmpty))
        {
            output.WriteLine($"closed       {Closed(region)}");
        }

        output.WriteLine();
        WriteStrata(output, region);
    }

    private static void WriteStrata(TextWriter output, Region region)
    {
        var table = new TextTable("stratum", "km²", "ha", "parts", "holes", "vertices", "long km", "short km", "long axis °");
        foreach (var stratum in region.Strata)
        {
            table.Add(
                stratum.Name,
                stratum.AreaKm2.ToString("#,0.###", CultureInfo.InvariantCulture),
                (100 * stratum.AreaKm2).ToString("#,0", CultureInfo.InvariantCulture),
                TextTable.Number(stratum.Shape.PartCount),
                TextTable.Number(stratum.Shape.HoleCount),
                TextTable.Number(stratum.OutlineVertices),
                TextTable.Figure(stratum.LongAxisKm),
                TextTable.Figure(stratum.ShortAxisKm),
                TextTable.Bearing(stratum.LongAxisBearing, 180));
        }

        table.Write(output);
    }

    /// <summary>What closed areas took from which stratum.</summary>
    private static string Closed(Region region)
    {
        var parts = region.Strata
            .Where(stratum => stratum.ClosedKm2 > 0)
            .Select(stratum => $"{stratum.ClosedKm2.ToString("#,0.###", CultureInfo.InvariantCulture)} km² out of {new string([.. stratum.Name.Where(c => !char.IsControl(c))])}")
            .DefaultIfEmpty("nothing");
        var buffer = region.ExclusionBufferMetres > 0 ? FormattableString.Invariant($", {region.ExclusionBufferMetres:0.###} m kept from them included") : "";
        return string.Join(", ", parts) + buffer;
    }

    private static string Extent(Region region)
    {
        var extent = region.Extent;
        return $"{Minutes(extent.South, 'N', 'S')} to {Minutes(extent.North, 'N', 'S')}, {Minutes(extent.West, 'E', 'W')} to {Minutes(extent.East, 'E', 'W')}";
    }

    private static string AtMost(double percent)
        => percent < 0.001 ? "less than 0.001" : string.Create(CultureInfo.InvariantCulture, $"at most {percent:0.###}");

    private static string Position(LonLat position) => $"{Minutes(position.Lat, 'N', 'S')} {Minutes(position.Lon, 'E', 'W')}";

    /// <summary>Degrees and whole minutes, as on a chart.</summary>
    private static string Minutes(double degrees, char positive, char negative)
    {
        var minutes = (int)Math.Round(Math.Abs(degrees) * 60);
        return string.Create(CultureInfo.InvariantCulture, $"{minutes / 60}°{minutes % 60:00}′{(degrees < 0 ? negative : positive)}");
    }
}
