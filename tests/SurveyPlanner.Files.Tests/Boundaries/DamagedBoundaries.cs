using System.Collections.Immutable;
using CsCheck;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>Files cut short or with bytes changed: refused, or read whole; never a crash, and never fewer parts in silence.</summary>
public sealed class DamagedBoundaries
{
    public static TheoryData<string> Samples =>
    [
        "dirty/crs_legacy_urn_3338.geojson", "dirty/geom_null_and_good.geojson", "dirty/geom_overlapping_strata.geojson", "dirty/file_utf16le_bom.geojson",
        "dirty/geom_bowtie.geojson", "dirty/geom_hole_outside_shell.geojson", "dirty/kmz_iceland.kmz", "dirty/shp_esri_albers_maine.zip", "dirty/shp_latin1_with_cpg.zip",
        "dirty/shp_no_shx.zip", "dirty/shp_utf8_with_cpg_long_fields.zip", "dirty/file_zip_path_traversal.zip", "dirty/gpkg_epsg3035_archipelago.gpkg",
        "strata_maine_counties.geojson", "marine_archipelago_sea.geojson", "antimeridian_fiji.geojson", "inland_county_polygon.geojson",
    ];

    [Theory]
    [MemberData(nameof(Samples))]
    public void A_file_cut_anywhere_is_refused_or_read_whole(string sample)
    {
        var bytes = File.ReadAllBytes(ReferenceFiles.Region(sample));
        var whole = Read(bytes, sample) is { } boundary ? Shape(boundary) : null;

        // Every byte of small files and of the last stretch of larger ones, every 211th of the rest.
        var step = bytes.Length < 3000 ? 1 : sample.EndsWith(".gpkg", StringComparison.Ordinal) ? 1024 : 211;
        var cuts = Enumerable.Range(0, bytes.Length).Where(cut => cut % step == 0 || cut > bytes.Length - Math.Min(step, 300));
        foreach (var cut in cuts)
        {
            if (Read(bytes[..cut], sample) is { } read)
            {
                Assert.True(whole is not null && whole == Shape(read), $"{sample} cut at byte {cut} of {bytes.Length} was read as something else");
            }
        }
    }

    [Fact]
    public void A_shapefile_whose_files_are_cut_anywhere_is_refused_or_read_whole()
    {
        var path = ReferenceFiles.Dirty("shp_esri_albers_maine.zip");
        using var members = new ZipMembers(File.ReadAllBytes(path), "maine.zip");
        var parts = ShapefileParts.From("shp_esri_albers_maine.shp", members.Names, members.Read);
        var whole = Shape(Read(parts)!);
        for (var cut = 0; cut < parts.Shp.Length; cut += cut % 500 < 20 ? 1 : 37)
        {
            Check(true, parts with { Shp = parts.Shp[..cut] }, $".shp at {cut}");
            Check(cut < parts.Dbf!.Length, parts with { Dbf = parts.Dbf[..Math.Min(cut, parts.Dbf.Length)] }, $".dbf at {cut}");
            Check(cut < parts.Shx!.Length, parts with { Shx = parts.Shx[..Math.Min(cut, parts.Shx.Length)] }, $".shx at {cut}");
            Check(cut < parts.Prj!.Length, parts with { Prj = parts.Prj[..Math.Min(cut, parts.Prj.Length)] }, $".prj at {cut}");
        }

        void Check(bool isCut, ShapefileParts damaged, string what) => Assert.True(!isCut || Read(damaged) is not { } read || Shape(read) == whole, $"cut {what} was read as something else");
    }

    [Fact]
    public void A_shapefile_cut_between_records_with_its_length_mended_is_still_found_out_by_its_other_files()
    {
        using var members = new ZipMembers(File.ReadAllBytes(ReferenceFiles.Dirty("shp_esri_albers_maine.zip")), "maine.zip");
        var parts = ShapefileParts.From("shp_esri_albers_maine.shp", members.Names, members.Read);
        var end = 100 + 8 + (2 * System.Buffers.Binary.BinaryPrimitives.ReadInt32BigEndian(parts.Shp.AsSpan(104)));
        var shp = parts.Shp[..end];
        System.Buffers.Binary.BinaryPrimitives.WriteInt32BigEndian(shp.AsSpan(24), end / 2);

        var error = Assert.Throws<InputException>(() => Read(parts with { Shp = shp, Shx = null }, rethrow: true));

        Assert.Contains("the .shp holds 1 shapes but the .dbf 16 rows", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_list_of_vertices_cut_anywhere_tells_how_many_it_had_and_how_far_it_was_from_closing()
    {
        var bytes = File.ReadAllBytes(ReferenceFiles.Dirty("csv_boundary_dd.csv"));
        for (var cut = 0; cut < bytes.Length - 3; cut++)
        {
            if (Read(bytes[..cut], "cut.csv") is { } read)
            {
                var told = string.Join("\n", read.Notices.Select(notice => notice.Message));
                Assert.Contains(" vertices in 1 outline", told, StringComparison.Ordinal);
                Assert.True(told.Contains("closed by a straight edge", StringComparison.Ordinal), $"cut at {cut}");
            }
        }
    }

    [Theory]
    [InlineData("dirty/crs_legacy_urn_3338.geojson", 2000)]
    [InlineData("dirty/csv_boundary_dd.csv", 2000)]
    [InlineData("dirty/geom_overlapping_strata.geojson", 2000)]
    [InlineData("dirty/file_kml_entity_bomb_small.kml", 500)]
    [InlineData("dirty/kmz_iceland.kmz", 300)]
    [InlineData("dirty/shp_latin1_with_cpg.zip", 1000)]
    [InlineData("dirty/gpkg_epsg3035_archipelago.gpkg", 60)]
    public void A_file_with_changed_bytes_never_fails_in_another_way_than_by_a_sentence(string sample, int times)
    {
        var bytes = File.ReadAllBytes(ReferenceFiles.Region(sample));
        Damage(bytes.Length).Hold(times, seed: 1, damage => Read(damage.Apply(bytes), sample));
    }

    [Fact]
    public void A_shapefile_with_changed_bytes_never_fails_in_another_way_than_by_a_sentence()
    {
        using var members = new ZipMembers(File.ReadAllBytes(ReferenceFiles.Dirty("shp_latin1_with_cpg.zip")), "latin.zip");
        var parts = ShapefileParts.From("shp_latin1_with_cpg.shp", members.Names, members.Read);
        Gen.Select(Damage(parts.Shp.Length), Damage(parts.Dbf!.Length), Damage(parts.Prj!.Length), Gen.Int[0, 3]).Hold(
            3000,
            seed: 1,
            damage =>
            {
                var (shp, dbf, prj, which) = damage;
                Read(parts with
                {
                    Shp = which == 0 ? shp.Apply(parts.Shp) : parts.Shp,
                    Dbf = which == 1 ? dbf.Apply(parts.Dbf) : parts.Dbf,
                    Prj = which == 2 ? prj.Apply(parts.Prj) : parts.Prj,
                });
            });
    }

    [Fact]
    public void KML_with_changed_bytes_never_fails_in_another_way_than_by_a_sentence()
    {
        using var members = new ZipMembers(File.ReadAllBytes(ReferenceFiles.Dirty("kmz_iceland.kmz")), "iceland.kmz");
        var bytes = members.Read("doc.kml")[..2000].Concat("</coordinates></LinearRing></outerBoundaryIs></Polygon></Placemark></Folder></Document></kml>"u8.ToArray()).ToArray();
        Damage(bytes.Length).Hold(2000, seed: 1, damage => Read(damage.Apply(bytes), "x.kml"));
    }

    private sealed record Change(int At, byte Value, int Kind)
    {
        public byte[] Apply(byte[] bytes) => Kind switch
        {
            0 => [.. bytes[..At], Value, .. bytes[(At + 1)..]],
            1 => [.. bytes[..At], .. bytes[(At + 1)..]],
            2 => [.. bytes[..At], Value, .. bytes[At..]],
            3 => bytes[..At],
            _ => [.. bytes[..At], .. bytes[(At / 2)..]],
        };
    }

    private sealed record Changes(ImmutableArray<Change> All)
    {
        public byte[] Apply(byte[] bytes) => All.Aggregate(bytes, (damaged, change) => damaged.Length == 0 ? damaged : (change with { At = change.At % damaged.Length }).Apply(damaged));
    }

    private static Gen<Changes> Damage(int length)
        => Gen.Select(Gen.Int[0, length - 1], Gen.Byte, Gen.Int[0, 9], (at, value, kind) => new Change(at, value, kind > 4 ? 0 : kind)).Array[1, 4].Select(all => new Changes([.. all]));

    /// <summary>The boundary, or null when it is refused in a sentence. Any other exception is a failure of the test.</summary>
    private static Boundary? Read(byte[] bytes, string name)
    {
        try
        {
            return BoundaryReader.Read(bytes, ReferenceFiles.Region(name), Path.GetFileName(name), BoundaryOptions.Default, new InputFiles());
        }
        catch (InputException)
        {
            return null;
        }
    }

    private static Boundary? Read(ShapefileParts parts, bool rethrow = false)
    {
        try
        {
            var log = new RepairLog();
            return BoundaryAssembly.Assemble(ShapefileBoundary.Read(parts, "damaged.shp", log), "damaged.shp", BoundaryOptions.Default, log);
        }
        catch (InputException) when (!rethrow)
        {
            return null;
        }
    }

    private static string Shape(Boundary boundary)
        => string.Join(";", boundary.Features.Select(feature => $"{feature.Polygons.Length}:{string.Join(",", feature.Polygons.Select(polygon => $"{polygon.Shell.Length}/{polygon.Holes.Length}"))}"))
            + AreaOf.SquareKilometres(boundary).ToString("F3", System.Globalization.CultureInfo.InvariantCulture);
}
