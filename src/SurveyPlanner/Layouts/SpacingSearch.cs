namespace SurveyPlanner.Layouts;

/// <summary>
/// The spacing at which the expected effort of a kind without a closed form is what was asked for. Effort falls roughly as a power of the
/// spacing, so the search runs on logarithms: secant steps, kept between the nearest spacings known to be too small and too large.
/// Accuracy: 1e-6 of the length; of the number what the draws of the integral resolve, 1e-3.
/// </summary>
internal static class SpacingSearch
{
    private const int MaxRounds = 40;

    // A tenth of the draws brings the search near, all of them finish it.
    private const int CoarseDraws = 101;
    private const double CoarseAccuracy = 1e-3;

    public static double ForLength(StratumFrame stratum, Func<double, LayoutGenerator> at, double metres, double guess)
        => Find(stratum, (spacing, draws) => EffortIntegral.Over(at(spacing), out _, draws).Mean, metres, guess, accuracy: 1e-7);

    public static double ForNumber(StratumFrame stratum, Func<double, LayoutGenerator> at, double count, double guess)
    {
        double Expected(double spacing, int draws)
        {
            EffortIntegral.Over(at(spacing), out var mean, draws);
            return mean;
        }

        return Find(stratum, Expected, count, guess, accuracy: 1e-4);
    }

    private static double Find(StratumFrame stratum, Func<double, int, double> effortAt, double target, double guess, double accuracy)
    {
        var spacing = guess;
        foreach (var (draws, enough) in new[] { (CoarseDraws, CoarseAccuracy), (EffortIntegral.Draws, accuracy) })
        {
            spacing = Find(stratum, tried => Math.Log(effortAt(tried, draws) / target), spacing, enough);
        }

        return spacing;
    }

    /// <summary>The spacing at which the error, which falls as spacing grows, is nearly 0; one beyond the stratum when that is too small still.</summary>
    private static double Find(StratumFrame stratum, Func<double, double> errorAt, double guess, double accuracy)
    {
        var (tooSmall, tooLarge) = (0.0, double.PositiveInfinity);
        var (last, lastError) = (double.NaN, double.NaN);
        var spacing = guess;
        for (var round = 0; round < MaxRounds && tooLarge / tooSmall > 1 + 1e-9; round++)
        {
            if (tooSmall >= stratum.ExtentAcross)
            {
                // Nothing to search out there: the kind itself refuses such a spacing with its reason.
                return 2 * stratum.ExtentAcross;
            }

            spacing = Math.Min(spacing, stratum.ExtentAcross);
            var error = errorAt(spacing);
            if (Math.Abs(error) < accuracy)
            {
                break;
            }

            (tooSmall, tooLarge) = error > 0 ? (spacing, tooLarge) : (tooSmall, spacing);
            var slope = (error - lastError) / Math.Log(spacing / last);
            var next = spacing * Math.Exp(-error / (slope < -0.1 ? slope : -1));
            (last, lastError) = (spacing, error);
            spacing = next > tooSmall && next < tooLarge ? next : Math.Sqrt(tooSmall * Math.Min(tooLarge, 4 * spacing));
        }

        return spacing;
    }
}
