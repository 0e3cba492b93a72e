using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>Tries a layout along bearings from 0 to below 180 degrees.</summary>
internal static class BearingTrials
{
    // A prime, as the lattice of EffortIntegral wants; figures to choose a bearing by need no more.
    private const int Draws = 211;
    private const double LeastStepDegrees = 0.1;

    /// <param name="stratum">The stratum.</param>
    /// <param name="design">The layout; its own bearing is left aside.</param>
    /// <param name="everyDegrees">Step from one bearing to the next, from 0.1 to 180.</param>
    /// <param name="progress">Told the share that each bearing was of the whole.</param>
    /// <param name="stop">Stops the work.</param>
    public static ImmutableArray<BearingTrial> Of(
        Stratum stratum, LayoutDesign design, double everyDegrees, Action<double>? progress, CancellationToken stop)
    {
        if (!(everyDegrees is >= LeastStepDegrees and <= 180))
        {
            throw new InputException("bearings are tried in steps from 0.1 to 180 degrees; choose a step within them");
        }

        if (design.Bearing is Bearing.Random)
        {
            throw new InputException(new Problem($"the segments of stratum '{stratum.Name}' each have a bearing of their own, so there is none to try", Key: "layout.bearing"));
        }

        var count = (int)Math.Ceiling((180 / everyDegrees) - 1e-9);
        var trials = ImmutableArray.CreateBuilder<BearingTrial>(count);
        for (var i = 0; i < count; i++)
        {
            stop.ThrowIfCancellationRequested();
            trials.Add(Try(stratum, design, i * everyDegrees));
            progress?.Invoke(1.0 / count);
        }

        return trials.MoveToImmutable();
    }

    private static BearingTrial Try(Stratum stratum, LayoutDesign design, double degrees)
    {
        try
        {
            return new BearingTrial(degrees, Figures(LayoutKinds.Prepare(stratum, design with { Bearing = new Bearing.Degrees(degrees) })), null);
        }
        catch (InputException refusal)
        {
            return new BearingTrial(degrees, null, refusal.Problems[0].Message);
        }
    }

    private static BearingFigures Figures(LayoutGenerator generator)
    {
        var (lengthCv, offEffort, drawsWithLines) = (0.0, 0.0, 0);
        var spread = EffortIntegral.Over(
            generator,
            out var meanCount,
            Draws,
            pieces =>
            {
                offEffort += WayBetween(pieces) / Draws;
                if (LengthCv(pieces) is { } cv)
                {
                    lengthCv += cv;
                    drawsWithLines++;
                }
            });
        var mean = generator.Design.IsPoints ? generator.ExpectedCount : generator.ExpectedLength;
        return new BearingFigures(
            generator.SpacingMetres,
            generator.ExpectedCount ?? meanCount,
            mean is { } exact ? spread with { Mean = exact } : spread,
            generator.Design.IsPoints || drawsWithLines == 0 ? null : lengthCv / drawsWithLines,
            offEffort);
    }

    private static double WayBetween(ReadOnlySpan<Piece> pieces)
    {
        var total = 0.0;
        for (var i = 1; i < pieces.Length; i++)
        {
            var (dx, dy) = (pieces[i].FromX - pieces[i - 1].ToX, pieces[i].FromY - pieces[i - 1].ToY);
            total += Math.Sqrt((dx * dx) + (dy * dy));
        }

        return total;
    }

    /// <summary>Standard deviation over mean of the lengths of transects; null with fewer than two.</summary>
    private static double? LengthCv(ReadOnlySpan<Piece> pieces)
    {
        var (count, sum, squares) = (0, 0.0, 0.0);
        for (var i = 0; i < pieces.Length;)
        {
            var (transect, length) = (pieces[i].Transect, 0.0);
            for (; i < pieces.Length && pieces[i].Transect == transect; i++)
            {
                length += pieces[i].Length;
            }

            count++;
            sum += length;
            squares += length * length;
        }

        var mean = sum / count;
        return count < 2 ? null : Math.Sqrt(Math.Max(0, (squares / count) - (mean * mean))) / mean;
    }
}
