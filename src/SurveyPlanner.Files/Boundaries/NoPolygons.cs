namespace SurveyPlanner.Files.Boundaries;

/// <summary>The sentence for a file that holds no area, the same for every format.</summary>
internal static class NoPolygons
{
    public static string Sentence(int features, int lines, int closedLines, int points) => (lines, points) switch
    {
        ( > 0, _) when closedLines > 0 =>
            $"there is no polygon in the file, only {Wording.Count(lines, "line", "lines")}, {closedLines} of them closed; if that is the boundary, turn it into a polygon in a GIS program",
        ( > 0, _) => $"there is no polygon in the file, only {Wording.Count(lines, "line", "lines")}; close them and turn them into polygons in a GIS program",
        (_, > 0) => $"there is no polygon in the file, only {Wording.Count(points, "point", "points")}; a study region needs a polygon",
        _ when features > 0 => $"there is no polygon in the file: {Wording.Count(features, "feature has", "features have")} no geometry; export the boundary again",
        _ => "there is no polygon in the file, it has no features at all; export the boundary again",
    };
}

/// <summary>Keeps count of vertices, so that a hostile file cannot cost more than memory and time allow.</summary>
internal sealed class VertexBudget(string source)
{
    /// <summary>Twice what the largest honest coastline of a region needs; read and checked in well under a minute.</summary>
    public const int MostVertices = 2_000_000;

    private long _spent;

    public void Spend(int vertices)
    {
        _spent += vertices;
        if (_spent > MostVertices)
        {
            throw FileBytes.Refusal(source, $"the boundary has more than {MostVertices / 1_000_000} million vertices; simplify it in a GIS program (a tolerance of a few metres loses nothing that matters for a survey)");
        }
    }
}
