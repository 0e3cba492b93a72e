using System.Collections.Immutable;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Effort;

/// <summary>A part of the variance of density.</summary>
public enum CvSource
{
    EncounterRate,
    Detection,
    ClusterSize,

    /// <summary>Encounter rate and detection together, where b was given whole.</summary>
    EncounterRateAndDetection,
}

/// <summary>One component of the coefficient of variation of density.</summary>
/// <param name="Source">What it comes from.</param>
/// <param name="Cv">Its coefficient of variation.</param>
/// <param name="DegreesOfFreedom">Null for many; below 1 there is no interval.</param>
/// <param name="Share">Its share of cv², 0 to 1; null when all components are 0.</param>
public sealed record CvComponent(CvSource Source, double Cv, double? DegreesOfFreedom, double? Share);

/// <summary>cv² of density as the sum of its components (delta method), and its log-normal interval.</summary>
/// <param name="Components">The parts.</param>
/// <param name="Cv">The whole.</param>
/// <param name="DegreesOfFreedom">By Satterthwaite; null for many.</param>
/// <param name="IntervalFactor">C of the 95 % interval from D / C to D C; null when a part has less than one degree of freedom.</param>
public sealed record CvDecomposition(ImmutableArray<CvComponent> Components, double Cv, double? DegreesOfFreedom, double? IntervalFactor)
{
    /// <summary>Adds components up.</summary>
    public static CvDecomposition Of(IReadOnlyList<(CvSource Source, double Cv, double? DegreesOfFreedom)> parts)
    {
        var cv2 = parts.Sum(part => part.Cv * part.Cv);
        var cv = Math.Sqrt(cv2);
        var components = parts.Select(part => new CvComponent(
            part.Source, part.Cv, part.DegreesOfFreedom is { } df ? Math.Max(0, df) : null, cv2 > 0 ? part.Cv * part.Cv / cv2 : null));
        if (parts.Any(part => part.DegreesOfFreedom < 1))
        {
            return new CvDecomposition([.. components], cv, null, null);
        }

        var together = Satterthwaite.DegreesOfFreedom([.. parts.Select(part => (part.Cv, part.DegreesOfFreedom))]);
        return new CvDecomposition([.. components], cv, together, LogNormalInterval.Factor(cv, together));
    }
}
