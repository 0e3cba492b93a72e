using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>Which options belong to which kinds of layout, and which a kind cannot do without.</summary>
internal static class LayoutOptions
{
    private static readonly Option[] All =
    [
        new("turning", design => design.Turning != ZigzagTurning.EqualSpaced, LayoutKind.Zigzag),
        new("crossed", design => design.Crossed, LayoutKind.Zigzag),
        new("placement", design => design.Placement != LinePlacement.Independent, LayoutKind.RandomParallel),
        new("min_length", design => design.MinLengthMetres > 0, LayoutKind.Parallel, LayoutKind.RandomParallel, LayoutKind.Zigzag, LayoutKind.Segments, LayoutKind.Loops),
        new("length", design => design.SegmentMetres is not null, LayoutKind.Segments) { IsRequired = true },
        new("side", design => design.SideMetres is not null, LayoutKind.Loops) { IsRequired = true },
        new("crossing", design => design.Crossing != CrossingRule.Clip, LayoutKind.Segments, LayoutKind.Loops),
        new("grid", design => design.Grid != GridShape.Square, LayoutKind.PointGrid),
        new("step", design => design.StepMetres is not null, LayoutKind.PointsOnLines) { IsRequired = true },
        new("reserve", design => design.Reserve > 0, LayoutKind.RandomPoints, LayoutKind.BalancedPoints),
    ];

    /// <exception cref="InputException">Options that do not belong to the kind, that it lacks, or that contradict each other: all of them.</exception>
    public static void RefuseMisplaced(Stratum stratum, LayoutDesign design)
    {
        var problems = All.SelectMany(option => Problems(option, design)).Concat(Contradictions(design)).ToList();
        if (problems.Count > 0)
        {
            throw new InputException(problems.Select(problem => problem with { Message = $"{problem.Message} (stratum '{stratum.Name}')" }));
        }
    }

    private static IEnumerable<Problem> Problems(Option option, LayoutDesign design)
    {
        var (belongs, isGiven, kind) = (option.Kinds.Contains(design.Kind), option.IsGiven(design), ChoiceWord.Of(design.Kind));
        if (isGiven && !belongs)
        {
            yield return new Problem(
                $"belongs to {string.Join(", ", option.Kinds.Select(ChoiceWord.Of))}, and the kind here is {kind}; take it out", Key: $"layout.{option.Key}");
        }

        if (belongs && option.IsRequired && !isGiven)
        {
            yield return new Problem($"is missing: {kind} cannot do without it", Key: $"layout.{option.Key}");
        }
    }

    private static IEnumerable<Problem> Contradictions(LayoutDesign design)
    {
        if (design.Bearing is Bearing.Random && design.Kind != LayoutKind.Segments)
        {
            yield return new Problem("only segments can each have a bearing of their own; give degrees, \"long-axis\" or \"short-axis\"", Key: "layout.bearing");
        }

        if (design.MinLengthMetres > 0 && design.Crossing == CrossingRule.Keep)
        {
            yield return new Problem("nothing is cut where crossing = \"keep\", so there are no short pieces to leave out; take one of the two out", Key: "layout.min_length");
        }

        if (design.MinLengthMetres > (design.SegmentMetres ?? 4 * design.SideMetres ?? double.PositiveInfinity))
        {
            yield return new Problem(
                string.Create(CultureInfo.InvariantCulture, $"is longer than a whole one of the {ChoiceWord.Of(design.Kind)}, so nothing would be left; choose a smaller one"),
                Key: "layout.min_length");
        }
    }

    /// <param name="Key">Its key in the plan file.</param>
    /// <param name="IsGiven">Whether a design says something other than the default.</param>
    /// <param name="Kinds">The kinds it belongs to.</param>
    private sealed record Option(string Key, Func<LayoutDesign, bool> IsGiven, params LayoutKind[] Kinds)
    {
        public bool IsRequired { get; init; }
    }
}
