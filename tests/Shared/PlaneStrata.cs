using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.TestShapes;

/// <summary>Strata made of plain plane figures, for checks against closed forms. Units as in the source of the check.</summary>
internal static class PlaneStrata
{
    public static Stratum Of(params (double X, double Y)[] shell) => Of([shell]);

    /// <summary>One part for each ring list: the shell first, then holes.</summary>
    public static Stratum Of(params (double X, double Y)[][][] parts)
    {
        var builder = new PlaneShapeBuilder();
        foreach (var part in parts)
        {
            builder.StartPart();
            foreach (var ring in part)
            {
                builder.StartRing();
                foreach (var (x, y) in ring)
                {
                    builder.Add(x, y);
                }
            }
        }

        return Of(builder.Build());
    }

    public static Stratum Of(PlaneShape shape) => new(
        "figure", shape, shape.AreaSquareMetres / 1e6, default, default, 0, 0, 0, 0, ImmutableSortedDictionary<string, string>.Empty);

    private static Stratum Of((double X, double Y)[][] onePart) => Of([onePart]);

    public static Stratum Rectangle(double width, double height) => Of((0, 0), (width, 0), (width, height), (0, height));

    public static Stratum Triangle(double legX, double legY) => Of((0, 0), (legX, 0), (0, legY));

    /// <summary>A regular polygon so fine that its area differs from the disk's by 1e-10.</summary>
    public static Stratum Disk(double radius, int vertices = 400_000)
        => Of([.. Enumerable.Range(0, vertices).Select(i => (
            radius * Math.Cos(2 * Math.PI * i / vertices), radius * Math.Sin(2 * Math.PI * i / vertices)))]);

    /// <summary>Lines that run north to south in the plane, so that the direction across them is x.</summary>
    public static LayoutDesign LinesAcrossX(double spacing, double halfWidth, LayoutKind kind = LayoutKind.Parallel)
        => new(kind, new Sizing.Spacing(spacing), new Bearing.Degrees(0), halfWidth);

    /// <summary>A design in a figure, ready to draw.</summary>
    public static LayoutGenerator Prepare(Stratum stratum, LayoutDesign design) => LayoutKinds.Prepare(stratum, design);

    /// <summary>Given places in the plane, and the order they went in: result[i] belongs to places[order[i]].</summary>
    public static (CellGrid Grid, int[] Order) GridOf(LayoutGenerator generator, params (double X, double Y)[] places)
    {
        var turned = places.Select(place => generator.Stratum.Frame.ToFrame(place.X, place.Y)).ToArray();
        var grid = CellGrid.OfPlaces(turned, out var order);
        return (grid, order);
    }

    /// <summary>Exact coverage at one place of the plane.</summary>
    public static double ExactAt(LayoutGenerator generator, double x, double y)
        => ExactCoverage.At(generator, GridOf(generator, (x, y)).Grid)![0];
}
