using System.Globalization;
using BenchmarkDotNet.Running;
using SurveyPlanner.Benchmarks;
using SurveyPlanner.Benchmarks.Effort;

switch (args)
{
    case ["detection-fits"]:
        DetectionFitStudy.Run(Console.Out);
        DetectionFitStudy.RunTerms(Console.Out);
        break;
    case ["chosen-widths"]:
        ChosenWidthStudy.Run(Console.Out);
        break;
    case ["detection-parts"]:
        DetectionPartStudy.Run(Console.Out);
        break;
    case ["chosen-model-intervals"]:
        ChosenModelIntervalStudy.Run(Console.Out);
        break;
    case ["pilot-intervals"]:
        PilotIntervalStudy.Run(Console.Out, 2000);
        break;
    case ["pilot-intervals", var pilots]:
        PilotIntervalStudy.Run(Console.Out, int.Parse(pilots, CultureInfo.InvariantCulture));
        break;
    case ["interval-constructions"]:
        IntervalConstructionStudy.Run(Console.Out);
        break;
    case ["coverage-memory", .. var choices]:
        CoverageMemory.Run(choices);
        break;
    case [var option, ..] when option.StartsWith("--", StringComparison.Ordinal):
        BenchmarkSwitcher.FromAssembly(typeof(CoverageMemory).Assembly).Run(args);
        break;
    default:
        Console.Error.WriteLine("Give the name of a study: detection-fits, chosen-widths, detection-parts, chosen-model-intervals, pilot-intervals [PILOTS], interval-constructions, coverage-memory [KIND THREADS CELLS VERTICES]; or options of BenchmarkDotNet, such as --filter '*'.");
        break;
}
