using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Benchmarks;

/// <summary>
/// What every benchmark of coverage looks at: an island some 100 km across (7,000 km²), about 20 lines, legs or rows of points 5 km apart,
/// half-width 250 m.
/// </summary>
internal static class CoverageScene
{
    public const ulong Seed = 1;
    public const double SpacingMetres = 5000;
    public const double HalfWidthMetres = 250;

    public static Stratum Island(int vertices) => PlaneStrata.Of(CoverageFractalCoast.Of(vertices, Seed));

    public static LayoutGenerator Layout(Stratum island, LayoutKind kind)
        => PlaneStrata.Prepare(island, PlaneStrata.LinesAcrossX(SpacingMetres, HalfWidthMetres, kind));

    public static CellGrid Cells(LayoutGenerator layout, int cells) => CellGridBuilder.Build(layout.Stratum.Region, CellSize(layout, cells));

    public static double CellSize(LayoutGenerator layout, int cells) => Math.Sqrt(layout.Stratum.Region.AreaSquareMetres / cells);
}
