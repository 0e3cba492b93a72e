using System.Collections.Immutable;
using NetTopologySuite.Geometries;
using SurveyPlanner.Coverage;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary><c>survey.gpkg</c>: a GeoPackage with the layers <c>region</c>, <c>transects</c> and <c>coverage</c>.</summary>
public static class SurveyGeoPackage
{
    private static readonly (string, string)[] RegionColumns = [("name", "TEXT"), ("area_km2", "DOUBLE")];

    private static readonly (string, string)[] TransectColumns =
    [
        ("id", "TEXT"), ("stratum", "TEXT"), ("order", "INTEGER"), ("length_m", "DOUBLE"), ("bearing_deg", "DOUBLE"), ("coverage", "DOUBLE"), ("reserve", "INTEGER"),
    ];

    private static readonly (string, string)[] CoverageColumns =
    [
        ("stratum", "TEXT"), ("area_km2", "DOUBLE"), ("exact", "DOUBLE"), ("simulated", "DOUBLE"), ("standard_error", "DOUBLE"),
    ];

    public static OutputFile Write(SurveyPlan plan)
    {
        using var file = new GeoPackageFile();
        var polygons = new LonLatPolygons(plan.Region.Projection);
        file.AddLayer("region", "Strata of the study region", "MULTIPOLYGON", RegionColumns, plan.Strata.Select(stratum => Region(stratum.Stratum, polygons)));
        var transects = DrawnTransect.All(plan, withCoverage: true);
        file.AddLayer("transects", TransectsGpx.Caution, TransectType(transects), TransectColumns, transects.Select(Row));
        if (plan.Strata.Any(stratum => stratum.Coverage is not null))
        {
            file.AddLayer(
                "coverage", "Coverage probability, cell by cell", "MULTIPOLYGON", CoverageColumns,
                plan.Strata.Where(stratum => stratum.Coverage is not null).SelectMany(stratum => Cells(stratum.Stratum, stratum.Coverage!, polygons)));
        }

        return new OutputFile(OutputNames.SurveyGeoPackage, file.ToBytes());
    }

    private static (Geometry, object?[]) Region(Stratum stratum, LonLatPolygons polygons)
    {
        var shape = stratum.Shape;
        var parts = Enumerable.Range(0, shape.PartCount).SelectMany(part => polygons.Of(
            [.. Enumerable.Range(shape.PartStarts[part], shape.PartStarts[part + 1] - shape.PartStarts[part]).Select(ring => Ring(shape, ring))]));
        return (Nts.Factory.CreateMultiPolygon([.. parts]), [PlainText.WellFormed(stratum.Name), stratum.AreaKm2]);
    }

    private static IReadOnlyList<PlanePoint> Ring(PlaneShape shape, int ring) =>
    [
        .. Enumerable.Range(shape.RingStarts[ring], shape.RingStarts[ring + 1] - shape.RingStarts[ring])
            .Select(i => new PlanePoint(shape.X[i], shape.Y[i])),
    ];

    private static IEnumerable<(Geometry, object?[])> Cells(Stratum stratum, StratumCoverage coverage, LonLatPolygons polygons)
    {
        var name = PlainText.WellFormed(stratum.Name);
        return coverage.Cells.Zip(new CellPolygons(stratum, coverage).All(), (cell, pieces) => (
            (Geometry)Nts.Factory.CreateMultiPolygon([.. pieces.SelectMany(polygons.Of)]),
            new object?[] { name, cell.AreaKm2, cell.Exact, cell.Simulated, cell.StandardError }));
    }

    private static (Geometry, object?[]) Row(DrawnTransect transect) => (
        transect.IsPoint ? Nts.Factory.CreatePoint(Coordinates(transect.Parts[0])[0]) : Nts.Factory.CreateMultiLineString(
            [.. transect.Parts.Select(part => Nts.Factory.CreateLineString(Coordinates(part)))]),
        [transect.Id, transect.Stratum, transect.Order, transect.LengthMetres, transect.BearingDegrees, transect.Coverage, transect.Reserve]);

    /// <summary>One type for the whole layer where it can be: GIS programs then know what to draw.</summary>
    private static string TransectType(IReadOnlyList<DrawnTransect> transects) =>
        transects.All(transect => !transect.IsPoint) ? "MULTILINESTRING" : transects.All(transect => transect.IsPoint) ? "POINT" : "GEOMETRY";

    private static Coordinate[] Coordinates(ImmutableArray<LonLat> part) =>
        [.. part.Select(position => new Coordinate(position.Lon, position.Lat))];
}
