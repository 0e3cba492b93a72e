using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

/// <summary>Plans put together by hand: fictional waters, made to hold what writers trip over.</summary>
internal static class TestPlans
{
    public const string HostileName = "=2+3,\"Høy\" <b>&\u0007 ]]>";

    public static readonly LonLat Centre = new(-150.5, 63.1);

    /// <summary>Two strata: lines, one of them cut in two by an island, with coverage; and a point grid under a hostile name.</summary>
    public static SurveyPlan TwoStrata() => Plan(
        Centre,
        Lines(
            "Inner bay",
            Line("A001", 1, 0, Path(-150.6, 63.0, -150.6, 63.2)),
            Line("A002", 2, 180, Path(-150.5, 63.2, -150.5, 63.15), Path(-150.5, 63.11, -150.5, 63.0))),
        Points(HostileName, Point("B001", 3, -150.4, 63.05), Point("B002", 4, -150.3, 63.05)));

    /// <summary>
    /// Two strata of lines, a pilot with distances and clusters in each, detection by stratum, costs, a target of 20 % and an assurance of 0.8:
    /// all that a summary can hold of lines.
    /// </summary>
    public static SurveyPlan WithDetections()
    {
        var plan = Plan(Centre, Lines("Inner bay", Line("A001", 1, 0, Path(-150.6, 63.0, -150.6, 63.2))), Lines("Outer bay", Line("B001", 2, 0, Path(-150.4, 63.0, -150.4, 63.2))));
        var transects = from stratum in plan.Strata from i in Enumerable.Range(1, 5) select new PilotTransect(stratum.Stratum.Name, $"{stratum.Stratum.Name} {i}", 2, 3 + i);
        ImmutableArray<PilotTransect> pilotTransects = [.. transects];
        var detections =
            from transect in pilotTransects
            from i in Enumerable.Range(0, transect.Count)
            select new PilotDetection(transect.Id, 290.0 * i * i / (transect.Count * transect.Count), 1 + (i % 3));
        var strata = plan.Strata.Select(stratum => new EffortStratum(stratum.Stratum.Name, stratum.Stratum.AreaKm2, IsPoints: false, 300, IsSystematic: true, TransectLengthKm: 2));
        var design = EffortDesign.None with
        {
            TargetCv = 0.2,
            Assurance = 0.8,
            Detection = DetectionDesign.None with { ByStratum = true },
            CostPerUnit = ImmutableSortedDictionary<string, double>.Empty.Add("Inner bay", 100).Add("Outer bay", 250),
        };
        var effort = EffortPlanning.For(design, new PilotTable(false, pilotTransects, [.. detections]), [.. strata], seed: 1)!;
        var measured = new MeasuredReliability(10, 5, 2, 0.935, 0.79);
        return plan with { Effort = effort with { Uncertainty = effort.Uncertainty! with { Measured = measured } } };
    }

    /// <summary>The same with a pilot of three lines over the strata with lines, and a target of 20 %.</summary>
    public static SurveyPlan WithEffort()
    {
        var plan = TwoStrata();
        var pilot = new PilotTable(false, [new("", "1", 2, 4), new("", "2", 2, 6), new("", "3", 2, 8)], []);
        var strata = plan.Strata.Select(stratum =>
            new EffortStratum(stratum.Stratum.Name, stratum.Stratum.AreaKm2, stratum.Layout.Design.IsPoints, 300, IsSystematic: false));
        return plan with { Effort = EffortPlanning.For(EffortDesign.None with { TargetCv = 0.2 }, pilot, [.. strata], seed: 1) };
    }

    /// <summary>A pilot of points with radial distances over the stratum of points.</summary>
    public static SurveyPlan WithPoints()
    {
        var plan = TwoStrata();
        int[] counts = [1, 0, 2, 3, 1, 2];
        ImmutableArray<PilotTransect> transects = [.. counts.Select((count, i) => new PilotTransect("", $"{i}", 1, count))];
        var detections = from transect in transects from i in Enumerable.Range(0, transect.Count) select new PilotDetection(transect.Id, 40 + (30 * i), 1);
        var strata = plan.Strata.Select(stratum =>
            new EffortStratum(stratum.Stratum.Name, stratum.Stratum.AreaKm2, stratum.Layout.Design.IsPoints, 182.88, IsSystematic: false));
        return plan with { Effort = EffortPlanning.For(EffortDesign.None with { TargetCv = 0.2 }, new PilotTable(true, transects, [.. detections]), [.. strata], seed: 1) };
    }

    /// <summary>One stratum of lines round any place, without coverage.</summary>
    public static SurveyPlan OneStratum(LonLat centre, params Transect[] transects) => Plan(centre, Lines("All", transects) with { Coverage = null });

    public static SurveyPlan Plan(LonLat centre, params StratumPlan[] strata)
    {
        var projection = new AzimuthalEqualArea(centre);
        var design = new SurveyDesign(
            "Sea ducks of Lisbet Sound", 20270401, null, [], LineDesign, ImmutableSortedDictionary<string, LayoutDesign>.Empty, EffortDesign.None, new CoverageDesign());
        var region = new Region(projection, [.. strata.Select(stratum => stratum.Stratum)], PlaneShape.Empty, 0.0123456789, 0.5, "WGS 84 longitude and latitude (RFC 7946)", []);
        ImmutableArray<Notice> notices =
        [
            new(NoticeKind.Repair, "A ring was closed."),
            new(NoticeKind.Warning, "The half-width is more than half the spacing."),
        ];
        return new SurveyPlan(design, region, [.. strata.Select(stratum => Placed(stratum, projection))], null, notices);
    }

    public static StratumPlan Lines(string name, params Transect[] transects) => new(
        Square(name),
        new Layout(name, LineDesign, 0, 5000, [1234.5], [.. transects], transects.Sum(transect => transect.LengthMetres) + 1.25, 2.25, new EffortSpread(66_869.62, 1500, 60_000, 70_000), []),
        Coverage(name) with { Transects = [.. transects.Select(transect => new TransectCoverage(transect.Id, transect.Order == 1 ? 0.125 : null, IsExact: true))] });

    public static StratumPlan Points(string name, params Transect[] transects) => new(
        Square(name),
        new Layout(name, PointDesign, 45, 2000, [1, 2], [.. transects], null, 2.5, new EffortSpread(2.5, 0.5, 2, 3), []),
        null);

    public static Transect Line(string id, int order, double bearing, params ImmutableArray<LonLat>[] pieces) =>
        new(id, order, [.. pieces.Select(piece => new TransectPiece([], piece))], 22_289.4567 * pieces.Length, bearing);

    public static Transect Point(string id, int order, double lon, double lat) =>
        new(id, order, [new TransectPiece([], [new LonLat(lon, lat)])], 0, null);

    public static ImmutableArray<LonLat> Path(params double[] lonLat) =>
        [.. lonLat.Chunk(2).Select(pair => new LonLat(pair[0], pair[1]))];

    /// <summary>Cells of 10 km in two columns, west covered with probability 0.1 and east with 0.3; the west column has no closed form.</summary>
    private static StratumCoverage Coverage(string name)
    {
        var projection = new AzimuthalEqualArea(Centre);
        var cells =
            from column in new[] { -1, 0 }
            from row in new[] { -2, -1, 0, 1 }
            let centre = new PlanePoint((column * 10_000) + 5000, (row * 10_000) + 5000)
            select new CoverageCell(
                centre, projection.Unproject(centre), centre, 100, column < 0 ? null : 0.3, column < 0 ? 0.1 : 0.29, 0.31, 0.0123);
        return new StratumCoverage(name, 0.2, 10_000, 0, 1000, [.. cells], 0.2, 0.1, 0.3, 0.5, 0.195, null)
        {
            EdgeProfile = [new EdgeClass(0, 5000, 600, 0.15), new EdgeClass(5000, null, 200, 0.2)],
            Advice = new CoverageAdvice(CoverageFinding.UnevenInside, 1, 0, "Coverage is uneven."),
        };
    }

    private static StratumPlan Placed(StratumPlan stratum, EqualAreaProjection projection) => stratum with
    {
        Layout = stratum.Layout with
        {
            Transects =
            [
                .. stratum.Layout.Transects.Select(transect => transect with
                {
                    Pieces = [.. transect.Pieces.Select(piece => piece with { Plane = [.. piece.Positions.Select(projection.Project)] })],
                }),
            ],
        },
    };

    private static Stratum Square(string name)
    {
        var shape = new PlaneShape([-10_000, 10_000, 10_000, -10_000], [-20_000, -20_000, 20_000, 20_000], [0, 4], [0, 1]);
        return new Stratum(name, shape, 800.00000123456, new PlanePoint(0, 0), Centre, 0, 0, 40, 20, ImmutableSortedDictionary<string, string>.Empty);
    }

    private static readonly LayoutDesign LineDesign = new(LayoutKind.Parallel, new Sizing.Spacing(5000), new Bearing.Degrees(0), 300);

    private static readonly LayoutDesign PointDesign = new(LayoutKind.PointGrid, new Sizing.Spacing(2000), new Bearing.Degrees(45), 182.88);
}
