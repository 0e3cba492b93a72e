using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A fixed number of points drawn one after the other as an ordered list: the first are the sample, the rest are the reserve.
/// </summary>
internal abstract class ListedPoints(StratumFrame stratum, LayoutDesign design, int count)
    : LayoutGenerator(stratum, design, Math.Sqrt(stratum.Clip.AreaSquareMetres / count))
{
    /// <summary>Number of points, the same in every draw.</summary>
    public int Count { get; } = count;

    public override ReadOnlySpan<double> OffsetRanges => [];

    public override double NominalCoverage
        => Math.Min(1, Count * Math.PI * Stratum.HalfWidthMetres * Stratum.HalfWidthMetres / Stratum.Clip.AreaSquareMetres);

    public override bool StripsMayOverlap => true;

    public override double? ExpectedLength => null;

    public override double? ExpectedCount => Count;

    public override int ReserveCount => Design.Reserve;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
        => AddList(0, Count, ref random, output);

    public override void RealiseReserve(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
        => AddList(Count, ReserveCount, ref random, output);

    /// <summary>Adds places of the list that the stream yields: so many, after so many that are passed over.</summary>
    protected abstract void AddList(int passedOver, int count, ref PhiloxStream random, PieceBuffer output);

    protected static int CountFor(StratumFrame stratum, LayoutDesign design)
    {
        var wanted = design.Sizing switch
        {
            Sizing.Spacing spacing => stratum.Clip.AreaSquareMetres / (spacing.Metres * spacing.Metres),
            Sizing.Number number => number.Count,
            _ => throw SizingRules.NotForPoints(stratum, design),
        };
        if (design.Sizing is Sizing.Spacing given)
        {
            SizingRules.RefuseTooCoarse(stratum, design, given.Metres, Math.Max(stratum.ExtentAcross, stratum.ExtentAlong));
        }

        SizingRules.RefuseTooMany(stratum, design, wanted + design.Reserve);
        return SizingRules.WholeNumber(wanted);
    }
}
