using System.Globalization;
using Microsoft.Data.Sqlite;
using NetTopologySuite.Geometries;
using NetTopologySuite.IO;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Files.Tests.Folders;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class SurveyGeoPackageTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private string File => _folder.At("survey.gpkg");

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void The_file_says_that_it_is_a_GeoPackage_1_3()
    {
        Write(TestPlans.TwoStrata());

        // OGC 12-128r17, requirement 2: application id "GPKG", user version 10300.
        Assert.Equal("1196444487", Rows("PRAGMA application_id").Single());
        Assert.Equal("10300", Rows("PRAGMA user_version").Single());
        Assert.Equal("ok", Rows("PRAGMA integrity_check").Single());
        Assert.Empty(Rows("PRAGMA foreign_key_check"));
        Assert.Equal(
            ["coverage|geom|MULTIPOLYGON|4326", "region|geom|MULTIPOLYGON|4326", "transects|geom|GEOMETRY|4326"],
            Rows("SELECT table_name, column_name, geometry_type_name, srs_id FROM gpkg_geometry_columns ORDER BY 1"));
    }

    [Fact]
    public void Transects_have_their_figures_and_null_where_they_do_not_apply()
    {
        Write(TestPlans.TwoStrata());

        Assert.Equal(
            ["A001|Inner bay|1|22289.4567|0|0.125", $"B001|{TestPlans.HostileName}|3|||"],
            Rows("SELECT id, stratum, \"order\", length_m, bearing_deg, round(coverage, 9) FROM transects WHERE \"order\" IN (1, 3) ORDER BY \"order\""));
        var geometries = Geometries("transects");
        Assert.Equal([1, 2, 1, 1], geometries.Select(geometry => geometry.NumGeometries));
        Assert.Equal(new Coordinate(-150.6, 63), geometries[0].Coordinates[0]);
        Assert.IsType<Point>(geometries[2]);
    }

    [Fact]
    public void Cells_are_drawn_cut_at_the_stratum_and_carry_their_coverage()
    {
        Write(TestPlans.TwoStrata());

        var cells = Geometries("coverage");
        Assert.Equal(8, cells.Count);
        Assert.All(cells, cell => Assert.True(cell.IsValid));
        Assert.Equal(["4", "4"], Rows("SELECT count(exact) FROM coverage UNION ALL SELECT count(*) FROM coverage WHERE simulated = 0.1"));

        // Cells and stratum are the same 20 km by 40 km: second method, areas on the ellipsoid by the core.
        var projection = new AzimuthalEqualArea(TestPlans.Centre);
        Assert.All(cells, cell => Assert.Equal(100, AreaKm2(cell, projection), 0.01));
    }

    [Fact]
    public void Our_own_reader_finds_the_region_again()
    {
        Write(TestPlans.TwoStrata());

        var boundary = BoundaryReader.Read(File, new BoundaryOptions { Layer = "region" });

        Assert.Equal(["Inner bay", TestPlans.HostileName], boundary.Features.Select(feature => feature.Attributes["name"]));
    }

    [Fact]
    public void A_region_across_180_is_cut_there()
    {
        Write(TestPlans.OneStratum(new LonLat(180, -18), TestPlans.Line("F1", 1, 90, TestPlans.Path(179.99, -18, -179.99, -18))));

        var region = Assert.Single(Geometries("region"));
        Assert.True(region.IsValid);
        Assert.Equal(2, region.NumGeometries);
        Assert.Equal((-180, 180), (region.EnvelopeInternal.MinX, region.EnvelopeInternal.MaxX));
        Assert.Equal(800, AreaKm2(region, new AzimuthalEqualArea(new LonLat(180, -18))), 0.1);
        Assert.Equal(["MULTILINESTRING"], Rows("SELECT geometry_type_name FROM gpkg_geometry_columns WHERE table_name = 'transects'"));
    }

    [Fact]
    public void A_region_round_a_pole_reaches_all_longitudes_and_the_pole()
    {
        Write(TestPlans.OneStratum(new LonLat(30, -90), TestPlans.Line("P1", 1, 90, TestPlans.Path(0, -89.95, 10, -89.95))));

        var region = Assert.Single(Geometries("region"));
        Assert.True(region.IsValid);
        Assert.Equal(new Envelope(-180, 180, -90, region.EnvelopeInternal.MaxY), region.EnvelopeInternal);
    }

    [Fact]
    public void The_same_plan_gives_the_same_bytes() =>
        Assert.Equal(SurveyGeoPackage.Write(TestPlans.TwoStrata()).Sha256, SurveyGeoPackage.Write(TestPlans.TwoStrata()).Sha256);

    private void Write(SurveyPlan plan) => System.IO.File.WriteAllBytes(File, SurveyGeoPackage.Write(plan).Content.ToArray());

    private List<string> Rows(string sql)
    {
        using var connection = Open();
        using var command = new SqliteCommand(sql, connection);
        using var reader = command.ExecuteReader();
        var rows = new List<string>();
        while (reader.Read())
        {
            rows.Add(string.Join('|', Enumerable.Range(0, reader.FieldCount).Select(i => Convert.ToString(reader.GetValue(i), CultureInfo.InvariantCulture))));
        }

        return rows;
    }

    private List<Geometry> Geometries(string layer)
    {
        using var connection = Open();
        using var command = new SqliteCommand($"SELECT geom FROM {layer} ORDER BY fid", connection);
        using var reader = command.ExecuteReader();
        var geometries = new List<Geometry>();
        while (reader.Read())
        {
            geometries.Add(new GeoPackageGeoReader().Read((byte[])reader.GetValue(0)));
        }

        return geometries;
    }

    private SqliteConnection Open()
    {
        var connection = new SqliteConnection($"Data Source={File};Mode=ReadOnly;Pooling=False");
        connection.Open();
        return connection;
    }

    /// <summary>Area in the equal-area plane, by the corners alone.</summary>
    private static double AreaKm2(Geometry geometry, AzimuthalEqualArea projection) =>
        Enumerable.Range(0, geometry.NumGeometries).Sum(i =>
        {
            var ring = geometry.GetGeometryN(i).Coordinates.Select(corner => projection.Project(new LonLat(corner.X, corner.Y))).ToList();
            return Math.Abs(ring.Zip(ring.Skip(1), (a, b) => (a.X * b.Y) - (b.X * a.Y)).Sum()) / 2e6;
        });
}
