using SurveyPlanner.Numerics;

namespace SurveyPlanner.Coverage;

/// <summary>
/// The random offsets of simulated draws, stratified: the range of the offset is cut into as many equal stretches as there are draws, and each
/// draw takes a random place in its own stretch. With two offsets their square is cut into a grid, walked to and fro, so that neighbouring
/// draws have neighbouring offsets. Each offset alone is still uniform, so shares of draws estimate probabilities without bias.
/// </summary>
internal sealed class StratifiedOffsets(ulong seed, uint stratum, int draws, int axes)
{
    // Two axes: a grid as square as the number of draws allows; what is left over is drawn plainly.
    private readonly int _across = axes < 2 ? draws : (int)Math.Sqrt(draws);

    /// <summary>Number of draws.</summary>
    public int Draws => draws;

    /// <summary>Fills the offsets of one draw and leaves the stream for whatever else the kind draws.</summary>
    public PhiloxStream Fill(int draw, Span<double> offsets)
    {
        var random = new PhiloxStream(seed, RandomPurpose.Coverage, stratum, (uint)draw);
        for (var axis = 0; axis < offsets.Length; axis++)
        {
            offsets[axis] = random.NextDouble();
        }

        if (offsets.Length == 1)
        {
            offsets[0] = (draw + offsets[0]) / draws;
        }
        else if (offsets.Length == 2)
        {
            var rows = draws / _across;
            var (row, column) = (draw / _across, draw % _across);
            if (row < rows)
            {
                column = row % 2 == 0 ? column : _across - 1 - column;
                offsets[0] = (column + offsets[0]) / _across;
                offsets[1] = (row + offsets[1]) / rows;
            }
        }

        return random;
    }
}
