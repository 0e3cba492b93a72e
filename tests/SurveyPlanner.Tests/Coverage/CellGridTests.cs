using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

public class CellGridTests
{
    [Fact]
    public void Areas_add_up_and_every_place_lies_inside_its_own_cell()
    {
        foreach (var stratum in RandomShapes.Sample(40))
        {
            var shape = new FrameShape(stratum.Shape, new TurnedFrame(0.3));
            var grid = CellGridBuilder.Build(shape, 450);
            var cells = grid.Cells!;
            Assert.Equal(stratum.Shape.AreaSquareMetres, cells.Areas.Sum(), 1e-9 * stratum.Shape.AreaSquareMetres);
            for (var row = 0; row < grid.RowY.Length; row++)
            {
                for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
                {
                    Assert.True(shape.Contains(grid.X[i], grid.RowY[row]));
                    Assert.InRange(Math.Abs(grid.X[i] - cells.ColumnX(cells.Columns[i])), 0, 225 + 1e-6);
                    Assert.InRange(Math.Abs(grid.RowY[row] - cells.RowMiddle(grid.RowY[row])), 0, 225);

                    // Slivers that no look finds a place in are joined to the cell before them.
                    Assert.InRange(cells.Areas[i], 0, 1.5 * 450 * 450);
                }
            }
        }
    }

    [Fact]
    public void Runs_are_those_that_looking_at_every_place_finds()
    {
        foreach (var stratum in RandomShapes.Sample(20))
        {
            var shape = new FrameShape(stratum.Shape, new TurnedFrame(0));
            var grid = CellGridBuilder.Build(shape, 450);
            var random = new PhiloxStream(3, 99, 0, 0);
            for (var n = 0; n < 200; n++)
            {
                var row = (int)random.NextBelow((uint)grid.RowY.Length);
                var x = grid.X.AsSpan(grid.RowStarts[row]..grid.RowStarts[row + 1]);

                // Ends at places themselves too.
                var low = n % 2 == 0 ? x[(int)random.NextBelow((uint)x.Length)] : shape.MinX + (random.NextDouble() * (shape.MaxX - shape.MinX));
                var high = n % 3 == 0 ? x[(int)random.NextBelow((uint)x.Length)] : low + (random.NextDouble() * 9_000);
                var (first, end) = grid.Run(row, low, high);
                var within = Enumerable.Range(0, x.Length).Where(i => grid.X[grid.RowStarts[row] + i] >= low && grid.X[grid.RowStarts[row] + i] <= high);
                Assert.Equal(within.Select(i => grid.RowStarts[row] + i), first < end ? Enumerable.Range(first, end - first) : []);

                var y = shape.MinY - 100 + (random.NextDouble() * (shape.MaxY - shape.MinY + 200));
                var highY = y + (random.NextDouble() * 2_000);
                Assert.Equal((grid.RowY.Count(rowY => rowY < y), grid.RowY.Count(rowY => rowY <= highY)), grid.RowsWithin(y, highY));
                Assert.Equal((row, row + 1), grid.RowsWithin(grid.RowY[row], grid.RowY[row]));
            }
        }
    }

    [Fact]
    public void Two_small_islands_far_apart_take_no_time_for_the_sea_between()
    {
        // A thousand kilometres apart on both axes, cells of ten metres: 10^10 squares, of which 200 hold land.
        var islands = PlaneStrata.Of(
            [[[(0, 0), (100, 0), (100, 100), (0, 100)]], [[(1e6, 1e6), (1e6 + 100, 1e6), (1e6 + 100, 1e6 + 100), (1e6, 1e6 + 100)]]]);
        var grid = CellGridBuilder.Build(new FrameShape(islands.Shape, new TurnedFrame(0)), 10);
        Assert.Equal(200, grid.Count);
        Assert.Equal(20_000, grid.Cells!.Areas.Sum(), 1e-6);
    }

    [Fact]
    public void Building_stops_when_told_to()
    {
        using var stop = new CancellationTokenSource();
        stop.Cancel();
        var shape = new FrameShape(PlaneStrata.Rectangle(1000, 1000).Shape, new TurnedFrame(0));
        Assert.Throws<OperationCanceledException>(() => CellGridBuilder.Build(shape, 10, stop.Token));
    }
}
