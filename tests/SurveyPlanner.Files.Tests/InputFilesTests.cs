using System.IO.Compression;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Files.Plans;
using SurveyPlanner.Files.Tables;
using SurveyPlanner.Files.Tests.Boundaries;
using SurveyPlanner.Files.Tests.Folders;

namespace SurveyPlanner.Files.Tests;

/// <summary>What is parsed and what is recorded are the same bytes, whatever happens to the files meanwhile.</summary>
public sealed class InputFilesTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_file_changed_after_it_was_read_stays_what_it_was()
    {
        var path = Write("a.txt", "first");
        var files = new InputFiles();
        Assert.Equal("first"u8, files.Under("one").Bytes(path));
        Write("a.txt", "second");

        Assert.Equal("first"u8, files.Under("two").Bytes(_folder.At(".", "a.txt")));
        Assert.Equal("second"u8, new InputFiles().Bytes(path));
        Assert.Equal(["one", "two"], files.Read.Select(read => read.Key));
        Assert.All(files.Read, read => Assert.Equal("first"u8, read.Content.Span));
    }

    [Theory]
    [InlineData("dirty/gpkg_epsg3035_archipelago.gpkg")]
    [InlineData("dirty/kmz_iceland.kmz")]
    [InlineData("dirty/csv_boundary_dd.csv")]
    [InlineData("marine_archipelago_sea.geojson")]
    public void A_boundary_is_parsed_from_the_bytes_that_were_read_first(string name)
    {
        var path = _folder.At(Path.GetFileName(name));
        File.Copy(ReferenceFiles.Region(name), path);
        var files = new InputFiles();
        var before = BoundaryReader.Read(path, null, files.Under("region.boundary"));
        File.WriteAllText(path, "no longer a boundary");

        Assert.Equal(AreaOf.SquareKilometres(before), AreaOf.SquareKilometres(BoundaryReader.Read(path, null, files)));
        Assert.Equal(new FileInfo(ReferenceFiles.Region(name)).Length, Assert.Single(files.Read).Content.Length);
        Assert.Throws<InputException>(() => BoundaryReader.Read(path));
    }

    [Fact]
    public void Of_a_shapefile_the_files_that_were_read_count_and_no_namesake_does()
    {
        using (var archive = ZipFile.OpenRead(ReferenceFiles.Region("dirty/shp_esri_albers_maine.zip")))
        {
            foreach (var entry in archive.Entries.Where(entry => entry.Length > 0))
            {
                entry.ExtractToFile(_folder.At("zones" + Path.GetExtension(entry.Name)), overwrite: true);
            }
        }

        Write("zones.toml", "a plan of the same name");
        Write("zones.txt", "notes");
        var files = new InputFiles();
        _ = BoundarySet.Read([_folder.At("zones.shp")], [], null, files);
        Assert.Empty(files.Read);
        var set = BoundarySet.Read([_folder.At("zones.shp")], [], null, files.Under("region.boundary"));

        Assert.NotEmpty(set.Boundary.Features);
        Assert.Equal([".dbf", ".prj", ".shp", ".shx"], files.Read.Select(read => Path.GetExtension(read.Path)).Order(StringComparer.Ordinal).Where(end => end != ".cpg"));
    }

    [Fact]
    public void Plans_pilots_and_lines_are_parsed_from_the_bytes_that_were_read_first()
    {
        var plan = Write("plan.toml", "[region]\nboundary = \"plan.toml\"\n[layout]\nkind = \"parallel\"\nspacing = \"2 km\"\nhalf_width = \"200 m\"\n");
        var transects = Write("t.csv", "transect,length_km,count\nA,1,2\nB,1,2\n");
        var detections = Write("d.csv", "transect,distance_m\nA,1\n");
        var line = Write("l.geojson", """{"type":"LineString","coordinates":[[1,2],[3,4]]}""");
        var files = new InputFiles();
        foreach (var path in new[] { plan, transects, detections, line })
        {
            files.Bytes(path);
            File.WriteAllText(path, "no longer this");
        }

        Assert.NotNull(PlanFileReader.Read(plan, [], files));
        var pilot = PilotTableReader.Read(transects, detections, files);
        Assert.Equal((2, 1), (pilot.Transects.Length, pilot.Detections.Length));
        Assert.Equal(2, Assert.Single(LineFile.Read(line, files.Under("layout.bearing"))).Length);
        Assert.Equal(["pilot.transects", "pilot.detections", "layout.bearing"], files.Read.Select(read => read.Key));
    }

    private string Write(string name, string text)
    {
        File.WriteAllText(_folder.At(name), text);
        return _folder.At(name);
    }
}
