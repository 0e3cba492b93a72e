using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>Which encounter rate serves which stratum.</summary>
/// <param name="Sources">The rates.</param>
/// <param name="SourceOf">For each stratum its rate among the sources.</param>
/// <param name="Own">For each stratum its own encounter rate in the pilot, if any.</param>
/// <param name="Advice">Assumptions to tell.</param>
internal sealed record RateBasis(
    ImmutableArray<RateSource> Sources, ImmutableArray<int> SourceOf, ImmutableArray<EncounterRate?> Own, ImmutableArray<Advice> Advice)
{
    /// <summary>One rate for all strata, with b as its dispersion.</summary>
    public static RateBasis Given(double rate, double b, int strata)
        => new([new RateSource(rate, b, null, null, 0)], [.. Enumerable.Repeat(0, strata)], [.. Enumerable.Repeat<EncounterRate?>(null, strata)], []);

    /// <summary>Each stratum's own rate where the pilot has one, otherwise the region's. A given b is the dispersion of all of them.</summary>
    public static RateBasis Of(PilotFigures figures, IReadOnlyList<EffortStratum> surveyed, double? givenB)
    {
        var sources = new List<RateSource>();
        var advice = new List<Advice>();
        var placeOf = new Dictionary<string, int>();
        var own = surveyed.Select(stratum => figures.Strata.FirstOrDefault(one => one.Stratum == stratum.Name)?.EncounterRate).ToImmutableArray();
        foreach (var (stratum, rate) in surveyed.Zip(own))
        {
            var key = rate is null ? "" : stratum.Name;
            if (placeOf.TryAdd(key, sources.Count))
            {
                sources.Add(Source(stratum.Name, rate, figures, givenB, advice));
            }

            if (rate is null && figures.Strata[0].Stratum.Length > 0)
            {
                advice.Add(new Advice($"The pilot has no transects in stratum '{stratum.Name}'; the encounter rate of the other strata stands in for it."));
            }
        }

        return new RateBasis(
            [.. sources], [.. surveyed.Zip(own, (stratum, rate) => placeOf[rate is null ? "" : stratum.Name])], own, [.. advice]);
    }

    private static RateSource Source(string name, EncounterRate? own, PilotFigures figures, double? givenB, List<Advice> advice)
    {
        var used = own ?? figures.Pooled;
        if (used.Count == 0)
        {
            advice.Add(new Advice(
                $"The pilot saw nothing in stratum '{name}', so it adds nothing to the variance here; that is not proof that nothing lives there."));
        }

        if (givenB is { } b)
        {
            return new RateSource(used.Rate, b, null, used.Count, used.Transects);
        }

        if (used.Variance is null || (own is null && figures.Strata.Length > 1))
        {
            if (used.Count > 0 && own is not null)
            {
                advice.Add(new Advice($"The pilot has a single transect in stratum '{name}', so its variance is borrowed from the other strata."));
            }

            var known = figures.Strata.Where(stratum => stratum.EncounterRate.Dispersion is not null);
            var dispersion = figures.Pooled.Dispersion!.Value;
            return new RateSource(
                used.Rate, dispersion > 0 ? dispersion : 1, known.Sum(stratum => stratum.EncounterRate.Transects - 1), used.Count, used.Transects);
        }

        if (used.Variance == 0)
        {
            advice.Add(new Advice(
                "The pilot's transects all gave the same encounter rate; a variance of 0 would promise too much, so the variance of counts by chance alone (Poisson) is used."));
        }

        return RateSource.Of(used);
    }
}
