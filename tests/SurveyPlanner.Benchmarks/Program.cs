using System.Globalization;
using SurveyPlanner.Benchmarks.Effort;

switch (args)
{
    case ["detection-fits"]:
        DetectionFitStudy.Run(Console.Out);
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
    default:
        Console.Error.WriteLine("Give the name of a study: detection-fits, pilot-intervals [PILOTS], interval-constructions.");
        break;
}
