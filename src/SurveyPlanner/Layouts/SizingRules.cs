using System.Globalization;

namespace SurveyPlanner.Layouts;

/// <summary>What every kind checks about its size.</summary>
internal static class SizingRules
{
    private const int MaxTransects = 100_000;

    /// <summary>A number of transects that is at least what is asked for; a billionth more is rounding.</summary>
    public static int WholeNumber(double wanted) => (int)Math.Max(1, Math.Ceiling(wanted - 1e-9));

    /// <summary>Refuses transects so far apart that most draws would place none.</summary>
    /// <param name="stratum">The stratum.</param>
    /// <param name="design">What asked for the spacing.</param>
    /// <param name="spacingMetres">The spacing that it came to.</param>
    /// <param name="extentMetres">Length of the stratum in the direction of the spacing.</param>
    public static void RefuseTooCoarse(StratumFrame stratum, LayoutDesign design, double spacingMetres, double extentMetres)
    {
        if (spacingMetres <= extentMetres)
        {
            return;
        }

        var name = stratum.Stratum.Name;
        throw new InputException(new Problem(
            design.Sizing is Sizing.Spacing
                ? string.Create(
                    CultureInfo.InvariantCulture,
                    $"a spacing of {spacingMetres / 1000:0.###} km is larger than stratum '{name}', which is {extentMetres / 1000:0.###} km long in that direction, so most draws would place no transect in it; choose a smaller spacing or another bearing")
                : string.Create(
                    CultureInfo.InvariantCulture,
                    $"asks for so little that transects would lie farther apart than stratum '{name}' is long in that direction, {extentMetres / 1000:0.###} km, so most draws would place none in it; ask for more or choose another bearing"),
            Key: KeyOf(design)));
    }

    public static void RefuseTooMany(StratumFrame stratum, LayoutDesign design, double transects)
    {
        if (transects > MaxTransects)
        {
            throw new InputException(new Problem(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"asks for about {transects:0} transects in stratum '{stratum.Stratum.Name}'; the limit is {MaxTransects}; ask for fewer (is the unit right?)"),
                Key: KeyOf(design)));
        }
    }

    private static string KeyOf(LayoutDesign design) => design.Sizing switch
    {
        Sizing.Number => design.IsPoints ? "layout.points" : "layout.lines",
        Sizing.TotalLength => "layout.total_length",
        Sizing.Precision => "layout.size_from",
        _ => "layout.spacing",
    };

    /// <summary>Refuses segments or loops that would run into their neighbours.</summary>
    public static void RefuseLongTracks(StratumFrame stratum, LayoutDesign design, double metres, double spacingMetres)
    {
        if (metres > spacingMetres)
        {
            var (what, key) = design.Kind == LayoutKind.Loops ? ("a side", "layout.side") : ("a length", "layout.length");
            throw new InputException(new Problem(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{what} of {metres / 1000:0.###} km is more than the spacing of {spacingMetres / 1000:0.###} km that the layout of stratum '{stratum.Stratum.Name}' comes to, so neighbours would overlap; choose shorter ones or ask for less"),
                Key: key));
        }
    }

    /// <summary>What remains when points are sized neither by spacing nor by number.</summary>
    public static Exception NotForPoints(StratumFrame stratum, LayoutDesign design) => design.Sizing is Sizing.TotalLength
        ? new InputException(new Problem(
            $"stratum '{stratum.Stratum.Name}' has points, and points have no length; give spacing or points instead", Key: "layout.total_length"))
        : new InvalidOperationException("size_from = \"precision\" is turned into a number before a layout is made");
}
