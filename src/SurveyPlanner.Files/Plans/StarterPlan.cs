using System.Globalization;
using SurveyPlanner.Files.Units;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Plans;

/// <summary>Writes the commented plan that a survey begins with.</summary>
public static class StarterPlan
{
    /// <summary>Common advice is 10 to 20 replicate lines a stratum; the upper end leaves room for lines that fall short.</summary>
    private const int LinesAimedAt = 20;

    /// <summary>A strip out to here on either side is common from boats; walkers and aircraft will change it.</summary>
    private const double WidestHalfWidthMetres = 300;

    /// <summary>No half-width beyond a tenth of the spacing: strips of neighbouring lines stay far apart.</summary>
    private const double HalfWidthPerSpacing = 0.1;

    private const int ValuesShown = 4;

    /// <summary>Lengths that people write: 1 to 8 times a power of ten.</summary>
    private static readonly double[] RoundSteps = [1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10];

    /// <summary>The text of a plan that reads without a problem and fits the region: about 20 parallel lines across its long axis, wherever they meet it.</summary>
    /// <param name="boundaryPath">The boundary as the plan is to name it: relative to the folder that the plan will stand in.</param>
    /// <param name="facts">What the region is like.</param>
    /// <exception cref="InputException">No plan can name this file.</exception>
    public static string For(string boundaryPath, StarterFacts facts)
    {
        ArgumentNullException.ThrowIfNull(facts);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(facts.LinesAcrossKm);
        if (string.IsNullOrWhiteSpace(boundaryPath) || boundaryPath.Any(char.IsControl))
        {
            throw new InputException(new Problem("a plan cannot hold this file name, for it is blank or has a control character in it: rename the file", Quoted.Short(boundaryPath)));
        }

        var spacingMetres = Round(facts.LinesAcrossKm * 1000 / LinesAimedAt);
        var lines = (int)Math.Round(facts.LinesAcrossKm * 1000 / spacingMetres);
        var halfWidthMetres = RoundDown(Math.Min(WidestHalfWidthMetres, spacingMetres * HalfWidthPerSpacing));
        return $"""
            # The plan of a survey. What follows a # is a note; take the # away from a key to use it.
            # Every length carries its unit ("300 m", "2.5 km", "1 nmi"). Paths start from the folder of this file.
            # The region of {Quoted.Short(boundaryPath)}: {Figure(facts.AreaKm2)} km², {Figure(facts.LongAxisKm)} km long and {Figure(facts.ShortAxisKm)} km wide.
            # A layout knows nothing of depth, wires, weather, airspace or permits: crew leaders decide what is safe, by their local codes.

            [survey]
            name = {Quoted.Text(string.IsNullOrWhiteSpace(facts.SurveyName) ? "survey" : facts.SurveyName)}
            # seed = 20270401                      # with a seed here the same layout is drawn each time; without one, a new one is drawn and recorded

            [region]
            boundary = {Quoted.Text(boundaryPath)}
            {StratumFieldNote(facts)}
            # exclusions = "closed-areas.geojson"  # areas to cut out
            # exclusion_buffer = "500 m"           # and how far to keep away from them

            [layout]
            kind = "parallel"                      # {string.Join(" · ", Enum.GetValues<LayoutKind>().Select(ChoiceWord.Of))}
            bearing = "short-axis"                 # or "long-axis", or degrees from true north: 45; best across what makes numbers change
            spacing = {Padded(LengthText(spacingMetres))} # about {lines} lines in the region as a whole; or lines = 20, or total_length = "400 km"
            half_width = {Padded(LengthText(halfWidthMetres), 25)} # how far out from the line animals are counted: put in your own; points have a radius instead
            edge = "minus"                         # lines stop at the boundary; "plus": they run on past it by the half-width

            # What differs in one stratum:
            # [stratum.{Quoted.Text(ExampleStratum(facts))}]
            # spacing = {LengthText(Round(spacingMetres / 2))}

            # Counts of an earlier season, to see what precision this effort will give:
            # [pilot]
            # transects = "pilot-transects.csv"    # columns: stratum, transect, length_km (points: visits), count
            # detections = "pilot-detections.csv"  # columns: transect, distance_m, size

            # The precision that the decision needs:
            # [precision]
            # target_cv = 0.20                     # coefficient of variation of density

            """;
    }

    private static string StratumFieldNote(StarterFacts facts)
    {
        if (facts.StratumFields.IsDefaultOrEmpty)
        {
            return "# stratum_field = \"zone\"               # the attribute of the boundary that names strata, if it has one";
        }

        var notes = facts.StratumFields.Select((candidate, i) =>
        {
            var shown = candidate.Values.Take(ValuesShown).Select(Quoted.Short);
            var more = candidate.Values.Length > ValuesShown ? ", …" : "";
            var strata = string.Create(CultureInfo.InvariantCulture, $"{candidate.Values.Length} strata: {string.Join(", ", shown)}{more}");
            return i == 0
                ? $"# stratum_field = {Padded(Quoted.Text(candidate.Field), 21)} # {strata}"
                : $"#   or the field {Padded(Quoted.Text(candidate.Field), 21)} # {strata}";
        });
        return string.Join('\n', notes);
    }

    private static string ExampleStratum(StarterFacts facts)
        => facts.StratumFields.IsDefaultOrEmpty || facts.StratumFields[0].Values.IsDefaultOrEmpty ? "inner bay" : facts.StratumFields[0].Values[0];

    private static string Padded(string value, int width = 28) => value.PadRight(width);

    private static string LengthText(double metres)
        => Quoted.Text(metres >= 1000 ? DecimalText.Write(metres / 1000) + " km" : DecimalText.Write(metres) + " m");

    private static string Figure(double value) => double.Parse(value.ToString("G3", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture)
        .ToString("0.################", CultureInfo.InvariantCulture);

    private static double Round(double metres) => RoundTo(metres, step => Math.Abs(Math.Log(step)));

    /// <summary>The largest round length that is not longer (by more than a rounding error).</summary>
    private static double RoundDown(double metres) => RoundTo(metres, step => step > 1 + 1e-9 ? double.PositiveInfinity : -Math.Log(step));

    private static double RoundTo(double metres, Func<double, double> badness)
    {
        var power = Math.Floor(Math.Log10(metres));
        var best = RoundSteps.MinBy(step => badness(step * Math.Pow(10, power) / metres));

        // By way of text: 3 * 0.1 is not 0.3, and the plan should not say 0.30000000000000004.
        return double.Parse(
            string.Create(CultureInfo.InvariantCulture, $"{best}E{power}"), CultureInfo.InvariantCulture);
    }
}
