namespace SurveyPlanner.Pilots;

/// <summary>
/// One and two cosine terms, the better by AIC. Coefficients stay where the function falls everywhere and is nowhere below 0: a_1 from 0 to 1
/// with one term; with two the triangle (0, 0), (4/3, 1/3), (4/5, -1/5), searched as share s of the way from the first corner to the
/// point t of the opposite side. The search runs in -ln(1 - s), in which the likelihood stays smooth up to the far bound.
/// </summary>
internal static class UniformCosineFit
{
    /// <summary>
    /// How far towards the far bounds the search goes: g at the truncation distance then stays above 0.0005. Where it is 0, the likelihood
    /// falls off a cliff for a distance just short of it.
    /// </summary>
    private const double Farthest = 0.999;

    /// <summary>Half way to the far bound.</summary>
    private static readonly double Start = Math.Log(2);

    public static DetectionFit Fit(DistanceSample data)
    {
        var (one, two) = (Fit(data, 1), Fit(data, 2));
        return two.Aic < one.Aic ? two : one;
    }

    /// <summary>With this many terms, one or two.</summary>
    public static DetectionFit Fit(DistanceSample data, int terms)
    {
        var w = data.Truncation;
        var first = data.Distances.Select(x => Math.Cos(Math.PI * x / w)).ToArray();
        var second = data.Distances.Select(x => Math.Cos(2 * Math.PI * x / w)).ToArray();
        var fit = new BoxFit(
            DetectionModel.UniformCosine,
            point => new UniformCosineDetection(w, [.. Coefficients(point)]),
            [.. Enumerable.Repeat(0.0, terms)],
            terms == 1 ? [-Math.Log(1 - Farthest)] : [-Math.Log(1 - Farthest), 1],
            _ => "Beyond this the function would rise with distance or fall below 0.");
        return fit.Fit(data, LogLikelihood, terms == 1 ? [Start] : [Start, 0.5]);

        double LogLikelihood(double[] point)
        {
            var a = Coefficients(point);
            var sum = 0.0;
            for (var i = 0; i < first.Length; i++)
            {
                sum += Math.Log(1 + (a[0] * first[i]) + (a.Length > 1 ? a[1] * second[i] : 0));
            }

            // Only the odd term has an integral over the plane that is not 0: 2 a_1 (-2) / π².
            var scale = data.IsPoints ? w * w * (1 - (4 * a[0] / (Math.PI * Math.PI))) : w;
            return sum - (first.Length * Math.Log(scale));
        }
    }

    private static double[] Coefficients(double[] point)
    {
        var s = 1 - Math.Exp(-point[0]);
        if (point.Length == 1)
        {
            return [s];
        }

        var t = point[1];
        return [s * (((1 - t) * 4 / 3) + (t * 4 / 5)), s * (((1 - t) / 3) - (t / 5))];
    }
}
