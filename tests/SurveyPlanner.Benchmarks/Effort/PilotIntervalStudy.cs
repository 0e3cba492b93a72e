using SurveyPlanner.Effort;
using SurveyPlanner.Pilots;
using SurveyPlanner.Simulated;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// How often the interval of the required effort holds the truth, and the effort assured at 0.8 is enough, over 2,000 simulated pilots
/// a row, seed 20270602. Its rows with a single estimator and no clusters are the table in <see cref="MeasuredReliability"/>.
/// </summary>
internal static class PilotIntervalStudy
{
    private const ulong Seed = 20270602;

    public static void Run(TextWriter output, int pilots)
    {
        output.WriteLine("lines\tper line\tdispersion\tclusters\testimator\tpilots\tcoverage\tabove\tbelow\tassured\tdelta coverage\twidth");
        var truths = new List<PilotTruth>();
        foreach (var lines in new[] { 5, 10, 20, 40 })
        {
            foreach (var perLine in new[] { 1.0, 3, 10 })
            {
                truths.AddRange(new[] { 1.0, 2, 4 }.Select(dispersion => new PilotTruth(lines, perLine, dispersion)));
            }
        }

        truths.AddRange(truths.Where(truth => truth.DetectionsPerTransect == 3).ToList().SelectMany(truth => new[]
        {
            truth with { Clusters = true }, truth with { Estimator = EncounterRateEstimator.OverlappingPairs },
        }));
        for (var i = 0; i < truths.Count; i++)
        {
            output.WriteLine(Row(truths[i], pilots, (uint)i));
            output.Flush();
        }
    }

    private static string Row(PilotTruth truth, int pilots, uint scenario)
    {
        var results = Enumerable.Range(0, pilots)
            .AsParallel()
            .AsOrdered()
            .Select(i => truth.Draw(Seed, scenario, (uint)i) is { } pilot
                ? truth.Plan(pilot, 0.8, Seed + (ulong)i, DetectionModel.HalfNormal).Required
                : null)
            .Where(required => required is not null)
            .Select(required => required!)
            .ToList();
        var true_ = truth.RequiredKm;
        double Share(Func<RequiredEffort, bool> holds) => 100.0 * results.Count(holds) / results.Count;
        return FormattableString.Invariant(
            $"{truth.Transects}\t{truth.DetectionsPerTransect}\t{truth.Dispersion}\t{truth.Clusters}\t{truth.Estimator}\t{results.Count}\t{Share(r => r.Interval!.Lower <= true_ && true_ <= r.Interval.Upper):0.0}\t{Share(r => r.Interval!.Lower > true_):0.0}\t{Share(r => r.Interval!.Upper < true_):0.0}\t{Share(r => r.AssuredEffort >= true_):0.0}\t{Share(r => r.DeltaInterval!.Lower <= true_ && true_ <= r.DeltaInterval.Upper):0.0}\t{results.Average(r => Math.Log(r.Interval!.Upper / r.Interval.Lower)):0.00}");
    }
}
