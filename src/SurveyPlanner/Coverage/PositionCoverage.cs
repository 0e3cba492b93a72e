using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Coverage;

/// <summary>Coverage at one position, of a detection say: what a Horvitz-Thompson estimator divides by.</summary>
/// <param name="Position">The position, degrees.</param>
/// <param name="Stratum">The stratum that it lies in; null where it lies outside all of them, and nothing else is known.</param>
/// <param name="Exact">Probability of being covered at least once, from the closed form; null where none exists.</param>
/// <param name="Simulated">Share of simulated draws that covered exactly this position at least once.</param>
/// <param name="ExpectedTimes">Mean number of times covered, simulated.</param>
/// <param name="StandardError">Standard error of <paramref name="Simulated"/>.</param>
public sealed record PositionCoverage(
    LonLat Position, string? Stratum, double? Exact = null, double? Simulated = null, double? ExpectedTimes = null, double? StandardError = null)
{
    public bool IsOutside => Stratum is null;

    /// <summary>The probability to use: exact where it exists; null outside.</summary>
    public double? Best => Exact ?? Simulated;
}

/// <summary>Finds the stratum of each position and its coverage there.</summary>
internal static class CoverageAtPositions
{
    /// <summary>Results in the order of the positions.</summary>
    public static ImmutableArray<PositionCoverage> Of(
        IReadOnlyList<LonLat> positions,
        EqualAreaProjection projection,
        IReadOnlyList<LayoutGenerator> generators,
        CoverageCalculator calculator,
        IProgress<double>? progress)
    {
        var results = positions.Select(position => new PositionCoverage(position, Stratum: null)).ToArray();
        var planePoints = positions.Select(projection.Project).ToArray();
        for (var stratum = 0; stratum < generators.Count; stratum++)
        {
            var generator = generators[stratum];
            var (places, indices) = (new List<(double X, double Y)>(), new List<int>());
            for (var i = 0; i < results.Length; i++)
            {
                // The far side of the Earth may have no place in the plane at all: not a number lies inside nothing.
                var (x, y) = generator.Stratum.Frame.ToFrame(planePoints[i].X, planePoints[i].Y);
                if (results[i].IsOutside && generator.Stratum.Region.Contains(x, y))
                {
                    places.Add((x, y));
                    indices.Add(i);
                }
            }

            var part = ProgressPart.Of(progress, stratum, generators.Count);
            var found = calculator.At(generator, places.ToArray(), (uint)stratum, part);
            for (var i = 0; i < found.Length; i++)
            {
                var (exact, simulated, times, error) = found[i];
                results[indices[i]] = new PositionCoverage(
                    positions[indices[i]], generator.Stratum.Stratum.Name, exact, simulated, times, error);
            }
        }

        return [.. results];
    }
}
