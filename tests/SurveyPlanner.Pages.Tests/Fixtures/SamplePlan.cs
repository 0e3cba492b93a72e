using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Tests.Fixtures;

/// <summary>Plans put together by hand, for the tests of pages: their figures are plausible, not computed.</summary>
internal static class SamplePlan
{
    public static readonly ReportContext Context = new("archipelago.toml", "draw 1 of 1", "0.1.0");

    /// <summary>Parallel lines at a grid bearing in every stratum.</summary>
    public static SurveyPlan Lines(Region region, double spacingMetres = 10_000, double bearing = 20, string name = "Archipelago, sea ducks by boat")
        => Plan(region, name, new LayoutDesign(LayoutKind.Parallel, new Sizing.Spacing(spacingMetres), new Bearing.Degrees(bearing), 600), Parallel);

    /// <summary>A square grid of points in every stratum.</summary>
    public static SurveyPlan Points(Region region, double spacingMetres = 10_000, string name = "Points")
        => Plan(region, name, new LayoutDesign(LayoutKind.PointGrid, new Sizing.Spacing(spacingMetres), new Bearing.Degrees(0), 1000), Grid);

    private static SurveyPlan Plan(Region region, string name, LayoutDesign design, Func<Region, Stratum, LayoutDesign, int, IEnumerable<TransectPiece[]>> place)
    {
        var (strata, order) = (new List<StratumPlan>(), 0);
        foreach (var (i, stratum) in region.Strata.Index())
        {
            var transects = place(region, stratum, design, i).Select(pieces => Transect(pieces, (char)('A' + (i % 26)), ++order)).ToImmutableArray();
            var spacing = ((Sizing.Spacing)design.Sizing).Metres;
            strata.Add(new StratumPlan(
                stratum,
                new Layout(
                    stratum.Name, design, design.Bearing is Bearing.Degrees d ? d.Value : 0, spacing, [1234.5], transects,
                    design.IsPoints ? null : stratum.Shape.AreaSquareMetres / spacing, transects.Length, new EffortSpread(1, 0, 1, 1), []),
                CoverageOf(region, stratum, design)));
        }

        return new SurveyPlan(
            new SurveyDesign(
                name, 20270401, null, [], design, ImmutableSortedDictionary<string, LayoutDesign>.Empty, EffortDesign.None, new CoverageDesign()),
            region, [.. strata], []);
    }

    private static Transect Transect(TransectPiece[] pieces, char letter, int order) => new(
        $"{letter}{order:00}", order, [.. pieces], pieces.Sum(piece => Geodesic.PathLength(piece.Positions.AsSpan())),
        pieces[0].Positions.Length == 1 ? null : Geodesic.Inverse(pieces[0].Positions[0], pieces[0].Positions[^1]).StartBearing);

    private static IEnumerable<TransectPiece[]> Parallel(Region region, Stratum stratum, LayoutDesign design, int index)
    {
        var (spacing, (sin, cos)) = (((Sizing.Spacing)design.Sizing).Metres, Math.SinCos(((Bearing.Degrees)design.Bearing).Value * Math.PI / 180));
        var reach = stratum.Shape.Diagonal + Math.Abs(stratum.Centre.X) + Math.Abs(stratum.Centre.Y);
        var forth = true;
        for (var across = -reach + (0.37 * spacing); across < reach; across += spacing)
        {
            // Along the line: t; the place is across·(cos, -sin) + t·(sin, cos).
            var cuts = Crossings(stratum.Shape, across, sin, cos).Order().ToArray();
            if (cuts.Length < 2)
            {
                continue;
            }

            var pieces = cuts.Chunk(2).Where(pair => pair.Length == 2 && pair[1] - pair[0] > 1)
                .Select(pair => (TransectPiece)Piece(region, At(pair[0]), At(pair[1]), forth)).ToArray();
            if (pieces.Length > 0)
            {
                yield return forth ? pieces : [.. pieces.Reverse()];
                forth = !forth;
            }

            PlanePoint At(double t) => new((across * cos) + (t * sin), (-across * sin) + (t * cos));
        }
    }

    private static TransectPiece Piece(Region region, PlanePoint a, PlanePoint b, bool forth)
    {
        PlanePoint[] plane = forth ? [a, b] : [b, a];
        return new TransectPiece([.. plane], [.. plane.Select(region.Projection.Unproject)]);
    }

    private static IEnumerable<double> Crossings(PlaneShape shape, double across, double sin, double cos)
    {
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
            for (var i = start; i < end; i++)
            {
                var j = i + 1 == end ? start : i + 1;
                var (ai, aj) = ((shape.X[i] * cos) - (shape.Y[i] * sin), (shape.X[j] * cos) - (shape.Y[j] * sin));
                if ((ai > across) != (aj > across))
                {
                    var share = (across - ai) / (aj - ai);
                    var (x, y) = (shape.X[i] + (share * (shape.X[j] - shape.X[i])), shape.Y[i] + (share * (shape.Y[j] - shape.Y[i])));
                    yield return (x * sin) + (y * cos);
                }
            }
        }
    }

    private static IEnumerable<TransectPiece[]> Grid(Region region, Stratum stratum, LayoutDesign design, int index)
    {
        var spacing = ((Sizing.Spacing)design.Sizing).Metres;
        foreach (var place in Lattice(stratum.Shape, spacing))
        {
            yield return [new TransectPiece([place], [region.Projection.Unproject(place)])];
        }
    }

    private static IEnumerable<PlanePoint> Lattice(PlaneShape shape, double step)
    {
        for (var y = shape.MinY + (step / 3); y < shape.MaxY; y += step)
        {
            // Inside between the 1st and 2nd crossing of the row, the 3rd and 4th, and so on.
            var cuts = Crossings(shape, -y, 1, 0).Order().ToArray();
            for (var x = shape.MinX + (step / 3); x < shape.MaxX; x += step)
            {
                if (cuts.Count(cut => cut < x) % 2 == 1)
                {
                    yield return new PlanePoint(x, y);
                }
            }
        }
    }

    // Coverage falling towards the west, none in the far west: every class of the map occurs.
    private static StratumCoverage CoverageOf(Region region, Stratum stratum, LayoutDesign design)
    {
        var size = Math.Sqrt(stratum.Shape.AreaSquareMetres / 2000);
        var nominal = 0.12;
        var cells = Lattice(stratum.Shape, size).Select(place =>
        {
            var share = (place.X - stratum.Shape.MinX) / (stratum.Shape.MaxX - stratum.Shape.MinX);
            var exact = share < 0.04 ? 0 : nominal * Math.Min(1, 0.3 + share);
            return new CoverageCell(place, region.Projection.Unproject(place), place, size * size / 1e6, exact, exact, exact, 0.001);
        }).ToImmutableArray();
        return new StratumCoverage(
            stratum.Name, nominal, size, 0, 1000, cells, cells.Average(cell => cell.Best), cells.Min(cell => cell.Best), cells.Max(cell => cell.Best), 0.21, 0.1, 2.31);
    }
}
