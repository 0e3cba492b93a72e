namespace SurveyPlanner.Pilots;

/// <summary>The hazard-rate model, searched in ln σ and ln b. The start is at two thirds of the mean distance with a middling shape.</summary>
internal static class HazardRateFit
{
    /// <summary>Below 1 the function has a spike instead of a shoulder at distance 0.</summary>
    private const double LeastShape = 1;

    /// <summary>Beyond this the function is a strip of width σ.</summary>
    private const double GreatestShape = 50;

    private const double WidestSigma = 10;
    private const double NarrowestSigma = 1e-3;

    public static DetectionFit Fit(DistanceSample data)
    {
        var n = data.Distances.Length;
        var mean = data.Distances.Average();
        if (mean == 0)
        {
            return DetectionFit.Failed(DetectionModel.HazardRate, n, "All distances are 0, so no width can be estimated; were distances written down?");
        }

        var w = data.Truncation;
        var logs = data.Distances.Select(Math.Log).ToArray();
        double[] lower = [Math.Log(NarrowestSigma * w), Math.Log(LeastShape)];
        double[] upper = [Math.Log(WidestSigma * w), Math.Log(GreatestShape)];
        var fit = new BoxFit(
            DetectionModel.HazardRate,
            FunctionAt,
            lower,
            upper,
            "A parameter is at its bound: the distances show either no shoulder or no fall-off that this model could tell from a strip.");
        double[] start = [Math.Clamp(Math.Log((data.IsPoints ? 1 : 1.3) * mean), lower[0], upper[0]), Math.Log(3)];
        return fit.Fit(data, LogLikelihood, start);

        double LogLikelihood(double[] point)
        {
            var shape = Math.Exp(point[1]);
            var sum = 0.0;
            foreach (var log in logs)
            {
                // ln(1 - e^-t): for large distances t is small and 1 - e^-t loses digits, so its series takes over.
                var t = Math.Exp(-shape * (log - point[0]));
                sum += t > 1e-5 ? Math.Log(1 - Math.Exp(-t)) : Math.Log(t) - (t / 2);
            }

            return sum - (n * Math.Log(FunctionAt(point).Effective(w, data.IsPoints)));
        }
    }

    private static HazardRateDetection FunctionAt(double[] point) => new(Math.Exp(point[0]), Math.Exp(point[1]));
}
