using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>Everything about the coverage of a design in a plane figure.</summary>
internal static class Judge
{
    public const ulong Seed = 20261201;

    public static StratumCoverage Of(Stratum stratum, LayoutDesign design, double cellSize, int replicates = 1000)
    {
        var generator = PlaneStrata.Prepare(stratum, design);
        return new CoverageCalculator(new CoverageDesign(Replicates: replicates), Seed, 1, CancellationToken.None)
            .OfStratum(generator, Draw(generator), new FlatEarth(), cellSize, 0, null);
    }

    public static Layout Draw(LayoutGenerator generator) => LayoutDrawer.Draw([generator], new FlatEarth(), Seed)[0];

    /// <summary>A hundred thousand metres to a degree on both axes: near enough to the equator for lengths to hold within 2 %.</summary>
    private sealed class FlatEarth : EqualAreaProjection
    {
        private const double MetresPerDegree = 1e5;

        public override string Method => "flat";

        public override string Wkt => "";

        public override LonLat Centre => default;

        public override PlanePoint Project(LonLat position) => new(position.Lon * MetresPerDegree, position.Lat * MetresPerDegree);

        public override LonLat Unproject(PlanePoint point) => new(point.X / MetresPerDegree, point.Y / MetresPerDegree);
    }
}
