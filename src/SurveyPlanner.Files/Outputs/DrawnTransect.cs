using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>A transect as map programs draw it: parts with edges straight in longitude and latitude, none of which crosses 180°.</summary>
/// <param name="Planned">The transect and its stratum.</param>
/// <param name="Parts">In order of travel, longitudes in [-180, 180]; a point is one part of one position.</param>
/// <param name="Coverage">Mean coverage along it; null where that was not worked out or does not apply.</param>
internal sealed record DrawnTransect(PlannedTransect Planned, ImmutableArray<ImmutableArray<LonLat>> Parts, double? Coverage)
{
    public string Id => Planned.Transect.Id;

    public string Stratum => PlainText.WellFormed(Planned.StratumName);

    /// <summary>Order of visit; null for a spare point.</summary>
    public int? Order => Planned.IsReserve ? null : Planned.Transect.Order;

    /// <summary>Place of a spare point in its stratum's list; null for a transect to be visited.</summary>
    public int? Reserve => Planned.IsReserve ? Planned.Transect.Order : null;

    public bool IsPoint => Planned.Transect.IsPoint;

    public double? LengthMetres => IsPoint ? null : Planned.Transect.LengthMetres;

    public double? BearingDegrees => Planned.Transect.BearingDegrees;

    /// <summary>All transects of the survey in order of visit.</summary>
    public static IReadOnlyList<DrawnTransect> All(SurveyPlan plan, bool withCoverage) =>
    [
        .. PlannedTransect.InOrder(plan).Select(planned => new DrawnTransect(
            planned,
            [.. planned.Transect.Pieces.SelectMany(piece => AntimeridianCut.Cut(LonLatPath.Of(piece, plan.Region.Projection, planned.HalfWidthMetres)))],
            withCoverage ? planned.Coverage : null)),
    ];
}
