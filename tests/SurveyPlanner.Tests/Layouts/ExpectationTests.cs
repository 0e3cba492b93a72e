using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>What is stated about the random draw of every kind, against 10,000 plain draws of it.</summary>
public class ExpectationTests
{
    private const int Draws = 10_000;
    private const ulong Seed = 20270401;

    /// <summary>
    /// Within 4 standard errors: over all kinds the chance of a false alarm is below 0.5 %, and the seed is fixed. Kinds without a closed form state
    /// the integral over the offset, computed here with ten times the draws, whose own error is far smaller.
    /// </summary>
    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Mean_effort_is_the_stated_expectation(string kind)
    {
        var generator = LayoutKinds.Prepare(EveryKind.Islands, EveryKind.Designs[kind]);
        var spread = EffortIntegral.Over(generator, out var meanCount, draws: 10_007);
        var (length, count) = (new Sample(), new Sample());
        var (buffer, offsets) = (new PieceBuffer(), new double[generator.OffsetRanges.Length]);
        for (var draw = 0; draw < Draws; draw++)
        {
            var random = new PhiloxStream(Seed, 99, 0, (uint)draw);
            for (var axis = 0; axis < offsets.Length; axis++)
            {
                offsets[axis] = random.NextDouble();
            }

            buffer.Clear();
            generator.Realise(offsets, ref random, buffer);
            length.Add(buffer.TotalLength);
            count.Add(buffer.Transects);
        }

        count.AssertMean(generator.ExpectedCount ?? meanCount);
        if (!generator.Design.IsPoints)
        {
            length.AssertMean(generator.ExpectedLength ?? spread.Mean);
            length.AssertDeviation(spread.StandardDeviation);
        }
    }

    /// <summary>
    /// Kolmogorov's statistic below 1.95 (chance of a false alarm 0.1 %) over 10,000 seeds, of the place of the first transect in its period:
    /// read off what was drawn, not off the offset.
    /// </summary>
    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void The_start_is_uniform_over_its_period(string kind)
    {
        var generator = LayoutKinds.Prepare(EveryKind.Islands, EveryKind.Designs[kind]);
        var parts = Trapezoids.Of(generator.Stratum.Clip);
        var (along, across) = (new double[Draws], new double[Draws]);
        for (var seed = 0; seed < Draws; seed++)
        {
            var realisation = LayoutDrawer.Realise(generator, (ulong)seed, 0);
            (along[seed], across[seed]) = StartOf(generator, realisation.Pieces, realisation.Offsets, parts);
        }

        AssertUniform(across);
        if (generator.OffsetRanges.Length == 2)
        {
            AssertUniform(along);
        }
    }

    /// <summary>Place of a transect, as a share of the period along and across the rows.</summary>
    private static (double Along, double Across) StartOf(
        LayoutGenerator generator, Piece[] pieces, double[] offsets, IReadOnlyList<Trapezoid> parts)
    {
        var clip = generator.Stratum.Clip;
        var ranges = generator.OffsetRanges;
        double Share(double value, double period) => (value / period) - Math.Floor(value / period);
        switch (generator)
        {
            case Zigzag:
                // Turns of the path may lie outside the stratum: the offset itself is looked at.
                return (0, offsets[0]);
            case RandomParallelLines lines:
                return (0, Share(lines.Ranges.PositionOf(pieces[0].FromY), lines.Design.Placement == LinePlacement.OnePerBand ? lines.SpacingMetres : 1));
            case ListedPoints:
                // Some part of the area below the first point: uniform if the point is.
                return (0, AreaBelow(parts, pieces[0].FromY) / clip.AreaSquareMetres);
            case Segments { IsKeptWhole: false }:
            case Loops { IsKeptWhole: false }:
                // The first place of a track that was cut may lie anywhere: only rows can be told from it, and only those walked along.
                return (offsets[0], offsets[1]);
            case PointGrid { Design.Grid: GridShape.Triangular }:
                // Rows are shifted in turn: the second of a pair is told by where the offset puts the first.
                var isSecond = Math.Abs(Share(pieces[0].FromY - clip.MinY, ranges[1]) - offsets[1]) > 0.25;
                return (
                    Share(pieces[0].FromX - clip.MinX - (isSecond ? ranges[0] / 2 : 0), ranges[0]),
                    Share(pieces[0].FromY - clip.MinY - (isSecond ? ranges[1] / 2 : 0), ranges[1]));
            default:
                return ranges.Length == 1
                    ? (0, Share(pieces[0].FromY - clip.MinY, ranges[0]))
                    : (Share(pieces[0].FromX - clip.MinX, ranges[0]), Share(pieces[0].FromY - clip.MinY, ranges[1]));
        }
    }

    private static double AreaBelow(IReadOnlyList<Trapezoid> parts, double y)
        => parts.Sum(part => part.HighY <= y ? part.AreaSquareMetres
            : part.LowY >= y ? 0
            : (y - part.LowY) * (part.LowWidth + ((y - part.LowY) / (part.HighY - part.LowY) * (part.HighWidth - part.LowWidth) / 2)));

    private static void AssertUniform(double[] shares)
    {
        Array.Sort(shares);
        var largest = shares.Select((share, i) => Math.Max(share - ((double)i / Draws), ((i + 1.0) / Draws) - share)).Max();
        Assert.True(largest * Math.Sqrt(Draws) < 1.95, $"Kolmogorov's statistic is {largest * Math.Sqrt(Draws)}");
    }

    private sealed class Sample
    {
        private double _sum;
        private double _squares;
        private double _first = double.NaN;

        public void Add(double value)
        {
            // From the first value: no digits are lost where all are alike.
            _first = double.IsNaN(_first) ? value : _first;
            _sum += value - _first;
            _squares += (value - _first) * (value - _first);
        }

        private double Mean => _first + (_sum / Draws);

        private double Variance => Math.Max(0, (_squares / Draws) - (_sum / Draws * _sum / Draws));

        public void AssertMean(double expected)
        {
            var standardError = Math.Sqrt(Variance / Draws);
            Assert.True(
                Math.Abs(Mean - expected) <= (4 * standardError) + (1e-9 * expected),
                $"mean {Mean}, stated {expected}, {(Mean - expected) / standardError} standard errors");
        }

        /// <summary>Within 6 %: four standard errors of the standard deviation of values with up to five times the kurtosis of a normal one.</summary>
        public void AssertDeviation(double expected)
            => Assert.True(Math.Abs(Math.Sqrt(Variance) - expected) <= (0.06 * expected) + 1e-6, $"deviation {Math.Sqrt(Variance)}, stated {expected}");
    }
}
