using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>A point of the curve of precision against effort.</summary>
/// <param name="Effort">Kilometres of line, or points.</param>
/// <param name="Cv">Coefficient of variation it delivers.</param>
/// <param name="LowerCv">Lower edge of the pilot's 95 % band; null without one.</param>
/// <param name="UpperCv">Upper edge.</param>
public sealed record CvPoint(double Effort, double Cv, double? LowerCv, double? UpperCv);

/// <summary>A point of the curve of effort against target.</summary>
/// <param name="TargetCv">Coefficient of variation asked for.</param>
/// <param name="Effort">Kilometres of line, or points (not rounded).</param>
/// <param name="Interval">The pilot's 95 % interval; null without one.</param>
public sealed record TargetPoint(double TargetCv, double Effort, EffortInterval? Interval);

/// <summary>Precision against effort and effort against precision, effort shared as planned.</summary>
/// <param name="CvAgainstEffort">41 efforts in even steps up to twice the planned one (without a target: up to that for a cv of 0.1).</param>
/// <param name="EffortAgainstTarget">Targets from 0.05 to 0.5 in steps of 0.025, without those that no effort reaches.</param>
public sealed record EffortCurves(ImmutableArray<CvPoint> CvAgainstEffort, ImmutableArray<TargetPoint> EffortAgainstTarget)
{
    private const int Steps = 40;
    private const double UsualTarget = 0.1;

    internal static EffortCurves Of(EffortModel model, double? planned, EffortInterval? factors)
    {
        var most = planned * 2 ?? model.UnitCv2 / (UsualTarget * UsualTarget);
        var fixedCv2 = Math.Pow(model.FixedCv ?? 0, 2);
        var targets = Enumerable.Range(2, 19)
            .Select(step => step * 0.025)
            .Select(target => (Target: target, Effort: model.EffortFor(target)))
            .Where(point => point.Effort is not null);
        return new EffortCurves(
            [.. Enumerable.Range(1, Steps + 1).Select(step => At(most * step / (Steps + 1)))],
            [.. targets.Select(point => new TargetPoint(point.Target, point.Effort!.Value, factors?.Times(point.Effort.Value)))]);

        CvPoint At(double effort) => new(effort, Cv(effort, 1), factors is null ? null : Cv(effort, factors.Lower), factors is null ? null : Cv(effort, factors.Upper));

        double Cv(double effort, double factor) => Math.Sqrt((factor * model.UnitCv2 / effort) + fixedCv2);
    }
}
