using SurveyPlanner.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>What the fits by general maximisation share: from a maximum to a result with standard errors.</summary>
/// <param name="Model">The model.</param>
/// <param name="FunctionAt">The detection function at a point of the search.</param>
/// <param name="Lower">Lower bounds of the search.</param>
/// <param name="Upper">Upper bounds of the search.</param>
/// <param name="BoundMeaning">What it means when the search ends on a bound at this point, one sentence.</param>
internal sealed record BoxFit(
    DetectionModel Model, Func<double[], DetectionFunction> FunctionAt, double[] Lower, double[] Upper, Func<double[], string> BoundMeaning)
{
    public DetectionFit Fit(DistanceSample data, Func<double[], double> logLikelihood, double[] start)
    {
        var n = data.Distances.Length;
        if (n <= start.Length)
        {
            return DetectionFit.Failed(Model, n, $"{n} distances are too few for {start.Length} parameters.");
        }

        var maximum = SmallOptimiser.Maximise(logLikelihood, start, Lower, Upper);
        if (!maximum.Converged)
        {
            return DetectionFit.Failed(Model, n, "The search for the best fit found no maximum; leave this model out or give more distances.");
        }

        var function = FunctionAt(maximum.Point);
        var isFlat = DetectionFit.FallsOffNowhere(function, data.Truncation);
        var onBound = maximum.OnBound || isFlat;

        // Standard errors belong to a maximum inside the box; at its edge the likelihood still rises and its curvature says nothing of them.
        var covariance = onBound ? null : SmallOptimiser.Inverse(maximum.Information);
        var effective = function.Effective(data.Truncation, data.IsPoints);
        return new DetectionFit(
            Model,
            onBound ? FitStatus.OnBound : FitStatus.Converged,
            isFlat ? DetectionFit.FlatMeaning : onBound ? BoundMeaning(maximum.Point) : "Converged.",
            n,
            function,
            [.. function.Parameters.Select((parameter, i) => new FittedParameter(
                parameter.Name, parameter.Value, StandardError(point => FunctionAt(point).Parameters[i].Value)))],
            data.LogLikelihood(function),
            data.IsPoints ? Math.Sqrt(effective) : effective,
            StandardError(point => FunctionAt(point).Effective(data.Truncation, data.IsPoints)) / effective)
        {
            IsFlat = isFlat,
        };

        double? StandardError(Func<double[], double> quantity)
            => covariance is null ? null : Math.Sqrt(SmallOptimiser.DeltaVariance(quantity, maximum, covariance, Lower, Upper));
    }
}
