using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>
/// Power of equally spaced surveys to show a change in abundance, by least-squares regression and a t test.
/// Assumptions: estimates of different surveys are independent and log-normal about the trend; no variation of abundance about the trend beside it.
/// Accuracy: exact by the noncentral t for an exponential trend of constant cv; otherwise 20,000 simulated series, standard error at most 0.0036.
/// References: Gerrodette 1987, Ecology 68:1364-1372; Link and Hatfield 1990, Ecology 71:1217-1220; Gerrodette 1991, Ecology 72:1889-1892.
/// </summary>
public static class TrendPower
{
    /// <summary>Simulated series behind a power.</summary>
    public const int Replicates = 20_000;

    /// <summary>A regression with a variance needs three surveys.</summary>
    public const int FewestSurveys = 3;

    /// <summary>Where the search for the number of surveys stops.</summary>
    public const int MostSurveys = 100;

    private const double SmallestChangeTried = 0.001;

    /// <summary>Power to find a change of this much a year; null where a decline would leave nothing before the last survey.</summary>
    /// <param name="design">The programme.</param>
    /// <param name="changePerYear">A fraction, negative for a decline.</param>
    /// <param name="surveys">Number of surveys, 3 or more.</param>
    /// <exception cref="InputException">The programme makes no sense, or there are fewer than 3 surveys.</exception>
    public static TrendFigure? At(TrendDesign design, double changePerYear, int surveys)
    {
        design.Validate();
        if (surveys is < FewestSurveys or > 10_000)
        {
            throw new InputException(new Problem($"A trend wants from {FewestSurveys} to 10000 surveys, and {surveys} are given.", Key: "trend.surveys"));
        }

        if (!double.IsFinite(changePerYear))
        {
            throw new InputException(new Problem("The change a year is a number, such as -0.05 for a decline of 5 %.", Key: "trend.change"));
        }

        if (TrendSeries.Of(design, changePerYear, surveys) is not { } series)
        {
            return null;
        }

        var exact = design.IsExact;
        var power = exact ? series.NoncentralTPower : series.SimulatedPower(Replicates);
        return new TrendFigure(
            changePerYear,
            surveys,
            (surveys - 1) * design.YearsBetweenSurveys,
            series.Abundances[^1] - 1,
            power,
            exact ? TrendMethod.NoncentralT : TrendMethod.Simulation,
            exact ? null : Math.Sqrt(power * (1 - power) / Replicates),
            series.NoncentralTPower,
            series.NormalPower);
    }

    /// <summary>Powers for every pair of a change and a number of surveys, changes in the outer order; null where nothing would be left.</summary>
    public static ImmutableArray<ImmutableArray<TrendFigure?>> Table(TrendDesign design, IEnumerable<double> changesPerYear, IReadOnlyCollection<int> surveys)
        => [.. changesPerYear.Select(change => surveys.Select(n => At(design, change, n)).ToImmutableArray())];

    /// <summary>
    /// The smallest change a year that these surveys find with this power, of one direction; null where no change of it does (a steep decline
    /// leaves nothing to count, and may leave it too imprecise).
    /// </summary>
    public static TrendFigure? SmallestChange(TrendDesign design, int surveys, double power, bool decline)
    {
        var (low, high) = (0.0, SmallestChangeTried);
        while (!Finds(high))
        {
            low = high;
            high *= 1.25;
            if (high > (decline ? 1 : 100))
            {
                return null;
            }
        }

        // Halving to a thousandth of the change, finer than simulation can tell.
        while (high - low > 1e-3 * high)
        {
            var middle = (low + high) / 2;
            (low, high) = Finds(middle) ? (low, middle) : (middle, high);
        }

        return At(design, decline ? -high : high, surveys);

        bool Finds(double change) => At(design, decline ? -change : change, surveys) is { } figure && figure.Power >= power;
    }

    /// <summary>The fewest surveys that find this change a year with this power; null where 100 do not, or nothing would be left to count.</summary>
    public static TrendFigure? SurveysNeeded(TrendDesign design, double changePerYear, double power)
        => Enumerable.Range(FewestSurveys, MostSurveys - FewestSurveys + 1)
            .Select(surveys => At(design, changePerYear, surveys))
            .TakeWhile(figure => figure is not null)
            .FirstOrDefault(figure => figure!.Power >= power);
}
