using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Fills in what a design takes from attributes of the boundary: spacing, bearing, half-width. An attribute holds a plain number; the plan says
/// what its unit is. All features of a stratum must agree on it.
/// </summary>
internal static class LayoutFields
{
    /// <summary>The design with plain values.</summary>
    /// <exception cref="InputException">An attribute is missing, differs within the stratum, or is no number that will do: all such problems.</exception>
    public static LayoutDesign Fill(LayoutDesign design, Stratum stratum)
    {
        var problems = new List<Problem>();
        double Number(string field, string key, Func<double, bool> isAllowed, string takes)
        {
            var complaint = Complaint(field, stratum, isAllowed, takes, out var number);
            if (complaint is not null)
            {
                problems.Add(new Problem(complaint, Key: key));
            }

            return number;
        }

        double Metres(LengthField field, string key) => field.MetresPerUnit * Number(field.Name, key, value => value > 0, "a number above 0");
        var filled = design;
        if (design.Sizing is Sizing.FromField spacing)
        {
            filled = filled with { Sizing = new Sizing.Spacing(Metres(spacing.Field, "layout.spacing_field")) };
        }

        if (design.Bearing is Bearing.FromField bearing)
        {
            filled = filled with
            {
                Bearing = new Bearing.Degrees(Number(bearing.Name, "layout.bearing_field", value => value is >= 0 and < 360, "degrees from 0 to below 360")),
            };
        }

        if (design.HalfWidthField is { } halfWidth)
        {
            filled = filled with { HalfWidthMetres = Metres(halfWidth, "layout.half_width_field"), HalfWidthField = null };
        }

        return problems.Count == 0 ? filled : throw new InputException(problems);
    }

    private static string? Complaint(string field, Stratum stratum, Func<double, bool> isAllowed, string takes, out double number)
    {
        number = 1;
        if (!stratum.Attributes.TryGetValue(field, out var text))
        {
            const int shown = 20;
            var known = stratum.Attributes.Count == 0
                ? "it has none"
                : $"it has: {string.Join(", ", stratum.Attributes.Keys.Take(shown).Select(name => $"'{name}'"))}";
            return $"stratum '{stratum.Name}' has no attribute '{field}' on whose value all its features agree; {known}";
        }

        return double.TryParse(text.Trim(), NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out number) && isAllowed(number)
            ? null
            : $"attribute '{field}' of stratum '{stratum.Name}' is '{text}', which is not {takes}, written with a decimal point and without its unit";
    }
}
