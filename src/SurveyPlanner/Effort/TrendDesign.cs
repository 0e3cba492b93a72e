namespace SurveyPlanner.Effort;

/// <summary>How abundance changes over the years.</summary>
public enum TrendShape
{
    /// <summary>By the same share of what is left every year; tested by regression of the logarithm on time.</summary>
    Exponential,

    /// <summary>By the same share of the first year's abundance every year; tested by regression of abundance on time.</summary>
    Linear,
}

/// <summary>How the coefficient of variation of an estimate depends on abundance A.</summary>
public enum TrendCvModel
{
    /// <summary>The same at any abundance.</summary>
    Constant,

    /// <summary>In proportion to 1/√A: the rarer, the less precise. Distance sampling at fixed effort comes near this.</summary>
    InverseRootOfAbundance,

    /// <summary>In proportion to √A.</summary>
    RootOfAbundance,
}

/// <summary>A monitoring programme whose power is asked for.</summary>
/// <param name="FirstCv">Coefficient of variation of the first survey.</param>
/// <param name="Shape">How abundance changes.</param>
/// <param name="CvModel">How precision depends on abundance.</param>
/// <param name="SignificanceLevel">α of the test.</param>
/// <param name="OneSided">Whether the test looks for a change in the expected direction only.</param>
/// <param name="YearsBetweenSurveys">Years from one survey to the next.</param>
/// <param name="Seed">Seed of the simulated series, where power is simulated.</param>
public sealed record TrendDesign(
    double FirstCv,
    TrendShape Shape = TrendShape.Exponential,
    TrendCvModel CvModel = TrendCvModel.Constant,
    double SignificanceLevel = 0.05,
    bool OneSided = false,
    double YearsBetweenSurveys = 1,
    ulong Seed = 0)
{
    /// <summary>Whether the noncentral t gives the power exactly: log-normal estimates of constant cv about an exponential trend.</summary>
    public bool IsExact => Shape == TrendShape.Exponential && CvModel == TrendCvModel.Constant;

    internal void Validate()
    {
        var problems = new List<Problem>();
        Require(FirstCv > 0 && FirstCv <= 2, "trend.cv", "The coefficient of variation of a survey is a fraction above 0 and at most 2, such as 0.2.");
        Require(SignificanceLevel > 0 && SignificanceLevel < 0.5, "trend.alpha", "The significance level is a fraction above 0 and below 0.5, such as 0.05.");
        Require(YearsBetweenSurveys > 0 && YearsBetweenSurveys <= 100, "trend.interval", "The years between surveys are a number above 0 and at most 100.");
        if (problems.Count > 0)
        {
            throw new InputException(problems);
        }

        void Require(bool holds, string key, string message)
        {
            if (!holds)
            {
                problems.Add(new Problem(message, Key: key));
            }
        }
    }
}

/// <summary>How a power was computed.</summary>
public enum TrendMethod
{
    /// <summary>By the noncentral t, exactly.</summary>
    NoncentralT,

    /// <summary>By simulated series.</summary>
    Simulation,
}

/// <summary>The chance that the surveys show a change.</summary>
/// <param name="ChangePerYear">Change a year, a fraction: -0.05 is a decline of 5 % (of what is left, or of the first year's abundance).</param>
/// <param name="Surveys">Number of surveys.</param>
/// <param name="Years">Years from the first survey to the last.</param>
/// <param name="TotalChange">Change from the first survey to the last, a fraction of the first.</param>
/// <param name="Power">Probability that the test finds it.</param>
/// <param name="Method">How that was computed.</param>
/// <param name="StandardError">Monte Carlo standard error of a simulated power; null for an exact one.</param>
/// <param name="NoncentralT">The noncentral t form, an approximation where it is not exact.</param>
/// <param name="NormalApproximation">Gerrodette's normal form, too high with few surveys.</param>
public sealed record TrendFigure(
    double ChangePerYear,
    int Surveys,
    double Years,
    double TotalChange,
    double Power,
    TrendMethod Method,
    double? StandardError,
    double NoncentralT,
    double NormalApproximation);
