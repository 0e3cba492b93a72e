using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>One stratum of the <see cref="EffortModel"/>.</summary>
/// <param name="Name">The stratum.</param>
/// <param name="Weight">Its share of the area.</param>
/// <param name="Rate">Detections per unit of effort.</param>
/// <param name="Dispersion">Variance-to-mean ratio of its counts under the variance estimator in use.</param>
/// <param name="OwnDetectionPart">n cv² of detection where each stratum has its own detection function; null where it is pooled or none.</param>
/// <param name="Share">Its share of the effort.</param>
/// <param name="TransectEffort">Effort of one transect; null when unknown.</param>
/// <param name="Pilot">Its own encounter rate in the pilot, if any.</param>
public sealed record StratumModel(
    string Name, double Weight, double Rate, double Dispersion, double? OwnDetectionPart, double Share, double? TransectEffort, EncounterRate? Pilot)
{
    /// <summary>Variance of the rate times effort: what one unit of effort would give.</summary>
    public double UnitVariance => Dispersion * Rate;
}

/// <summary>
/// cv²(L) of the area-weighted density at total effort L:
/// Σ w_h² (c_h + d_h) r_h / (a_h L R²) + (detection part + cluster part) / n(L) + fixed part,
/// with r_h the rates, c_h the dispersions, d_h own detection parts, a_h the shares, n(L) = L Σ a_h r_h and R = Σ w_h r_h.
/// With one stratum this is b / n(L) plus the fixed part.
/// </summary>
/// <param name="IsPoints">Whether effort is visits to points.</param>
/// <param name="Strata">The strata; shares and weights each sum to 1.</param>
/// <param name="DetectionPart">n cv² of a pooled detection function, which falls with the number of detections; null when there is none.</param>
/// <param name="ClusterPart">(sd / mean)² of cluster size; null when animals are alone.</param>
/// <param name="FixedCv">Detection cv taken over from elsewhere, which no effort lowers; null when none is.</param>
/// <param name="FixedDegreesOfFreedom">Its degrees of freedom; null for many.</param>
/// <param name="RateIncludesDetection">Whether the dispersions already include detection because b was given whole.</param>
public sealed record EffortModel(
    bool IsPoints,
    ImmutableArray<StratumModel> Strata,
    double? DetectionPart,
    double? ClusterPart,
    double? FixedCv,
    double? FixedDegreesOfFreedom,
    bool RateIncludesDetection)
{
    /// <summary>Detections per unit of effort over the region, strata weighted by area.</summary>
    public double PooledRate => Strata.Sum(stratum => stratum.Weight * stratum.Rate);

    /// <summary>Detections per unit of effort as shared.</summary>
    public double DetectionsPerEffort => Strata.Sum(stratum => stratum.Share * stratum.Rate);

    /// <summary>Whether a detection function is estimated from the survey's own distances.</summary>
    public bool EstimatesDetection => DetectionPart is not null || Strata.Any(stratum => stratum.OwnDetectionPart is not null);

    /// <summary>Encounter-rate part of cv² at one unit of effort.</summary>
    public double UnitRateCv2 => OverStrata(stratum => stratum.UnitVariance);

    /// <summary>Detection part of cv² at one unit of effort.</summary>
    public double UnitDetectionCv2
        => OverStrata(stratum => (stratum.OwnDetectionPart ?? 0) * stratum.Rate) + ((DetectionPart ?? 0) / DetectionsPerEffort);

    /// <summary>cv² at one unit of effort, without the fixed part: effort for a target is this over the squared target.</summary>
    public double UnitCv2 => UnitRateCv2 + UnitDetectionCv2 + ((ClusterPart ?? 0) / DetectionsPerEffort);

    /// <summary>The same model with effort shared otherwise; shares in the order of the strata, summing to 1.</summary>
    public EffortModel WithShares(IReadOnlyList<double> shares)
        => this with { Strata = [.. Strata.Select((stratum, i) => stratum with { Share = shares[i] })] };

    /// <summary>Effort that reaches a target; null when the fixed part alone exceeds it.</summary>
    public double? EffortFor(double targetCv) => Required(UnitCv2, targetCv);

    /// <summary>What a total effort delivers; null for an effort that is not above 0.</summary>
    public EffortPrecision? PrecisionAt(double effort)
    {
        if (!(effort > 0) || !double.IsFinite(effort))
        {
            return null;
        }

        var detections = effort * DetectionsPerEffort;
        return new EffortPrecision(effort, detections, CvDecomposition.Of(Components(effort, detections)));
    }

    /// <summary>Effort that brings one stratum's own density to the target, detection and cluster size estimated there alone.</summary>
    internal double? OwnEffortFor(StratumModel stratum, double targetCv)
        => stratum.Rate > 0
            ? Required((stratum.Dispersion + (stratum.OwnDetectionPart ?? DetectionPart ?? 0) + (ClusterPart ?? 0)) / stratum.Rate, targetCv)
            : null;

    /// <summary>cv of one stratum's own density at total effort; null where nothing is seen in it or no effort goes to it.</summary>
    internal double? OwnCv(StratumModel stratum, double effort)
        => stratum.Rate > 0 && stratum.Share > 0
            ? Math.Sqrt(
                ((stratum.Dispersion + (stratum.OwnDetectionPart ?? 0)) / (stratum.Share * effort * stratum.Rate))
                + (((DetectionPart ?? 0) + (ClusterPart ?? 0)) / (DetectionsPerEffort * effort))
                + Math.Pow(FixedCv ?? 0, 2))
            : null;

    private List<(CvSource Source, double Cv, double? DegreesOfFreedom)> Components(double effort, double detections)
    {
        var rateSource = RateIncludesDetection ? CvSource.EncounterRateAndDetection : CvSource.EncounterRate;
        var parts = new List<(CvSource, double, double?)> { (rateSource, Math.Sqrt(UnitRateCv2 / effort), RateDegreesOfFreedom(effort)) };
        if (EstimatesDetection)
        {
            var functions = Math.Max(1, Strata.Count(stratum => stratum.OwnDetectionPart is not null && stratum.Rate > 0));
            parts.Add((CvSource.Detection, Math.Sqrt(UnitDetectionCv2 / effort), detections - functions));
        }

        if (FixedCv is { } fixedCv)
        {
            parts.Add((CvSource.Detection, fixedCv, FixedDegreesOfFreedom));
        }

        if (ClusterPart is { } cluster)
        {
            parts.Add((CvSource.ClusterSize, Math.Sqrt(cluster / detections), detections - 1));
        }

        return parts;
    }

    private double OverStrata(Func<StratumModel, double> unitVariance)
        => Strata.Where(stratum => unitVariance(stratum) > 0).Sum(stratum => stratum.Weight * stratum.Weight * unitVariance(stratum) / stratum.Share)
            / (PooledRate * PooledRate);

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
