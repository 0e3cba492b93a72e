namespace SurveyPlanner.Coverage;

/// <summary>How finely coverage probability is looked at.</summary>
/// <param name="Cells">Number of cells over the whole region; null lets the program choose so that the smallest stratum has at least 500.</param>
/// <param name="Replicates">Number of simulated draws of the layout.</param>
public sealed record CoverageDesign(int? Cells = null, int Replicates = CoverageDesign.DefaultReplicates)
{
    public const int DefaultReplicates = 1000;

    /// <summary>More draws than this are not taken.</summary>
    public const int MostReplicates = 1_000_000;
}
