using SurveyPlanner.Cli;

return Application.Run(args, Terminal.OfProcess());
