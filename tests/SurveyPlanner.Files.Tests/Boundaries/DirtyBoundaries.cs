using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>
/// Boundaries as agencies send them: every file of reference-data/regions/dirty against its row in EXPECTED.tsv there, where the figures
/// come from GDAL, GeographicLib and the sources named in the README beside it.
/// </summary>
public class DirtyBoundaries
{
    /// <summary>Files to read, with the area that must come out (square kilometres, to its digits) and words that must be told.</summary>
    public static TheoryData<string, double, string> Accepted => new()
    {
        // 18935.933 is the figure for coordinates rounded to six decimals; with the digits that this file has it is 0.0023 more.
        { "coord_antimeridian_uncut_fiji.geojson", 18935.9358, "cross 180°" },
        { "crs_legacy_crs84.geojson", 32792.055, "crs member" },
        { "crs_legacy_short_3338.geojson", 32784.583, "EPSG:3338" },
        { "crs_legacy_urn_3338.geojson", 32784.583, "EPSG:3338" },
        { "csv_boundary_dd.csv", 32792.055, "list of vertices" },
        { "csv_boundary_semicolon_decimal_comma.csv", 32792.055, "decimal marks" },
        { "file_utf16le_bom.geojson", 32792.055, "UTF-16" },
        { "geom_duplicate_feature.geojson", 32792.055, "feature 2 repeats feature 1" },
        { "geom_null_and_good.geojson", 32792.055, "feature 1" },
        { "geom_wrong_winding.geojson", 1219495.134, "" },
        { "gpkg_epsg3035_archipelago.gpkg", 21355.783, "" },
        { "kmz_iceland.kmz", 102356.769, "" },
        { "shp_esri_albers_maine.zip", 85718.529, "" },
        { "shp_latin1_with_cpg.zip", 32792.055, "" },
        { "shp_no_shx.zip", 32792.055, "no .shx" },
        { "shp_utf8_with_cpg_long_fields.zip", 32792.055, "" },
    };

    /// <summary>Files to refuse, with the words that tell why.</summary>
    public static TheoryData<string, string> Refused => new()
    {
        { "coord_1e400.geojson", "overflows to infinity" },
        { "coord_nan_literal.geojson", "not JSON" },
        { "coord_swapped_detectable.geojson", "swapped (lat/lon)" },
        { "crs_legacy_link.geojson", "links are never followed" },
        { "file_deep_nesting.geojson", "nested" },
        { "file_empty.geojson", "empty" },
        { "file_empty_object.geojson", "no \"type\"" },
        { "file_is_esri_json.json", "Esri JSON" },
        { "file_kml_entity_bomb_small.kml", "prohibited" },
        { "file_truncated.gpkg", "malformed" },
        { "file_zip_path_traversal.zip", "'../../evil.shp', which leads out" },
        { "file_latin1_attribute.geojson", "not UTF-8" },
        { "geom_all_null.geojson", "no polygon in the file" },
        { "geom_bowtie.geojson", "crosses itself near longitude -149, latitude 63.5" },
        { "geom_hole_outside_shell.geojson", "hole lies outside" },
        { "geom_lines_only.geojson", "turn it into a polygon" },
        { "gpkg_undefined_srs.gpkg", "srs_id -1" },
        { "shp_no_prj_degrees.zip", "EPSG:4326" },
        { "geom_selfcross_county.geojson", "crosses itself near longitude -149.102, latitude 63.617" },
    };

    [Theory]
    [MemberData(nameof(Accepted))]
    public void A_file_with_one_reading_is_read_and_what_was_done_is_told(string file, double squareKilometres, string told)
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Dirty(file));

        Assert.Equal(squareKilometres, AreaOf.SquareKilometres(boundary), 0.0006);
        Assert.Contains(told, string.Join("\n", boundary.Notices.Select(notice => notice.Message)), StringComparison.Ordinal);

        // The core makes the same of it, in its plane and on the ellipsoid.
        var region = RegionBuilder.Build(boundary, new RegionDesign(), []);
        Assert.Equal(1, region.AreaKm2 / squareKilometres, 1e-6);
        Assert.Equal(1, region.GeodesicAreaKm2 / squareKilometres, 1e-6);
    }

    [Theory]
    [MemberData(nameof(Refused))]
    public void A_file_that_leaves_a_guess_is_refused_in_a_sentence_that_names_it(string file, string words)
    {
        var error = Assert.Throws<InputException>(() => BoundaryReader.Read(ReferenceFiles.Dirty(file)));

        Assert.Contains(words, error.Message, StringComparison.Ordinal);
        Assert.All(error.Problems, problem => Assert.Equal(file, problem.File));
    }

    [Fact]
    public void Every_file_of_the_folder_has_its_row_here()
    {
        string[] elsewhere = ["coord_exponent_ok.geojson", "geom_natural_selfintersection_iceland.geojson", "geom_overlapping_strata.geojson"];
        var tested = Accepted.Select(row => row.Data.Item1).Concat(Refused.Select(row => row.Data.Item1)).Concat(elsewhere);
        var listed = File.ReadLines(ReferenceFiles.Dirty("EXPECTED.tsv")).Skip(1).Select(line => line.Split('\t')[0]);

        Assert.Equal(listed.Order(StringComparer.Ordinal), tested.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Degrees_without_a_system_are_read_once_the_user_says_which()
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Dirty("shp_no_prj_degrees.zip"), new BoundaryOptions { Crs = "EPSG:4326" });

        Assert.Equal(32792.055, AreaOf.SquareKilometres(boundary), 0.0006);
        Assert.Contains("crs in [region]", boundary.CoordinateSystem, StringComparison.Ordinal);
    }

    [Fact]
    public void A_layer_without_a_system_is_read_once_the_user_says_which()
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Dirty("gpkg_undefined_srs.gpkg"), new BoundaryOptions { Crs = "EPSG:3035" });

        Assert.Equal(21355.783, AreaOf.SquareKilometres(boundary), 0.0021);
    }

    [Fact]
    public void Attributes_keep_their_letters_in_every_encoding()
    {
        var latin = BoundaryReader.Read(ReferenceFiles.Dirty("shp_latin1_with_cpg.zip"));
        var utf8 = BoundaryReader.Read(ReferenceFiles.Dirty("shp_utf8_with_cpg_long_fields.zip"));

        Assert.Equal("Réserve de Ségur, Zürich, Ñandú", latin.Features[0].Attributes["name"]);
        Assert.Equal("Réserve de Ségur, Zürich, Ñandú", utf8.Features[0].Attributes["name"]);
        Assert.Equal(["a_very_l_1", "a_very_lon", "name"], utf8.Features[0].Attributes.Keys);
    }

    [Fact]
    public void Zero_with_a_minus_sign_loses_it()
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Dirty("coord_exponent_ok.geojson"));

        Assert.Equal([(0, 0), (1.5, 0), (1, 1), (0, 0)], boundary.Features[0].Polygons[0].Shell.Select(position => (position.Lon, position.Lat)));
        Assert.All(boundary.Features[0].Polygons[0].Shell, position => Assert.False(double.IsNegative(position.Lat)));
    }

    [Fact]
    public void A_tiny_crossing_of_a_raw_atlas_is_cut_off_and_told_with_its_place_and_all_islands_stay()
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Dirty("geom_natural_selfintersection_iceland.geojson"));

        Assert.Equal(5, boundary.Features[0].Polygons.Length);
        var repair = Assert.Single(boundary.Notices, notice => notice.Kind == NoticeKind.Repair);
        Assert.Contains("longitude -16.483, latitude 63.902", repair.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Overlapping_strata_are_refused_by_the_core_with_their_overlap()
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Dirty("geom_overlapping_strata.geojson"));
        var error = Assert.Throws<InputException>(() => RegionBuilder.Build(boundary, new RegionDesign(StratumField: "stratum"), []));

        Assert.Contains("24.61", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Overlapping_features_are_read_as_they_are_because_only_their_strata_tell_what_is_meant()
        => Assert.Equal(3, BoundaryReader.Read(ReferenceFiles.Dirty("geom_overlapping_strata.geojson")).Features.Length);
}
