using System.Globalization;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Report;

/// <summary>The tables of the report.</summary>
internal static class Tables
{
    public static Table OfLayout(SurveyPlan plan) => new(
        "Layout by stratum",
        [
            new("Stratum", false), new("Kind", false), new("Area, km²"), new("Bearing, ° true"), new("Spacing, m"), new("Half-width or radius, m"),
            new("Edge", false), new("Transects"), new("Length, km"),
        ],
        [.. plan.Strata.Select(stratum => LayoutRow(stratum.Stratum, stratum.Layout))]);

    private static string[] LayoutRow(Stratum stratum, Layout layout) =>
    [
        stratum.Name,
        Sentences.Kind(layout.Design),
        Figures.Three(stratum.AreaKm2),
        Figures.Bearing(layout.BearingDegrees),
        Figures.Three(layout.SpacingMetres),
        Figures.Three(layout.Design.HalfWidthMetres),
        Sentences.Word(layout.Design.Edge),
        Figures.Count(layout.Transects.Length),
        layout.Design.IsPoints ? Figures.None : Figures.Three(layout.TotalLengthMetres / 1000),
    ];

    public static Table OfSpread(SurveyPlan plan) => new(
        "Effort over all draws of this design",
        [
            new("Stratum", false), new("Counted in", false), new("This draw"), new("Expected"), new("Standard deviation"), new("Least"), new("Greatest"),
            new("Expected transects"),
        ],
        [.. plan.Strata.Select(stratum => SpreadRow(stratum.Layout))]);

    private static string[] SpreadRow(Layout layout) => layout.Design.IsPoints
        ?
        [
            layout.Stratum, "points", Figures.Count(layout.Transects.Length), Figures.Three(layout.ExpectedCount), Figures.Three(layout.Spread.StandardDeviation),
            Figures.Count((long)layout.Spread.Smallest), Figures.Count((long)layout.Spread.Largest), Figures.Three(layout.ExpectedCount),
        ]
        :
        [
            layout.Stratum, "km of line", Figures.Three(layout.TotalLengthMetres / 1000), Figures.Three(layout.ExpectedLengthMetres / 1000),
            Figures.Three(layout.Spread.StandardDeviation / 1000), Figures.Three(layout.Spread.Smallest / 1000), Figures.Three(layout.Spread.Largest / 1000),
            Figures.Three(layout.ExpectedCount),
        ];

    public static Table OfCoverage(IEnumerable<StratumCoverage> coverages) => new(
        "Coverage probability by stratum",
        [
            new("Stratum", false), new("Nominal"), new("Mean"), new("Least"), new("Greatest"), new("CV, %"), new("Cells"), new("Simulated draws"),
            new("Simulated mean"), new("Largest |z|"),
        ],
        [.. coverages.Select(CoverageRow)]);

    private static string[] CoverageRow(StratumCoverage coverage) =>
    [
        coverage.Stratum,
        Figures.Three(coverage.Nominal),
        Figures.Three(coverage.Mean),
        Figures.Three(coverage.Min),
        Figures.Three(coverage.Max),
        Figures.Three(coverage.Cv * 100),
        Figures.Count(coverage.Cells.Length),
        Figures.Count(coverage.Replicates),
        Figures.Three(coverage.SimulatedMean),
        Figures.Three(coverage.MaxAbsZ),
    ];

    public static Table OfClasses(IEnumerable<CoverageClass> classes) => new(
        "Area by coverage probability",
        [new("Multiple of nominal", false), new("Area, km²"), new("Share, %")],
        [.. classes.Select(one => (string[])[one.Name, Figures.Three(one.AreaKm2), Figures.Three(one.Share * 100)])]);

    /// <summary>Transects in the order of visit, at most so many.</summary>
    public static Table OfTransects(SurveyPlan plan, int most)
    {
        var all = plan.Strata.SelectMany(stratum => stratum.Layout.Transects, (stratum, transect) => (stratum.Stratum.Name, transect))
            .OrderBy(pair => pair.transect.Order).Take(most).ToArray();
        return all.All(pair => pair.transect.IsPoint) ? OfPoints(all) : OfLines(all);
    }

    private static Table OfLines(IEnumerable<(string Stratum, Transect Transect)> transects) => new(
        "Transects in the order of visit; positions on WGS 84: latitude, longitude in degrees, and in degrees and minutes",
        [
            new("Id", false), new("Order"), new("Stratum", false), new("Start", false), new("End", false), new("Pieces"), new("Length, km"),
            new("Bearing at start, ° true"),
        ],
        [.. transects.Select(pair => LineRow(pair.Stratum, pair.Transect))]);

    private static string[] LineRow(string stratum, Transect transect) =>
    [
        transect.Id,
        Figures.Count(transect.Order),
        stratum,
        Position(transect.Start),
        transect.IsPoint ? Figures.None : Position(transect.End),
        transect.IsPoint ? Figures.None : Figures.Count(transect.Pieces.Length),
        transect.IsPoint ? Figures.None : Figures.Three(transect.LengthMetres / 1000),
        Figures.Bearing(transect.BearingDegrees),
    ];

    private static Table OfPoints(IEnumerable<(string Stratum, Transect Transect)> points) => new(
        "Points in the order of visit; positions on WGS 84: latitude, longitude",
        [new("Id", false), new("Order"), new("Stratum", false), new("Position, degrees", false), new("Position, degrees and minutes", false)],
        [
            .. points.Select(pair => (string[])
            [
                pair.Transect.Id,
                Figures.Count(pair.Transect.Order),
                pair.Stratum,
                Positions.Decimal(pair.Transect.Start),
                Positions.Minutes(pair.Transect.Start),
            ]),
        ]);

    private static string Position(LonLat position) => Positions.Decimal(position) + "\n" + Positions.Minutes(position);

    public static Table OfRegion(Region region) => new(
        "Strata as read and projected",
        [
            new("Stratum", false), new("Area on the ellipsoid, km²"), new("Area in the plane, km²"), new("Difference, parts per million"), new("Parts"),
            new("Holes"), new("Vertices"), new("Long side, km"), new("Short side, km"), new("Long side, ° true"), new("Grid north, ° true"),
        ],
        [
            .. region.Strata.Select(stratum => (string[])
            [
                stratum.Name,
                Figures.Three(stratum.GeodesicAreaKm2),
                Figures.Three(stratum.AreaKm2),
                PartsPerMillion(stratum),
                Figures.Count(stratum.Shape.PartCount),
                Figures.Count(stratum.Shape.HoleCount),
                Figures.Count(stratum.Shape.VertexCount),
                Figures.Three(stratum.LongAxisKm),
                Figures.Three(stratum.ShortAxisKm),
                Figures.Bearing(stratum.LongAxisBearing),
                stratum.ConvergenceDegrees.ToString("+0.0;−0.0;0.0", CultureInfo.InvariantCulture),
            ]),
        ]);

    private static string PartsPerMillion(Stratum stratum)
        => (((stratum.AreaKm2 / stratum.GeodesicAreaKm2) - 1) * 1e6).ToString("0.000;−0.000;0.000", CultureInfo.InvariantCulture);
}
