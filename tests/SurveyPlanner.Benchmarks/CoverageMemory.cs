using System.Diagnostics;
using System.Globalization;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Benchmarks;

/// <summary>Peak memory of a process that works out everything about the coverage of one stratum.</summary>
internal static class CoverageMemory
{
    /// <param name="args">Kind of layout, threads, cells and vertices; all may be left out.</param>
    public static void Run(string[] args)
    {
        var kind = args.Length > 0 ? Enum.Parse<LayoutKind>(args[0]) : LayoutKind.Parallel;
        int Number(int index, int otherwise) => args.Length > index ? int.Parse(args[index], CultureInfo.InvariantCulture) : otherwise;
        var (threads, cells, vertices) = (Number(1, 1), Number(2, 1_000_000), Number(3, 100_000));
        var layout = CoverageScene.Layout(CoverageScene.Island(vertices), kind);
        var projection = new AzimuthalEqualArea(new LonLat(10, 60));
        var drawn = LayoutDrawer.Draw([layout], projection, CoverageScene.Seed)[0];
        var before = Peak();
        var watch = Stopwatch.StartNew();
        var coverage = new CoverageCalculator(new CoverageDesign(), CoverageScene.Seed, threads, CancellationToken.None)
            .OfStratum(layout, drawn, projection, CoverageScene.CellSize(layout, cells), 0, null);
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{kind}, {threads} thread(s), {coverage.Cells.Length} cells, {vertices} vertices, {coverage.Replicates} draws: {watch.Elapsed.TotalSeconds:0.00} s, peak {Peak():0} MB (before: {before:0} MB)"));
    }

    private static double Peak()
    {
        using var process = Process.GetCurrentProcess();
        return process.PeakWorkingSet64 / 1e6;
    }
}
