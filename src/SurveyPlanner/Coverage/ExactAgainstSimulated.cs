namespace SurveyPlanner.Coverage;

/// <summary>Holds simulated coverage against the closed form.</summary>
internal static class ExactAgainstSimulated
{
    /// <summary>
    /// Largest difference over all cells, in standard errors. The error beside a simulated figure comes from the draws that covered the place; where
    /// those happen to be few it is too small just when the figure is too low. So it is taken no smaller than the exact value lets expect:
    /// the error of plain draws, √(Mπ(1 − π)) / M, times what stratifying the draws saves in this stratum as a whole. Derivation: docs/methods/coverage.md.
    /// </summary>
    public static double MaxAbsZ(ReadOnlySpan<CoverageCell> cells, int replicates)
    {
        var (changes, plain) = (0.0, 0.0);
        foreach (ref readonly var cell in cells)
        {
            changes += Squared(cell.StandardError * replicates);
            plain += PlainVariance(cell, replicates);
        }

        // Never more than plain draws have; a closed form of 0 everywhere leaves nothing to compare.
        var saved = plain > 0 ? Math.Min(1, changes / plain) : 0;
        var largest = 0.0;
        foreach (ref readonly var cell in cells)
        {
            var variance = Math.Max(Squared(cell.StandardError * replicates), saved * PlainVariance(cell, replicates));
            largest = Math.Max(largest, Math.Abs(cell.Simulated - cell.Exact!.Value) * replicates / Math.Sqrt(variance));
        }

        return largest;
    }

    private static double PlainVariance(in CoverageCell cell, int replicates) => replicates * cell.Exact!.Value * (1 - cell.Exact.Value);

    private static double Squared(double x) => x * x;
}
