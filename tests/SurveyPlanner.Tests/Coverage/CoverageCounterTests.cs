using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>Counts held against asking every place of every draw, piece by piece.</summary>
public class CoverageCounterTests
{
    /// <summary>Half-widths beyond half the spacing, so that strips overlap, turn sharply and run into each other from row to row.</summary>
    [Theory]
    [InlineData(LayoutKind.Parallel, 300, false)]
    [InlineData(LayoutKind.Parallel, 1500, true)]
    [InlineData(LayoutKind.Zigzag, 300, true)]
    [InlineData(LayoutKind.Zigzag, 1500, true)]
    [InlineData(LayoutKind.PointGrid, 900, false)]
    [InlineData(LayoutKind.PointGrid, 1500, true)]
    public void Every_place_is_counted_as_often_as_it_is_covered(LayoutKind kind, double halfWidth, bool overlaps)
    {
        const int draws = 25;
        foreach (var stratum in RandomShapes.Sample(8))
        {
            var generator = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(2_000, halfWidth, kind));
            foreach (var grid in new[] { CellGridBuilder.Build(generator.Stratum.Region, 700), Scattered(generator) })
            {
                var counts = CoverageSimulation.Run(generator, grid, draws, Judge.Seed, 0, 2, CancellationToken.None);
                var (expectedDraws, expectedTimes, expectedAgain) = OneByOne(generator, grid, draws);
                Assert.Equal(expectedDraws, counts.Draws);
                Assert.Equal(expectedTimes, counts.Times);
                Assert.Equal(expectedAgain, counts.Again);
                Assert.Equal(overlaps, counts.Times.Sum() > counts.Draws.Sum());
            }
        }
    }

    /// <summary>Two hundred places, crowded together so that rows and slots are uneven; twenty share one height.</summary>
    private static CellGrid Scattered(LayoutGenerator generator)
    {
        var (shape, random) = (generator.Stratum.Region, new PhiloxStream(5, 99, 0, 0));
        var places = new (double X, double Y)[200];
        for (var i = 0; i < places.Length; i++)
        {
            var (a, b) = (random.NextDouble(), random.NextDouble());
            places[i] = (shape.MinX + (a * a * a * (shape.MaxX - shape.MinX)), shape.MinY + (i < 20 ? 0.5 : b * b * b) * (shape.MaxY - shape.MinY));
        }

        return CellGrid.OfPlaces(places, out _);
    }

    private static (int[] Draws, int[] Times, int[] Again) OneByOne(LayoutGenerator generator, CellGrid grid, int draws)
    {
        var (total, times, again, before) = (new int[grid.Count], new int[grid.Count], new int[grid.Count], new bool[grid.Count]);
        var offsets = new StratifiedOffsets(Judge.Seed, 0, draws, generator.OffsetRanges.Length);
        var drawn = new double[generator.OffsetRanges.Length];
        var buffer = new PieceBuffer();

        // Round the circle of offsets: the last draw stands before the first.
        for (var draw = -1; draw < draws; draw++)
        {
            var random = offsets.Fill((draw + draws) % draws, drawn);
            buffer.Clear();
            generator.Realise(drawn, ref random, buffer);
            for (var row = 0; row < grid.RowY.Length; row++)
            {
                for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
                {
                    var covering = CoveringPieces(buffer, grid.X[i], grid.RowY[row], generator.Stratum.HalfWidthMetres);
                    if (draw >= 0)
                    {
                        times[i] += covering;
                        total[i] += covering > 0 ? 1 : 0;
                        again[i] += covering > 0 && before[i] ? 1 : 0;
                    }

                    before[i] = covering > 0;
                }
            }
        }

        return (total, times, again);
    }

    /// <summary>Pieces whose foot of the perpendicular from the place lies on them, no farther than the half-width; points within it.</summary>
    private static int CoveringPieces(PieceBuffer buffer, double x, double y, double halfWidth)
    {
        var covering = 0;
        foreach (var piece in buffer.Pieces)
        {
            var (dx, dy, px, py) = (piece.ToX - piece.FromX, piece.ToY - piece.FromY, x - piece.FromX, y - piece.FromY);
            var length = Math.Sqrt((dx * dx) + (dy * dy));
            var isCovered = length == 0
                ? Math.Sqrt((px * px) + (py * py)) <= halfWidth
                : Math.Abs((px * dy) - (py * dx)) <= halfWidth * length && (px * dx) + (py * dy) >= 0 && (px * dx) + (py * dy) <= length * length;
            covering += isCovered ? 1 : 0;
        }

        return covering;
    }
}
