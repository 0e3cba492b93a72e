using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Which end of a stretch a mark stands at.</summary>
internal enum MarkEnd
{
    Start,
    End,
    Point,

    /// <summary>A spare point.</summary>
    Reserve,
}

/// <summary>A waypoint: where counting starts or stops, or a point to be visited.</summary>
/// <param name="Name">Unique among waypoints, at most 6 of A-Z 0-9 -.</param>
/// <param name="Planned">Its transect.</param>
/// <param name="End">Which end.</param>
/// <param name="Position">Where.</param>
/// <param name="Description">In words: transect, stretch, stratum, bearing.</param>
internal sealed record FieldMark(string Name, PlannedTransect Planned, MarkEnd End, LonLat Position, string Description);

/// <summary>A stretch of line without a break, to be travelled from its start to its end.</summary>
/// <param name="Name">Unique among stretches, at most 6 of A-Z 0-9 -: the transect's id, with a letter where the line has several.</param>
/// <param name="Planned">Its transect.</param>
/// <param name="Piece">Its vertices.</param>
/// <param name="Description">In words: transect, which part of it, stratum.</param>
internal sealed record FieldStretch(string Name, PlannedTransect Planned, TransectPiece Piece, string Description);

/// <summary>
/// The survey as marks and stretches with names that receivers hold. The same for every file, so that names agree between them.
/// </summary>
internal sealed record FieldMarks(ImmutableArray<FieldMark> Marks, ImmutableArray<FieldStretch> Stretches)
{
    public static FieldMarks Of(SurveyPlan plan)
    {
        var transects = PlannedTransect.InOrder(plan);
        var (markNames, stretchNames) = (new ShortNames('W'), new ShortNames('R'));
        var marks = ImmutableArray.CreateBuilder<FieldMark>();
        var stretches = ImmutableArray.CreateBuilder<FieldStretch>();
        foreach (var planned in transects)
        {
            if (planned.Transect.IsPoint)
            {
                var what = planned.IsReserve
                    ? FormattableString.Invariant($"spare point {planned.Transect.Order}, to be used strictly in order")
                    : "point";
                var description = $"{planned.Transect.Id} {PlainText.Clean(planned.StratumName)}, {what}";
                var end = planned.IsReserve ? MarkEnd.Reserve : MarkEnd.Point;
                marks.Add(new FieldMark(markNames.Take(planned.Transect.Id), planned, end, planned.Transect.Start, description));
                continue;
            }

            for (var i = 0; i < planned.Transect.Pieces.Length; i++)
            {
                var wish = planned.Transect.Pieces.Length == 1 ? planned.Transect.Id : planned.Transect.Id + Letter(i);
                var stretch = Stretch(planned, i, stretchNames.Take(wish));
                stretches.Add(stretch);
                marks.Add(Mark(stretch, MarkEnd.Start, markNames.Take(wish + "S")));
                marks.Add(Mark(stretch, MarkEnd.End, markNames.Take(wish + "E")));
            }
        }

        return new FieldMarks(marks.ToImmutable(), stretches.ToImmutable());
    }

    private static FieldStretch Stretch(PlannedTransect planned, int index, string name)
    {
        var (transect, count) = (planned.Transect, planned.Transect.Pieces.Length);
        var part = count == 1 ? "" : $" part {index + 1} of {count}";
        return new FieldStretch(name, planned, transect.Pieces[index], $"{transect.Id}{part} {PlainText.Clean(planned.StratumName)}");
    }

    private static FieldMark Mark(FieldStretch stretch, MarkEnd end, string name)
    {
        var positions = stretch.Piece.Positions;
        var isStart = end == MarkEnd.Start;
        var description = stretch.Description + (isStart ? ", start" : ", end");
        if (isStart && stretch.Planned.Transect.BearingDegrees is { } bearing && stretch.Piece == stretch.Planned.Transect.Pieces[0])
        {
            var whole = Figures.Bearing(Math.Round(bearing));
            description += $", bearing {whole.PadLeft(3, '0')} true";
        }

        return new FieldMark(name, stretch.Planned, end, isStart ? positions[0] : positions[^1], description);
    }

    /// <summary>A, B, … Z, AA, AB, …</summary>
    private static string Letter(int index) =>
        (index >= 26 ? Letter((index / 26) - 1) : "") + (char)('A' + (index % 26));
}
