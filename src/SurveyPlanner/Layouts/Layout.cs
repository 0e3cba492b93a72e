using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>
/// One drawn realisation of a design in one stratum.
/// </summary>
/// <param name="Stratum">The stratum's name.</param>
/// <param name="Design">The design it was drawn from.</param>
/// <param name="BearingDegrees">True bearing of its lines at the stratum's centre, degrees in [0, 180) (for points, and segments with bearings of their own: of the grid's rows).</param>
/// <param name="SpacingMetres">The spacing that the sizing came to, metres.</param>
/// <param name="OffsetMetres">The random offset(s) drawn, metres: across the lines; grids have two, along their rows and across them;
/// a zigzag has the share of its period, along its axis; kinds without a start for the whole have none.</param>
/// <param name="Transects">Lines or points in the order to be visited.</param>
/// <param name="ExpectedLengthMetres">Lines: expected total length over the random offset, metres in the plane. Null for points.</param>
/// <param name="ExpectedCount">Expected number of points; for lines, of lines.</param>
/// <param name="Spread">How the effort varies over the random offset.</param>
/// <param name="Notices">Warnings about this design in this stratum.</param>
public sealed record Layout(
    string Stratum,
    LayoutDesign Design,
    double BearingDegrees,
    double SpacingMetres,
    ImmutableArray<double> OffsetMetres,
    ImmutableArray<Transect> Transects,
    double? ExpectedLengthMetres,
    double ExpectedCount,
    EffortSpread Spread,
    ImmutableArray<Notice> Notices)
{
    /// <summary>
    /// Spare points, to be used strictly in this order, each for the next point that cannot be visited; their <see cref="Transect.Order"/> counts
    /// from 1 within this list. Empty unless the design asks for them.
    /// </summary>
    public ImmutableArray<Transect> Reserve { get; init; } = [];

    /// <summary>Total length of the drawn lines on the ellipsoid, metres; 0 for points.</summary>
    public double TotalLengthMetres => Transects.Sum(transect => transect.LengthMetres);
}

/// <summary>
/// How the effort of one draw varies over the random offset: total length in metres for lines, number for points.
/// Found by drawing the layout at many offsets spread evenly over their range.
/// </summary>
public sealed record EffortSpread(double Mean, double StandardDeviation, double Smallest, double Largest);

/// <summary>
/// One line or point of a layout. A line that the region cuts has several pieces and stays one transect.
/// </summary>
/// <param name="Id">Unique in the survey, at most 6 of A-Z 0-9 -.</param>
/// <param name="Order">Order of visit in the whole survey, from 1.</param>
/// <param name="Pieces">Lines: each piece as its vertices in order of travel. Points: one piece with one vertex.</param>
/// <param name="LengthMetres">Length on the ellipsoid over all pieces, metres; 0 for a point.</param>
/// <param name="BearingDegrees">True bearing at its start, degrees in [0, 360); null for a point.</param>
public sealed record Transect(
    string Id,
    int Order,
    ImmutableArray<TransectPiece> Pieces,
    double LengthMetres,
    double? BearingDegrees)
{
    public bool IsPoint => Pieces[0].Plane.Length == 1;

    public LonLat Start => Pieces[0].Positions[0];

    public LonLat End => Pieces[^1].Positions[^1];
}

/// <summary>A stretch of a transect without a break: the same vertices in the plane (metres) and in degrees.</summary>
public sealed record TransectPiece(ImmutableArray<PlanePoint> Plane, ImmutableArray<LonLat> Positions);
