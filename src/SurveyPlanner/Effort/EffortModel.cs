using System.Collections.Immutable;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>One stratum of the <see cref="EffortModel"/>.</summary>
/// <param name="Name">The stratum.</param>
/// <param name="Weight">Its share of the area.</param>
/// <param name="Rate">Detections per unit of effort.</param>
/// <param name="UnitVariance">Variance of the rate times effort: what one unit of effort would give.</param>
/// <param name="Share">Its share of the effort.</param>
/// <param name="TransectEffort">Effort of one transect; null when unknown.</param>
/// <param name="Pilot">Its own encounter rate in the pilot, if any.</param>
public sealed record StratumModel(
    string Name, double Weight, double Rate, double UnitVariance, double Share, double? TransectEffort, EncounterRate? Pilot);

/// <summary>
/// cv²(L) of the area-weighted density at total effort L:
/// Σ w_h² v_h / (a_h L R²) + (detection part + cluster part) / n(L) + fixed part, n(L) = L Σ a_h r_h, R = Σ w_h r_h.
/// With one stratum this is b / n(L) plus the fixed part.
/// </summary>
/// <param name="IsPoints">Whether effort is visits to points.</param>
/// <param name="Strata">The strata; shares and weights each sum to 1.</param>
/// <param name="DetectionPart">n cv² of detection, which falls with the number of detections; null when no detection function is estimated.</param>
/// <param name="ClusterPart">(sd / mean)² of cluster size; null when animals are alone.</param>
/// <param name="FixedCv">Detection cv taken over from elsewhere, which no effort lowers; null when none is.</param>
/// <param name="FixedDegreesOfFreedom">Its degrees of freedom; null for many.</param>
/// <param name="RateIncludesDetection">Whether the unit variances already include detection because b was given whole.</param>
public sealed record EffortModel(
    bool IsPoints,
    ImmutableArray<StratumModel> Strata,
    double? DetectionPart,
    double? ClusterPart,
    double? FixedCv,
    double? FixedDegreesOfFreedom,
    bool RateIncludesDetection)
{
    /// <summary>Detections per unit of area-weighted effort.</summary>
    public double PooledRate => Strata.Sum(stratum => stratum.Weight * stratum.Rate);

    /// <summary>Detections per unit of effort as shared.</summary>
    public double DetectionsPerEffort => Strata.Sum(stratum => stratum.Share * stratum.Rate);

    /// <summary>Encounter-rate part of cv² at one unit of effort.</summary>
    public double UnitRateCv2 => Strata
        .Where(stratum => stratum.UnitVariance > 0)
        .Sum(stratum => stratum.Weight * stratum.Weight * stratum.UnitVariance / stratum.Share) / (PooledRate * PooledRate);

    /// <summary>cv² at one unit of effort, without the fixed part.</summary>
    public double UnitCv2 => UnitRateCv2 + (((DetectionPart ?? 0) + (ClusterPart ?? 0)) / DetectionsPerEffort);

    /// <summary>Effort that reaches a target; null when the fixed part alone exceeds it.</summary>
    public double? EffortFor(double targetCv) => Required(UnitCv2, targetCv);

    /// <summary>Effort that brings one stratum's own density to the target.</summary>
    public double? OwnEffortFor(StratumModel stratum, double targetCv)
        => stratum.Rate > 0
            ? Required((stratum.UnitVariance / stratum.Rate / stratum.Rate) + (((DetectionPart ?? 0) + (ClusterPart ?? 0)) / stratum.Rate), targetCv)
            : null;

    /// <summary>cv of one stratum's own density at total effort, detection and cluster size pooled over strata; null where nothing is seen in it.</summary>
    public double? OwnCv(StratumModel stratum, double effort)
        => stratum.Rate > 0
            ? Math.Sqrt(
                (stratum.UnitVariance / (stratum.Share * effort) / stratum.Rate / stratum.Rate)
                + (((DetectionPart ?? 0) + (ClusterPart ?? 0)) / (DetectionsPerEffort * effort))
                + Math.Pow(FixedCv ?? 0, 2))
            : null;

    /// <summary>What a total effort delivers; null for an effort that is not above 0.</summary>
    public EffortPrecision? PrecisionAt(double effort)
    {
        if (!(effort > 0) || !double.IsFinite(effort))
        {
            return null;
        }

        var detections = effort * DetectionsPerEffort;
        var rateSource = RateIncludesDetection ? CvSource.EncounterRateAndDetection : CvSource.EncounterRate;
        var parts = new List<(CvSource Source, double Cv, double? DegreesOfFreedom)>
        {
            (rateSource, Math.Sqrt(UnitRateCv2 / effort), RateDegreesOfFreedom(effort)),
        };
        if (DetectionPart is { } detection)
        {
            parts.Add((CvSource.Detection, Math.Sqrt(detection / detections), detections - 1));
        }

        if (FixedCv is { } fixedCv)
        {
            parts.Add((CvSource.Detection, fixedCv, FixedDegreesOfFreedom));
        }

        if (ClusterPart is { } cluster)
        {
            parts.Add((CvSource.ClusterSize, Math.Sqrt(cluster / detections), detections - 1));
        }

        return new EffortPrecision(effort, detections, Decompose(parts));
    }

    /// <summary>Adds components up. Components with less than one degree of freedom leave the interval unknown.</summary>
    public static CvDecomposition Decompose(IReadOnlyList<(CvSource Source, double Cv, double? DegreesOfFreedom)> parts)
    {
        var cv2 = parts.Sum(part => part.Cv * part.Cv);
        var cv = Math.Sqrt(cv2);
        var components = parts
            .Select(part => new CvComponent(part.Source, part.Cv, part.DegreesOfFreedom, cv2 > 0 ? part.Cv * part.Cv / cv2 : null))
            .ToImmutableArray();
        if (parts.Any(part => part.DegreesOfFreedom < 1))
        {
            return new CvDecomposition([.. components.Select(WithoutFew)], cv, null, null);
        }

        var df = Satterthwaite.DegreesOfFreedom([.. parts.Select(part => (part.Cv, part.DegreesOfFreedom))]);
        return new CvDecomposition(components, cv, df, LogNormalInterval.Factor(cv, df));

        static CvComponent WithoutFew(CvComponent component)
            => component.DegreesOfFreedom < 1 ? component with { DegreesOfFreedom = null } : component;
    }

    private double? Required(double unitCv2, double targetCv)
    {
        var room = (targetCv * targetCv) - Math.Pow(FixedCv ?? 0, 2);
        return room > 0 ? unitCv2 / room : null;
    }

    /// <summary>Transects expected on this effort, less one for each stratum that has any; null when the length of a transect is unknown.</summary>
    private double? RateDegreesOfFreedom(double effort)
    {
        var surveyed = Strata.Where(stratum => stratum.Share > 0).ToList();
        return surveyed.All(stratum => stratum.TransectEffort is not null)
            ? surveyed.Sum(stratum => (stratum.Share * effort / stratum.TransectEffort!.Value) - 1)
            : null;
    }
}
