using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>
/// What the effort is computed from: the model with its point estimates, how well each is known, and what had to be assumed on the way.
/// </summary>
/// <param name="Model">The model; effort shared in proportion to area.</param>
/// <param name="Sources">The encounter rates behind it.</param>
/// <param name="SourceOf">For each stratum of the model its rate among the sources.</param>
/// <param name="Detection">Where the detection parts come from.</param>
/// <param name="ClusterSize">Cluster size used, if any.</param>
/// <param name="GivenB">b where it was given or taken from the rule of thumb; null where the pilot gives it.</param>
/// <param name="Advice">Assumptions to tell.</param>
internal sealed record EffortBasis(
    EffortModel Model,
    ImmutableArray<RateSource> Sources,
    ImmutableArray<int> SourceOf,
    DetectionBasis Detection,
    ClusterSize? ClusterSize,
    double? GivenB,
    ImmutableArray<Advice> Advice)
{
    public static EffortBasis Of(EffortDesign design, PilotFigures? figures, IReadOnlyList<EffortStratum> surveyed)
    {
        var givenB = design.B ?? (figures?.Pooled.Dispersion is null ? EffortFormula.DefaultB : null);
        var rates = figures is null
            ? RateBasis.Given(design.GivenEncounterRate!.Value, givenB!.Value, surveyed.Count)
            : RateBasis.Of(figures, surveyed, givenB);
        var isPoints = figures?.IsPoints ?? surveyed[0].IsPoints;
        var detection = givenB is null ? DetectionBasis.Of(design.Detection, figures!, surveyed) : DetectionBasis.None;
        var size = design.ClusterSize is { } given ? new ClusterSize(given.Mean, given.StandardDeviation, null) : figures?.ClusterSize;
        var area = surveyed.Sum(stratum => stratum.AreaKm2);
        var strata = surveyed.Select((stratum, i) =>
        {
            var source = rates.Sources[rates.SourceOf[i]];
            var weight = stratum.AreaKm2 / area;
            return new StratumModel(
                stratum.Name, weight, source.Rate, source.Dispersion, detection.OwnPart(i), weight, TransectEffort(stratum, figures), rates.Own[i]);
        });
        var model = new EffortModel(
            isPoints,
            [.. strata],
            detection.PooledPart,
            size?.RelativeVariance,
            givenB is null ? design.Detection.GivenCv : null,
            design.Detection.GivenDegreesOfFreedom,
            givenB is not null);
        return new EffortBasis(model, rates.Sources, rates.SourceOf, detection, size, givenB, [.. rates.Advice, .. detection.Advice]);
    }

    /// <summary>b as the model shares effort, with its parts and origin.</summary>
    public static BConstant B(EffortModel model, EffortDesign design, PilotFigures? figures, double? givenB)
    {
        var detections = model.DetectionsPerEffort;
        var value = model.UnitCv2 * detections;
        if (givenB is null)
        {
            return new BConstant(
                value,
                BOrigin.Pilot,
                model.UnitRateCv2 * detections,
                model.EstimatesDetection ? model.UnitDetectionCv2 * detections : null,
                model.ClusterPart,
                FormattableString.Invariant($"b = {value:0.00}, estimated from the pilot: detections times squared coefficient of variation of density."));
        }

        var size = model.ClusterPart is { } cluster ? FormattableString.Invariant($", with {cluster:0.00} for cluster size added") : "";
        if (design.B is { } b)
        {
            return new BConstant(value, BOrigin.Given, null, null, model.ClusterPart, FormattableString.Invariant($"b = {b:0.##} as given in the plan{size}."));
        }

        var why = figures is null ? "no pilot gives it" : "the pilot has no variance to take it from";
        return new BConstant(
            value, BOrigin.RuleOfThumb, null, null, model.ClusterPart,
            FormattableString.Invariant($"b = {EffortFormula.DefaultB:0} by the published rule of thumb, since {why}{size}; published values run from about 1.5 to 4 ({RuleSource})."));
    }

    /// <summary>The precision of the pilot itself; null where its encounter rate has no variance.</summary>
    public CvDecomposition? PilotCv(EffortDesign design, PilotFigures figures)
    {
        if (figures.Pooled.Cv is not { } rateCv)
        {
            return null;
        }

        var count = figures.Pooled.Count;
        var parts = new List<(CvSource, double, double?)> { (CvSource.EncounterRate, rateCv, figures.Pooled.DegreesOfFreedom) };
        if (Detection.PooledPart is { } detection)
        {
            parts.Add((CvSource.Detection, Math.Sqrt(detection / count), figures.Detection?.Chosen?.DegreesOfFreedom));
        }
        else if (Model.EstimatesDetection)
        {
            parts.Add((CvSource.Detection, Math.Sqrt(Model.UnitDetectionCv2 / figures.Pooled.Effort), count - figures.Strata.Length));
        }
        else if (design.Detection.GivenCv is { } detectionCv)
        {
            parts.Add((CvSource.Detection, detectionCv, design.Detection.GivenDegreesOfFreedom));
        }

        if (Model.ClusterPart is { } cluster)
        {
            parts.Add((CvSource.ClusterSize, Math.Sqrt(cluster / count), count - 1));
        }

        return CvDecomposition.Of(parts);
    }

    private const string RuleSource =
        "Buckland and others 2001, Introduction to Distance Sampling, section 7.2; range from Burnham, Anderson and Laake 1980 and Eberhardt 1978";

    private static double? TransectEffort(EffortStratum stratum, PilotFigures? figures)
        => stratum.IsPoints ? 1 : stratum.TransectLengthKm ?? (figures is null ? null : figures.Pooled.Effort / figures.Pooled.Transects);
}
