using System.Globalization;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Report;

/// <summary>The tables of the layout and of the region.</summary>
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
        layout.Design.IsScattered ? Figures.None : Figures.Bearing(layout.BearingDegrees),
        layout.Design.IsScattered ? Figures.None : Figures.Three(layout.SpacingMetres),
        Figures.Three(layout.Design.HalfWidthMetres),
        ChoiceWord.Of(layout.Design.Edge),
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

    public static Table OfRegion(Region region) => new(
        "Strata as read and projected",
        [
            new("Stratum", false), new("Area on the ellipsoid, km²"), new("Area in the plane, km²"), new("Difference, parts per million"), new("Parts"),
            new("Holes"), new("Vertices in the file"), new("Long side, km"), new("Short side, km"), new("Long side, ° true"), new("Grid north, ° true"),
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
                Figures.Count(stratum.OutlineVertices),
                Figures.Three(stratum.LongAxisKm),
                Figures.Three(stratum.ShortAxisKm),
                Figures.Bearing(stratum.LongAxisBearing),
                stratum.ConvergenceDegrees.ToString("+0.0;−0.0;0.0", CultureInfo.InvariantCulture),
            ]),
        ]);

    private static string PartsPerMillion(Stratum stratum)
        => (((stratum.AreaKm2 / stratum.GeodesicAreaKm2) - 1) * 1e6).ToString("0.000;−0.000;0.000", CultureInfo.InvariantCulture);
}
