namespace SurveyPlanner.Pages.Look;

/// <summary>
/// The colours of every page, map and chart. Contrast of each pair in use is held by a test
/// (WCAG 2.2: text 4.5:1, lines and controls 3:1).
/// </summary>
internal static class Tokens
{
    /// <summary>Outside the region on a map.</summary>
    public const string Paper = "#f6f4ef";

    /// <summary>Ground of a page.</summary>
    public const string Ground = "#ffffff";

    /// <summary>Text and transects.</summary>
    public const string Ink = "#12222b";

    /// <summary>Secondary text.</summary>
    public const string Muted = "#56616e";

    /// <summary>Graticule and rules: decoration that carries no meaning of its own.</summary>
    public const string Hairline = "#c3ccd4";

    /// <summary>Outline of the study region.</summary>
    public const string Coast = "#41606e";

    /// <summary>Direction of travel, warnings, the selected thing; nothing else.</summary>
    public const string Signal = "#b3401f";

    /// <summary>Links, buttons, focus.</summary>
    public const string Action = "#0b5c7a";

    /// <summary>Hatch of closed areas and of places without coverage.</summary>
    public const string Hatch = "#7c868f";

    /// <summary>Lines of an unrandomised preview.</summary>
    public const string Sketch = "#7a8794";

    /// <summary>Land on the small globe that shows where on Earth the region lies.</summary>
    public const string GlobeLand = "#d9d5c7";

    /// <summary>Fills of the strata, in turn; every stratum carries its name as well.</summary>
    public static readonly IReadOnlyList<string> StratumFills = ["#e6f0f4", "#eef0e2", "#f3e9e4", "#ebe7f1"];

    /// <summary>The system's sans serif.</summary>
    public const string Sans = "system-ui,'Segoe UI','Helvetica Neue',Arial,sans-serif";
}
