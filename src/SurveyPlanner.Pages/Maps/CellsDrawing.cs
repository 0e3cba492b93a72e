using System.Globalization;
using System.Text;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// The cells of a stratum's coverage on a drawing: neighbours of one class in a row are one rectangle, and rectangles of one class are one path,
/// in whole numbers of cells under one transform. Ten thousand cells come to some ten kilobytes.
/// </summary>
/// <param name="Transform">From cells to pixels.</param>
/// <param name="Paths">A path for each class that occurs, but for places without coverage: there the hatch below shows.</param>
public sealed record CellsDrawing(string Transform, IReadOnlyList<(int Class, string Path)> Paths)
{
    public static CellsDrawing Of(StratumCoverage coverage, MapFrame frame)
    {
        var grid = new TurnedFrame(coverage.RowBearingRadians);
        var turned = coverage.Cells
            .Select(cell => (Place: grid.ToFrame(cell.SquareCentre.X, cell.SquareCentre.Y), Class: CoverageClasses.Of(cell, coverage.Nominal)))
            .ToArray();
        if (turned.Length == 0)
        {
            return new CellsDrawing("", []);
        }

        var (size, u0, v0) = (coverage.CellSizeMetres, turned.Min(cell => cell.Place.X), turned.Min(cell => cell.Place.Y));
        var paths = turned
            .Select(cell => (Column: (int)Math.Round((cell.Place.X - u0) / size), Row: (int)Math.Round((cell.Place.Y - v0) / size), cell.Class))
            .Where(cell => cell.Class != CoverageClasses.Never)
            .GroupBy(cell => cell.Class)
            .OrderBy(group => group.Key)
            .Select(group => (group.Key, Runs(group.Select(cell => (cell.Row, cell.Column)))));

        // The corner of the first cell, and the steps to the next column and row.
        var corner = frame.ToPixel(grid.ToPlane(u0 - (size / 2), v0 - (size / 2)));
        var step = size / frame.MetresPerPixel;
        var (sin, cos) = Math.SinCos(coverage.RowBearingRadians);
        return new CellsDrawing(Matrix(cos * step, -sin * step, -sin * step, -cos * step, corner.X, corner.Y), [.. paths]);
    }

    private static string Runs(IEnumerable<(int Row, int Column)> cells)
    {
        var text = new StringBuilder();
        foreach (var row in cells.GroupBy(cell => cell.Row).OrderBy(row => row.Key))
        {
            var columns = row.Select(cell => cell.Column).Order().ToArray();
            for (var i = 0; i < columns.Length;)
            {
                var end = i + 1;
                while (end < columns.Length && columns[end] == columns[end - 1] + 1)
                {
                    end++;
                }

                text.Append(CultureInfo.InvariantCulture, $"M{columns[i]} {row.Key}h{end - i}v1h{i - end}z");
                i = end;
            }
        }

        return text.ToString();
    }

    private static string Matrix(params double[] numbers)
        => $"matrix({string.Join(' ', numbers.Select(number => number.ToString("0.#####", CultureInfo.InvariantCulture)))})";
}
