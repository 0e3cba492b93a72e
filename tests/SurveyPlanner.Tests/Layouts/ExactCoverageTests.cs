using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Coverage in closed form, of every kind that has one, against plain draws.</summary>
public class ExactCoverageTests
{
    private const int Draws = 10_000;
    private const ulong Seed = 20261201;

    public static TheoryData<string> Kinds => [.. Cases.Keys];

    // Wide strips, so that edges, gaps and neighbours all matter.
    private static Dictionary<string, LayoutDesign> Cases => new()
    {
        ["parallel"] = Wide("parallel", 400),
        ["parallel overlapping"] = Wide("parallel", 1000),
        ["parallel without short pieces"] = Wide("parallel", 400) with { MinLengthMetres = 2500 },
        ["parallel plus"] = Wide("parallel plus", 400),
        ["random-parallel"] = Wide("random-parallel", 400),
        ["random-parallel without short pieces"] = Wide("random-parallel", 400) with { MinLengthMetres = 2500 },
        ["random-parallel one-per-band"] = Wide("random-parallel one-per-band", 1000),
        ["segments"] = Wide("segments", 400),
        ["segments overlapping"] = Wide("segments", 1300),
        ["segments plus"] = Wide("segments plus", 400),
        ["segments kept"] = Wide("segments kept", 400),
        ["loops"] = Wide("loops", 400),
        ["loops kept"] = Wide("loops kept", 400),
        ["point-grid square"] = Wide("point-grid square", 600),
        ["point-grid triangular"] = Wide("point-grid triangular", 600),
        ["points-on-lines"] = Wide("points-on-lines", 290),
        ["random-points"] = Wide("random-points", 600),
        ["random-points plus"] = Wide("random-points plus", 600),
    };

    /// <summary>
    /// About 1,000 cells a kind, none beyond 4.5 standard errors: the chance of a false alarm is below 1 % a kind, and the seed is fixed.
    /// </summary>
    [Theory]
    [MemberData(nameof(Kinds))]
    public void Every_cell_is_within_four_and_a_half_standard_errors(string kind)
    {
        var generator = LayoutKinds.Prepare(EveryKind.Islands, Cases[kind]);
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 330);
        Assert.InRange(grid.Count, 900, 1500);
        var exact = ExactCoverage.At(generator, grid)!;
        var counter = new CoverageCounter(grid, generator.Stratum.HalfWidthMetres);
        var (buffer, offsets) = (new PieceBuffer(), new double[generator.OffsetRanges.Length]);
        for (var draw = 0; draw < Draws; draw++)
        {
            var random = new PhiloxStream(Seed, 99, 0, (uint)draw);
            for (var axis = 0; axis < offsets.Length; axis++)
            {
                offsets[axis] = random.NextDouble();
            }

            buffer.Clear();
            generator.Realise(offsets, ref random, buffer);
            counter.Count(buffer.Pieces, onlyRemember: false);
        }

        var counts = CoverageCounter.Sum([counter], Draws);
        for (var i = 0; i < grid.Count; i++)
        {
            Assert.InRange(exact[i], 0, 1);
            var standardError = Math.Sqrt(Math.Max(exact[i] * (1 - exact[i]), 1.0 / Draws) / Draws);
            Assert.True(
                Math.Abs(counts.Probability(i) - exact[i]) <= 4.5 * standardError,
                $"cell {i}: exact {exact[i]}, simulated {counts.Probability(i)}, {(counts.Probability(i) - exact[i]) / standardError} standard errors");
        }
    }

    /// <summary>Where there is no closed form nothing is claimed.</summary>
    [Theory]
    [InlineData("zigzag equal-spaced")]
    [InlineData("zigzag adjusted-angle")]
    [InlineData("segments each their own way")]
    [InlineData("segments without short pieces")]
    [InlineData("balanced-points")]
    public void Kinds_without_a_closed_form_have_none(string kind)
    {
        var generator = LayoutKinds.Prepare(EveryKind.Islands, EveryKind.Designs[kind]);
        Assert.Null(ExactCoverage.At(generator, CellGridBuilder.Build(generator.Stratum.Region, 2000)));
    }

    /// <summary>What dropping short pieces does: exact coverage adds up to the length that is left.</summary>
    [Fact]
    public void Without_short_pieces_mean_coverage_falls_with_the_length()
    {
        // A wide rectangle with a spit 400 m wide that lines cross in 400 m; the strips are narrow against both.
        var stratum = PlaneStrata.Of((0, 0), (6000, 0), (6000, 2000), (3200, 2000), (3200, 6000), (2800, 6000), (2800, 2000), (0, 2000));
        var design = EveryKind.Of(LayoutKind.Parallel, 500) with { HalfWidthMetres = 5 };
        var all = LayoutKinds.Prepare(stratum, design);
        var kept = LayoutKinds.Prepare(stratum, design with { MinLengthMetres = 1000 });
        Assert.Equal(stratum.Shape.AreaSquareMetres / 500, all.ExpectedLength!.Value, 1e-6);
        Assert.Equal(6000.0 * 2000 / 500, kept.ExpectedLength!.Value, 1e-6);
        var grid = CellGridBuilder.Build(kept.Stratum.Region, 50);
        var exact = ExactCoverage.At(kept, grid)!;
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                Assert.Equal(grid.RowY[row] < 2000 ? 10.0 / 500 : 0, exact[i], 1e-12);
            }
        }
    }

    private static LayoutDesign Wide(string kind, double halfWidth) => EveryKind.Designs[kind] with { HalfWidthMetres = halfWidth };
}
