using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>What the effort is computed from: the model, b with its origin, and what had to be assumed on the way.</summary>
internal sealed record EffortBasis(EffortModel Model, BConstant B, ImmutableArray<Advice> Advice)
{
    private const string RuleSource =
        "Buckland and others 2001, Introduction to Distance Sampling, section 7.2; range from Burnham, Anderson and Laake 1980 and Eberhardt 1978";

    public static EffortBasis Of(EffortDesign design, PilotFigures? figures, IReadOnlyList<EffortStratum> surveyed)
    {
        var advice = new List<Advice>();
        var givenB = design.B ?? (figures?.Pooled.Dispersion is null ? EffortFormula.DefaultB : null);
        var area = surveyed.Sum(stratum => stratum.AreaKm2);
        var strata = surveyed
            .Select(stratum =>
            {
                var (rate, variance, pilot) = RateOf(stratum.Name, design, figures, givenB, advice);
                return new StratumModel(
                    stratum.Name, stratum.AreaKm2 / area, rate, variance, 0, TransectEffort(stratum, figures), pilot);
            })
            .ToImmutableArray();
        var size = design.ClusterSize is { } given ? new ClusterSize(given.Mean, given.StandardDeviation, null) : figures?.ClusterSize;
        var model = new EffortModel(
            figures?.IsPoints ?? surveyed[0].IsPoints,
            EffortShares.Shared(strata, design),
            null,
            size?.RelativeVariance,
            givenB is null ? design.Detection.GivenCv : null,
            design.Detection.GivenDegreesOfFreedom,
            givenB is not null);
        return new EffortBasis(model, BOf(model, design, figures, givenB), [.. advice]);
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
        if (design.Detection.GivenCv is { } detectionCv)
        {
            parts.Add((CvSource.Detection, detectionCv, design.Detection.GivenDegreesOfFreedom));
        }

        if (Model.ClusterPart is { } cluster)
        {
            parts.Add((CvSource.ClusterSize, Math.Sqrt(cluster / count), count - 1));
        }

        return EffortModel.Decompose(parts);
    }

    /// <summary>Rate and unit variance of one stratum: its own where the pilot has them, otherwise the region's.</summary>
    private static (double Rate, double UnitVariance, EncounterRate? Pilot) RateOf(
        string name, EffortDesign design, PilotFigures? figures, double? givenB, List<Advice> advice)
    {
        if (figures is null)
        {
            var given = design.GivenEncounterRate!.Value;
            return (given, given * givenB!.Value, null);
        }

        var own = figures.Strata.FirstOrDefault(stratum => stratum.Stratum == name)?.EncounterRate;
        var used = own ?? figures.Pooled;
        if (own is null && figures.Strata[0].Stratum.Length > 0)
        {
            advice.Add(new Advice($"The pilot has no transects in stratum '{name}'; the encounter rate of the other strata stands in for it."));
        }

        if (used.Count == 0)
        {
            advice.Add(new Advice(
                $"The pilot saw nothing in stratum '{name}', so it adds nothing to the variance here; that is not proof that nothing lives there."));
        }

        if (givenB is { } b)
        {
            return (used.Rate, b * used.Rate, own);
        }

        return (used.Rate, UnitVariance(name, used, own is null && figures.Strata.Length > 1, figures.Pooled.Dispersion!.Value, advice), own);
    }

    private static double UnitVariance(string name, EncounterRate used, bool borrowed, double pooledDispersion, List<Advice> advice)
    {
        if (borrowed || used.Variance is null)
        {
            if (used.Count > 0 && !borrowed)
            {
                advice.Add(new Advice($"The pilot has a single transect in stratum '{name}', so its variance is borrowed from the other strata."));
            }

            return pooledDispersion * used.Rate;
        }

        if (used.Variance == 0)
        {
            advice.Add(new Advice(
                "The pilot's transects all gave the same encounter rate; a variance of 0 would promise too much, so the variance of counts by chance alone (Poisson) is used."));
            return used.Rate;
        }

        return used.Variance.Value * used.Effort;
    }

    private static double? TransectEffort(EffortStratum stratum, PilotFigures? figures)
        => stratum.IsPoints ? 1 : stratum.TransectLengthKm ?? (figures is null ? null : figures.Pooled.Effort / figures.Pooled.Transects);

    private static BConstant BOf(EffortModel model, EffortDesign design, PilotFigures? figures, double? givenB)
    {
        var detections = model.DetectionsPerEffort;
        var value = model.UnitCv2 * detections;
        if (givenB is null)
        {
            return new BConstant(
                value, BOrigin.Pilot, model.UnitRateCv2 * detections, model.DetectionPart, model.ClusterPart,
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
}
