using System.Globalization;
using System.Text.RegularExpressions;
using CsCheck;
using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Pages.Tests.Fixtures;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Pages.Tests.Maps;

public partial class DrawingTests
{
    private static readonly MapFrame Frame = new(960, 600, new PlanePoint(0, 0), 100);

    [Fact]
    public void A_path_is_rounded_to_tenths_without_adding_up_errors()
    {
        var points = Enumerable.Range(0, 1000).Select(i => new Pixel(i * 0.33, 5 - (i * 0.07))).ToArray();
        var drawn = GraticuleTests.Vertices(new PathData().Polyline(points).ToString()).ToArray();
        Assert.Equal(points.Length, drawn.Length);
        Assert.All(points.Zip(drawn), pair => Assert.True(pair.First.DistanceTo(pair.Second) < 0.0708));
    }

    [Fact]
    public void What_is_cut_at_the_frame_lies_inside_it_and_keeps_its_length()
        => Gen.Select(Gen.Double[-500, 1500], Gen.Double[-500, 1100], Gen.Double[-500, 1500], Gen.Double[-500, 1100]).Hold(
            2000, seed: 1,
            sample =>
            {
                var (x0, y0, x1, y1) = sample;
                Pixel[] line = [.. Enumerable.Range(0, 9).Select(i => new Pixel(x0 + ((x1 - x0) * i / 8), y0 + ((y1 - y0) * i / 8)))];
                var pieces = FrameClip.Clip(line.Select(p => (Pixel?)p), Frame);
                var inside = pieces.SelectMany(piece => piece).All(p => p.X is >= -1e-9 and <= 960 + 1e-9 && p.Y is >= -1e-9 and <= 600 + 1e-9);

                // Second method: the share of 2,000 places along the line that lie inside.
                var share = Enumerable.Range(0, 2000).Count(i => Frame.Contains(new Pixel(x0 + ((x1 - x0) * (i + 0.5) / 2000), y0 + ((y1 - y0) * (i + 0.5) / 2000)))) / 2000.0;
                var length = pieces.Sum(piece => piece.Zip(piece.Skip(1), (a, b) => a.DistanceTo(b)).Sum());
                Assert.True(inside && Math.Abs(length - (share * line[0].DistanceTo(line[^1]))) < 2 * line[0].DistanceTo(line[^1]) / 2000);
            });

    /// <summary>Numerical example for the sphere in Snyder 1987, USGS Professional Paper 1395, p. 311 (from memory; recomputed by hand).</summary>
    [Fact]
    public void The_globe_puts_a_place_where_Snyder_does()
    {
        var (place, towards) = new Orthographic(-100, 40, 1).At(new LonLat(-110, 30));
        Assert.Equal(-0.1503837, place.X, 1e-7);
        Assert.Equal(0.1651911, place.Y, 1e-7);
        Assert.True(towards > 0);
    }

    /// <summary>Two strata side by side, one five times as wide: a name of 80 characters is cut to what its stratum has room for, a common one not at all.</summary>
    [Fact]
    public void Long_names_are_cut_to_their_stratum()
    {
        var west = "Administrativebezirkgrenzüberschreitenderzusammenarbeitsgebietnordwestlichersektor";
        var east = new string('区', 60);
        var plan = SamplePlan.Of(SampleBoundary.Boxes((west, 20, 0, 25, 5), (east, 25, 0, 26, 5), ("inner bay", 26, 0, 26.5, 5)), SamplePlan.Parallel(100_000), stratumField: "name", cells: 100);
        var frame = MapFrame.Around(plan.Region.Strata.Select(stratum => stratum.Shape), []);
        var strata = StrataDrawing.Of(plan.Region, frame, new LabelPlacer(frame.Width, frame.Height)).Strata;
        var names = strata.Select(stratum => stratum.NameLabel!.Text).ToArray();

        Assert.InRange(names[0].Length, 26, 28);
        Assert.Equal(("Administrative", "sektor"), (names[0][..14], names[0][^6..]));
        Assert.InRange(names[1].Length, 8, 14);
        Assert.InRange(LabelPlacer.LengthOf(names[1], StrataDrawing.NameSize), 0, 1.1 * strata[1].Shape.WidthAt(strata[1].NameLabel!.Place));
        Assert.Equal("inner bay", names[2]);
    }

    /// <summary>Two squares that share the side x = 100, as a region cut at 180° does, and an island: the side they share is not drawn.</summary>
    [Fact]
    public void Where_parts_of_a_stratum_meet_no_edge_is_drawn()
    {
        Pixel[] west = [new(0, 0), new(100, 0), new(100, 100), new(0, 100)];
        Pixel[] east = [new(100, 100), new(100, 0), new(200, 0), new(200, 100)];
        Pixel[] island = [new(300, 0), new(320, 0), new(310, 20)];
        Assert.Null(new ShapeDrawing([west, island]).Outline);

        var drawn = new ShapeDrawing([west, east, island]).Outline!.Split('M', StringSplitOptions.RemoveEmptyEntries)
            .Select(run => GraticuleTests.Vertices("M" + run).ToArray()).ToArray();
        Assert.Equal([new(100, 100), new(0, 100), new(0, 0), new(100, 0)], drawn[0]);
        Assert.Equal([new(100, 0), new(200, 0), new(200, 100), new(100, 100)], drawn[1]);
        Assert.Equal([new(300, 0), new(320, 0), new(310, 20), new(300, 0)], drawn[2]);
    }

    /// <summary>The western stratum has no vertex on the side that the eastern one lies against.</summary>
    [Fact]
    public void Strata_that_lie_side_by_side_have_different_fills()
    {
        var region = SamplePlan.Of(
            SampleBoundary.Boxes(("a", 0, 0, 1, 3), ("b", 1, 1, 2, 2), ("c", 5, 0, 6, 1), ("d", 6, 0, 7, 1), ("e", 2, 1.2, 3, 1.8), ("f", 3, 1, 4, 2)),
            SamplePlan.Parallel(50_000), stratumField: "name", cells: 50).Region;
        var frame = MapFrame.Around(region.Strata.Select(stratum => stratum.Shape), []);
        var fills = StrataDrawing.Of(region, frame, new LabelPlacer(frame.Width, frame.Height)).Strata.Select(stratum => stratum.Fill).ToArray();

        Assert.Equal(4, fills[..4].Distinct().Count());
        Assert.NotEqual(fills[1], fills[4]);
        Assert.NotEqual(fills[4], fills[5]);
    }

    [Fact]
    public void The_width_at_a_place_is_twice_the_way_to_the_nearer_side()
    {
        // A square of 100 with a hole of 20 in its middle.
        var shape = new ShapeDrawing([[new(0, 0), new(100, 0), new(100, 100), new(0, 100)], [new(40, 40), new(60, 40), new(60, 60), new(40, 60)]]);
        Assert.Equal(60, shape.WidthAt(new Pixel(30, 20)), 1e-9);
        Assert.Equal(20, shape.WidthAt(new Pixel(30, 50)), 1e-9);
        Assert.Equal(100, shape.WidthAt(new Pixel(50, 90)), 1e-9);
    }

    [Theory]
    [InlineData(178, -17)]
    [InlineData(21, 60)]
    [InlineData(20, 90)]
    [InlineData(-100, -90)]
    [InlineData(0, 0)]
    public void Land_on_the_globe_stays_on_the_globe_and_never_fills_it(double lon, double lat)
    {
        var globe = Globe.Showing(new LonLat(lon, lat), 40);
        var vertices = GraticuleTests.Vertices(globe.Land).ToArray();
        Assert.NotEmpty(vertices);
        Assert.All(vertices, p => Assert.True(p.DistanceTo(default) < 40.2));
        Assert.True(globe.Mark.DistanceTo(default) < 40);

        // About a third of any half of the Earth at most three quarters is land: no ring may have been closed the wrong way round.
        var area = globe.Land.Split('z', StringSplitOptions.RemoveEmptyEntries).Sum(ring => Math.Abs(Area([.. GraticuleTests.Vertices(ring)])));
        Assert.InRange(area / (Math.PI * 40 * 40), 0.01, 0.75);
    }

    [Theory]
    [InlineData(1, false, "200 m")]
    [InlineData(100, false, "20 km")]
    [InlineData(210, false, "50 km")]
    [InlineData(0.01, false, "2 m")]
    [InlineData(100, true, "10 nmi")]
    [InlineData(20, true, "2 nmi")]
    public void The_scale_bar_is_a_round_number_and_has_its_true_length(double metresPerPixel, bool nautical, string longest)
    {
        var bar = ScaleBar.For(metresPerPixel, nautical);
        var (at, text) = bar.Labels[^1];
        Assert.Equal(longest, text);
        var number = double.Parse(text.Split(' ')[0], CultureInfo.InvariantCulture);
        var metres = number * (text.EndsWith("nmi", StringComparison.Ordinal) ? 1852 : text.EndsWith("km", StringComparison.Ordinal) ? 1000 : 1);
        Assert.Equal(metres, at * bar.SegmentPixels * metresPerPixel, 1e-9 * metres);
        Assert.InRange(at * bar.SegmentPixels, 80, 240.001);
    }

    [Fact]
    public void Placed_labels_never_cover_each_other_and_never_leave_the_drawing()
    {
        var placer = new LabelPlacer(200, 100);
        var label = new Label("A01", new Pixel(100, 50));
        Assert.True(placer.TryPlace(label, 12));
        Assert.False(placer.TryPlace(label with { Place = new Pixel(110, 54) }, 12));
        Assert.True(placer.TryPlace(label with { Place = new Pixel(140, 50) }, 12));
        Assert.False(placer.TryPlace(label with { Place = new Pixel(198, 20) }, 12));
        Assert.False(placer.TryPlaceBox(new Pixel(100, 46), 3));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(0.6)]
    [InlineData(-2)]
    public void Cells_of_one_class_are_drawn_once_each_where_they_lie(double turn)
    {
        var coverage = Checkerboard(turn, columns: 7, rows: 5);
        var drawing = CellsDrawing.Of(coverage, Frame);
        var matrix = Numbers(drawing.Transform);
        var centres = drawing.Paths.SelectMany(path => CellCentres(path.Path).Select(c => (path.Class, Place: new Pixel(
            (matrix[0] * c.X) + (matrix[2] * c.Y) + matrix[4], (matrix[1] * c.X) + (matrix[3] * c.Y) + matrix[5])))).ToArray();
        Assert.Equal(coverage.Cells.Count(cell => cell.Best > 0), centres.Length);
        foreach (var cell in coverage.Cells.Where(cell => cell.Best > 0))
        {
            var expected = (CoverageClasses.Of(cell, coverage.Nominal), Frame.ToPixel(cell.SquareCentre));
            Assert.Single(centres, centre => centre.Class == expected.Item1 && centre.Place.DistanceTo(expected.Item2) < 0.01);
        }
    }

    [Fact]
    public void Neighbours_of_one_class_in_a_row_are_one_rectangle()
    {
        var coverage = Checkerboard(0, columns: 100, rows: 100);
        var even = coverage with { Cells = [.. coverage.Cells.Select(cell => cell with { Exact = 0.1 })] };
        var path = Assert.Single(CellsDrawing.Of(even, Frame).Paths).Path;
        Assert.Equal(100, path.Count(c => c == 'M'));
    }

    [Theory]
    [InlineData(0.0, CoverageClasses.Never)]
    [InlineData(0.049, 0)]
    [InlineData(0.05, 1)]
    [InlineData(0.1, CoverageClasses.AsPlanned)]
    [InlineData(0.1099, CoverageClasses.AsPlanned)]
    [InlineData(0.2, 5)]
    public void Coverage_is_classed_by_its_ratio_to_nominal(double coverage, int expected)
        => Assert.Equal(expected, CoverageClasses.Of(new CoverageCell(default, default, default, 1, coverage, coverage, coverage, 0), 0.1));

    [Fact]
    public void The_areas_of_the_classes_add_up_to_the_region()
    {
        var plan = SamplePlan.Archipelago;
        var classes = CoverageClasses.Tally(plan.Strata.Select(stratum => stratum.Coverage!));
        Assert.Equal(plan.Region.AreaKm2, classes.Sum(one => one.AreaKm2), 1e-6 * plan.Region.AreaKm2);
        Assert.Equal(1, classes.Sum(one => one.Share), 1e-12);
    }

    [Fact]
    public void Chevrons_point_the_way_the_line_is_travelled_and_every_id_is_shown_or_counted_as_left_out()
    {
        var plan = SamplePlan.Archipelago;
        var layouts = plan.Strata.Select(stratum => stratum.Layout).ToArray();
        var frame = MapFrame.Around(plan.Region.Strata.Select(stratum => stratum.Shape), []);
        var drawing = TransectsDrawing.Of(layouts, frame, new LabelPlacer(frame.Width, frame.Height));
        var ids = layouts.SelectMany(layout => layout.Transects).Select(transect => transect.Id).ToHashSet();
        Assert.Equal(ids.Count, drawing.Ids.Select(label => label.Text).Distinct().Count() + drawing.IdsLeftOut);

        foreach (var (place, turn) in drawing.Chevrons)
        {
            var at = frame.ToPlane(place);
            var piece = layouts.SelectMany(layout => layout.Transects).SelectMany(transect => transect.Pieces)
                .MinBy(piece => Math.Abs(Math.Sqrt(Squared(piece.Plane[0], at)) + Math.Sqrt(Squared(piece.Plane[^1], at)) - Math.Sqrt(Squared(piece.Plane[0], piece.Plane[^1]))))!;
            var along = Math.Atan2(-(piece.Plane[^1].Y - piece.Plane[0].Y), piece.Plane[^1].X - piece.Plane[0].X) * 180 / Math.PI;
            Assert.Equal(0, Math.IEEERemainder(along - turn, 360), 0.01);
        }
    }

    private static double Squared(PlanePoint a, PlanePoint b) => ((a.X - b.X) * (a.X - b.X)) + ((a.Y - b.Y) * (a.Y - b.Y));

    private static double Area(Pixel[] ring)
        => Enumerable.Range(0, ring.Length).Sum(i => (ring[i].X * ring[(i + 1) % ring.Length].Y) - (ring[(i + 1) % ring.Length].X * ring[i].Y)) / 2;

    private static StratumCoverage Checkerboard(double turn, int columns, int rows)
    {
        var grid = new Layouts.TurnedFrame(turn);
        double[] values = [0, 0.04, 0.1, 0.1, 0.2];
        var cells =
            from row in Enumerable.Range(0, rows)
            from column in Enumerable.Range(0, columns)
            let place = grid.ToPlane(1000 + (500 * column), -2000 + (500 * row))
            let value = values[((row * 3) + column) % values.Length]
            select new CoverageCell(place, default, place, 0.25, value, value, value, 0);
        return new StratumCoverage("all", 0.1, 500, turn, 100, [.. cells], 0.1, 0, 0.2, 0, 0.1, null);
    }

    private static IEnumerable<Pixel> CellCentres(string path)
    {
        foreach (Match run in Run().Matches(path))
        {
            var numbers = run.Groups.Values.Skip(1).Select(group => int.Parse(group.Value, CultureInfo.InvariantCulture)).ToArray();
            for (var i = 0; i < numbers[2]; i++)
            {
                yield return new Pixel(numbers[0] + i + 0.5, numbers[1] + 0.5);
            }
        }
    }

    private static double[] Numbers(string matrix)
        => [.. matrix["matrix(".Length..^1].Split(' ').Select(number => double.Parse(number, CultureInfo.InvariantCulture))];

    [GeneratedRegex(@"M(\d+) (\d+)h(\d+)v1h-\d+z")]
    private static partial Regex Run();
}
