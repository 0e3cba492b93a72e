using SurveyPlanner.Benchmarks.Effort;

switch (args)
{
    case ["detection-fits"]:
        DetectionFitStudy.Run(Console.Out);
        break;
    default:
        Console.Error.WriteLine("Give the name of a study: detection-fits.");
        break;
}
