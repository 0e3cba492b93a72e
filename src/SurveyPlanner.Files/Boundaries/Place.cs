namespace SurveyPlanner.Files.Boundaries;

/// <summary>Names for places inside a boundary file, counted from 1, the same in every format.</summary>
internal static class Place
{
    public static string Feature(int number) => $"feature {number}";

    /// <summary>Ring 1 is the outer one. The part is named only where a feature has several.</summary>
    public static string Ring(int feature, int part, int partCount, int ring)
        => partCount > 1 ? $"feature {feature}, part {part}, ring {ring}" : $"feature {feature}, ring {ring}";

    public static string Vertex(string ring, int vertex) => $"{ring}, vertex {vertex}";
}
