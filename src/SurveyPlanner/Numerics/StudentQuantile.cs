using MathNet.Numerics.Distributions;

namespace SurveyPlanner.Numerics;

/// <summary>Quantiles of Student's t with fractional degrees of freedom.</summary>
internal static class StudentQuantile
{
    /// <summary>Above this the expansion agrees with the root finder to 1e-10 (held in the tests), while the root finder of MathNet 5.0.0 fails to converge from about 1e7 on.</summary>
    private const double ManyDegreesOfFreedom = 2000;

    /// <summary>The quantile at a probability in (0, 1); the normal one when the degrees of freedom (at least 1) are null.</summary>
    public static double At(double probability, double? degreesOfFreedom)
    {
        if (degreesOfFreedom is { } df && df <= ManyDegreesOfFreedom)
        {
            return StudentT.InvCDF(0, 1, df, probability);
        }

        var z = Normal.InvCDF(0, 1, probability);
        return degreesOfFreedom is { } many ? Expansion(z, many) : z;
    }

    /// <summary>Abramowitz and Stegun 26.7.5 (from memory), to the third order of 1/df.</summary>
    private static double Expansion(double z, double df)
    {
        var z2 = z * z;
        var first = z * (z2 + 1) / 4;
        var second = z * ((((5 * z2) + 16) * z2) + 3) / 96;
        var third = z * ((((((3 * z2) + 19) * z2) + 17) * z2) - 15) / 384;
        return z + ((first + ((second + (third / df)) / df)) / df);
    }
}
