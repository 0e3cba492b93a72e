namespace SurveyPlanner.Effort;

/// <summary>
/// The published relation of effort and precision: effort = (b / cv²) / encounter rate. Source: Buckland and others 2001, Introduction to
/// Distance Sampling, section 7.2 (from memory). Assumption: the whole variance of the density falls as 1 / effort.
/// Units: effort in kilometres of line or visits to points, the rate in detections per that unit; cv is a fraction.
/// </summary>
public static class EffortFormula
{
    /// <summary>The value of b advised where no pilot gives one. Published range for lines: about 1.5 to 3 (Burnham, Anderson and Laake 1980), 2 to 4 (Eberhardt 1978).</summary>
    public const double DefaultB = 3;

    /// <summary>b = n cv²: detections times the squared coefficient of variation of density they gave.</summary>
    public static double B(double detections, double cv) => detections * cv * cv;

    /// <summary>Effort that reaches a coefficient of variation. The rate is above 0.</summary>
    public static double EffortFor(double cv, double b, double encounterRate) => b / (cv * cv) / encounterRate;

    /// <summary>The coefficient of variation that an effort delivers.</summary>
    public static double CvAt(double effort, double b, double encounterRate) => Math.Sqrt(b / (effort * encounterRate));
}
