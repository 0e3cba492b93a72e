Console.WriteLine("survey-planner");
