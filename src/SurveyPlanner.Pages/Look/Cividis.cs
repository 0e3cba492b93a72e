using System.Globalization;

namespace SurveyPlanner.Pages.Look;

/// <summary>
/// The cividis colour scale: lightness rises evenly, so that it reads in grey and with any colour vision.
/// Source: Nuñez, Anderton &amp; Renslow 2018, PLOS ONE 13(7): e0199239 (free of all copyright); nine even steps of it, straight lines between them.
/// </summary>
internal static class Cividis
{
    private static readonly int[] Steps =
        [0x002051, 0x11366c, 0x3c4d6e, 0x62646f, 0x7f7c75, 0x9a9478, 0xbbaf71, 0xe2cb5c, 0xfdea45];

    /// <summary>The colour at a share of the way from dark (0) to light (1), as <c>#rrggbb</c>.</summary>
    public static string At(double share)
    {
        var place = Math.Clamp(share, 0, 1) * (Steps.Length - 1);
        var below = Math.Min((int)place, Steps.Length - 2);
        var part = place - below;
        var colour = 0;
        for (var shift = 16; shift >= 0; shift -= 8)
        {
            var (a, b) = ((Steps[below] >> shift) & 0xff, (Steps[below + 1] >> shift) & 0xff);
            colour |= (int)Math.Round(a + (part * (b - a))) << shift;
        }

        return "#" + colour.ToString("x6", CultureInfo.InvariantCulture);
    }
}
