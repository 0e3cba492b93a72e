namespace SurveyPlanner.Numerics;

/// <summary>
/// The log-normal interval of a density: from D / C to D C. Source: Buckland and others 1993, Distance Sampling, section 3.6 (from memory).
/// </summary>
public static class LogNormalInterval
{
    /// <summary>
    /// C = exp(t sqrt(ln(1 + cv²))), t the Student quantile with these degrees of freedom (may be fractional, at least 1),
    /// or the normal one when they are null. Accuracy: 1e-10, held in the tests.
    /// </summary>
    public static double Factor(double cv, double? degreesOfFreedom, double confidence = 0.95)
        => Math.Exp(StudentQuantile.At((1 + confidence) / 2, degreesOfFreedom) * Math.Sqrt(Math.Log(1 + (cv * cv))));
}
