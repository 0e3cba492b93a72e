using System.Globalization;

namespace SurveyPlanner.Pages.Words;

/// <summary>Numbers as SVG attributes need them.</summary>
internal static class Svg
{
    /// <summary>A length or an angle to a tenth.</summary>
    public static string N(double value)
    {
        var text = value.ToString("0.#", CultureInfo.InvariantCulture);
        return text == "-0" ? "0" : text;
    }
}
