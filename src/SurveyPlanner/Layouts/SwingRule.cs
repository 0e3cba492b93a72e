namespace SurveyPlanner.Layouts;

/// <summary>
/// How steeply a zigzag crosses its band, as a function of the band's width: the tangent of the angle between its path and its axis.
/// Derivation: docs/methods/zigzag.md.
/// </summary>
internal abstract class SwingRule
{
    // The path must outrun the side it leaves by this factor, or it would crawl along it.
    private const double Lead = 2;

    // Along parallel sides: the path must still get across at all.
    private const double LeastTangent = 0.05;

    /// <summary>Tangent of the angle to the axis where the band has a width.</summary>
    public abstract double TangentAt(double widthMetres);

    /// <summary>How far the path moves across the axis while it moves along it and the width changes evenly, metres.</summary>
    /// <param name="widthMetres">Width at the start.</param>
    /// <param name="widthSlope">Change of width per metre along the axis.</param>
    /// <param name="metres">Way along the axis.</param>
    public abstract double Sideways(double widthMetres, double widthSlope, double metres);

    /// <summary>
    /// How often the path crosses the band, on average, on a way along the axis: the measure in which its random start is uniform, so that turns
    /// are spread over each stretch of the sides as evenly as over the first.
    /// </summary>
    public abstract double Crossings(double widthMetres, double widthSlope, double metres);

    /// <summary>The way along the axis on which the path crosses the band so often: the inverse of <see cref="Crossings"/>.</summary>
    public abstract double WayFor(double widthMetres, double widthSlope, double crossings);

    /// <summary>The least width at which the path can turn at sides that lean by a slope; infinite when it never can.</summary>
    public double NarrowestFor(double sideSlope) => NarrowestWith(Lead * Math.Max(sideSlope, LeastTangent));

    /// <summary>Curvature of the path seen across it: a chord of length s along the axis strays by this times s²/8. Per metre.</summary>
    public abstract double BendAt(double widthMetres, double widthSlope);

    /// <summary>The least width at which the tangent reaches a value.</summary>
    protected abstract double NarrowestWith(double tangent);
}

/// <summary>The same angle everywhere. Where the band is narrower than a strip is wide there is nothing left to swing over.</summary>
internal sealed class EqualAngleSwing(double tangent, double halfWidthMetres) : SwingRule
{
    // Below this the first two terms of the series are as good as the logarithm, which loses its digits.
    private const double NoGrowth = 1e-7;

    public override double TangentAt(double widthMetres) => tangent;

    public override double Sideways(double widthMetres, double widthSlope, double metres) => tangent * metres;

    public override double Crossings(double widthMetres, double widthSlope, double metres)
    {
        var growth = widthSlope * metres / widthMetres;
        return tangent * metres / widthMetres * (Math.Abs(growth) < NoGrowth ? 1 - (growth / 2) : Math.Log(1 + growth) / growth);
    }

    public override double WayFor(double widthMetres, double widthSlope, double crossings)
    {
        var growth = widthSlope * crossings / tangent;
        return widthMetres * crossings / tangent * (Math.Abs(growth) < NoGrowth ? 1 + (growth / 2) : (Math.Exp(growth) - 1) / growth);
    }

    public override double BendAt(double widthMetres, double widthSlope) => 0;

    protected override double NarrowestWith(double tangentNeeded) => tangent >= tangentNeeded ? 2 * halfWidthMetres : double.PositiveInfinity;
}

/// <summary>
/// The angle whose secant is k times the width, so that length of path per area, and with it coverage, is the same all along the axis:
/// dx/dy = ±√(k²H² - 1). Accuracy of a position: 1e-12 of the band's width.
/// </summary>
internal sealed class AdjustedAngleSwing(double k) : SwingRule
{
    // Gauss-Legendre, five points on [-1, 1].
    private static readonly double[] Nodes = [0, 0.5384693101056831, 0.9061798459386640];
    private static readonly double[] Weights = [0.5688888888888889, 0.4786286704993665, 0.2369268850561891];

    public override double TangentAt(double widthMetres) => Tangent(k * widthMetres);

    public override double Sideways(double widthMetres, double widthSlope, double metres)
    {
        var (from, to) = (k * widthMetres, k * (widthMetres + (widthSlope * metres)));
        var least = Math.Min(from, to);

        // Far from 1 against the change, the root is as good as a polynomial, where the closed form would lose its digits.
        return Math.Abs(to - from) * Math.Max(from, to) < 0.1 * ((least * least) - 1)
            ? metres * MeanTangent(from, to)
            : (Antiderivative(to) - Antiderivative(from)) / (2 * k * widthSlope);
    }

    /// <summary>As if the width were large against 1/k: then every crossing takes the same way, 1/k.</summary>
    public override double Crossings(double widthMetres, double widthSlope, double metres) => k * metres;

    public override double WayFor(double widthMetres, double widthSlope, double crossings) => crossings / k;

    public override double BendAt(double widthMetres, double widthSlope) => k * Math.Abs(widthSlope) / TangentAt(widthMetres);

    protected override double NarrowestWith(double tangent) => Math.Sqrt(1 + (tangent * tangent)) / k;

    private static double Tangent(double secant) => Math.Sqrt(Math.Max(0, (secant - 1) * (secant + 1)));

    private static double MeanTangent(double from, double to)
    {
        var (middle, half) = ((from + to) / 2, (to - from) / 2);
        var sum = Weights[0] * Tangent(middle);
        for (var i = 1; i < Nodes.Length; i++)
        {
            sum += Weights[i] * (Tangent(middle - (Nodes[i] * half)) + Tangent(middle + (Nodes[i] * half)));
        }

        return sum / 2;
    }

    /// <summary>Twice the integral of √(u² - 1).</summary>
    private static double Antiderivative(double secant)
    {
        var tangent = Tangent(secant);
        return (secant * tangent) - Math.Log(secant + tangent);
    }
}
