namespace SurveyPlanner.Coverage;

/// <summary>
/// What a number of simulated draws can tell of single cells. Where coverage is rare most cells are covered by a few draws or none, and differ by
/// chance alone. Rules and reasons: docs/methods/coverage.md.
/// </summary>
internal static class EnoughDraws
{
    /// <summary>How many standard errors chance may explain: beyond three it leaves some three cells in a thousand.</summary>
    public const double StandardErrors = 3;

    // The two sides of a distinction that a simulation must make to be of use: coverage as planned, and half of it or less.
    private const double Half = 0.5;

    // Chance that any cell at all of half the nominal coverage goes without a draw, where that is taken for a sign of less.
    private const double AcceptedChance = 1e-6;

    /// <summary>Whether a cell of nominal coverage can be told from one of half of it.</summary>
    public static bool TellCells(StratumCoverage coverage)
        => coverage.IsExact || StandardErrors * coverage.StandardError <= Half * coverage.Nominal;

    /// <summary>Whether a cell that no draw covers must have less than half the nominal coverage.</summary>
    public static bool TellZero(StratumCoverage coverage) => coverage.IsExact || MostWithoutDraw(coverage) <= Half * coverage.Nominal;

    /// <summary>
    /// The coverage that no cell without a draw can have, but for the accepted chance. Draws that cover a place with chances p(1), …, p(M), of mean p,
    /// all miss it with the chance Π (1 − p(m)) ≤ (1 − p)^M ≤ exp(−Mp), however the draws are stratified; and there are so many cells.
    /// </summary>
    public static double MostWithoutDraw(StratumCoverage coverage) => LogCells(coverage) / coverage.Replicates;

    /// <summary>Draws from which on <see cref="TellZero"/> holds.</summary>
    public static double Needed(StratumCoverage coverage) => LogCells(coverage) / (Half * coverage.Nominal);

    private static double LogCells(StratumCoverage coverage) => Math.Log(coverage.Cells.Length / AcceptedChance);
}
