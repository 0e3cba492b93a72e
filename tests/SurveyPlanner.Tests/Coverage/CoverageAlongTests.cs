using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

public class CoverageAlongTests
{
    /// <summary>
    /// Lines 1.5 km apart, half-width 0.5 km, in the triangle (0, 0), (8, 0), (0, 6) km: along the line at x = t the stretch between it and the slope is
    /// uniform on [0, 8 - t], so that for t from 0.5 to 7.5 the mean coverage is (0.5 + (0.125 + 0.5 (7.5 - t)) / (8 - t)) / 1.5, by hand.
    /// </summary>
    [Fact]
    public void Along_parallel_lines_it_is_the_integral_of_the_exact_coverage()
    {
        var (coverage, layout) = Run(PlaneStrata.Triangle(8_000, 6_000), PlaneStrata.LinesAcrossX(1_500, 500));
        double At(Transect transect) => transect.Pieces[0].Plane[0].X / 1000;
        var inside = coverage.Transects.Zip(layout.Transects).Where(pair => At(pair.Second) is > 0.5 and < 7.5).ToList();
        Assert.True(inside.Count >= 4);
        foreach (var (along, transect) in inside)
        {
            var t = At(transect);
            Assert.Equal(transect.Id, along.TransectId);
            Assert.True(along.IsExact);
            Assert.Equal((0.5 + ((0.125 + (0.5 * (7.5 - t))) / (8 - t))) / 1.5, along.Mean!.Value, 1e-4);
        }
    }

    /// <summary>
    /// To first order in the half-width a leg across a rectangle lies in coverage p = 2w secθ / H but for its ends, where coverage falls to p / 2.
    /// </summary>
    [Fact]
    public void Along_a_zigzag_it_is_simulated_at_places_on_the_leg()
    {
        var design = new LayoutDesign(LayoutKind.Zigzag, new Sizing.Spacing(5_000), new Bearing.Degrees(0), 100);
        var (coverage, layout) = Run(PlaneStrata.Rectangle(100_000, 10_000), design);
        var expected = 2 * 100 * Math.Sqrt(5) / 10_000;
        var whole = coverage.Transects.Zip(layout.Transects).Where(pair => pair.Second.LengthMetres > 0.95 * layout.Transects.Max(one => one.LengthMetres)).ToList();
        Assert.True(whole.Count > 10);
        foreach (var (along, _) in whole)
        {
            Assert.False(along.IsExact);
            Assert.InRange(along.Mean!.Value, 0.95 * expected, 1.01 * expected);
        }
    }

    [Fact]
    public void At_a_point_it_is_the_coverage_there()
    {
        var design = PlaneStrata.LinesAcrossX(2_000, 300, LayoutKind.PointGrid);
        var stratum = PlaneStrata.Triangle(8_000, 6_000);
        var (coverage, layout) = Run(stratum, design);
        var generator = PlaneStrata.Prepare(stratum, design);
        Assert.NotEmpty(layout.Transects);
        foreach (var (along, transect) in coverage.Transects.Zip(layout.Transects))
        {
            var place = transect.Pieces[0].Plane[0];
            Assert.Equal(PlaneStrata.ExactAt(generator, place.X, place.Y), along.Mean!.Value, 1e-12);
        }
    }

    [Fact]
    public void What_lies_outside_the_stratum_has_no_part_in_it()
    {
        var design = PlaneStrata.LinesAcrossX(2_000, 300, LayoutKind.PointGrid) with { Edge = EdgeRule.Plus };
        var (coverage, layout) = Run(PlaneStrata.Rectangle(8_000, 6_000), design);
        var pairs = coverage.Transects.Zip(layout.Transects).ToLookup(pair => IsInside(pair.Second), pair => pair.First.Mean);
        Assert.NotEmpty(pairs[false]);
        Assert.All(pairs[false], Assert.Null);
        Assert.All(pairs[true], mean => Assert.Equal(Math.PI * 0.09 / 4, mean!.Value, 1e-3));

        static bool IsInside(Transect transect) => transect.Start is { Lon: > 0 and < 0.08, Lat: > 0 and < 0.06 };
    }

    /// <summary>Pieces of all lengths, some shorter than a step: each counts by its length.</summary>
    [Theory]
    [InlineData(20_000)]
    [InlineData(100)]
    public void Every_stretch_of_a_transect_has_the_weight_of_its_length(int most)
    {
        foreach (var stratum in RandomShapes.Sample(10))
        {
            var generator = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(1_500, 500));
            var transects = Judge.Draw(generator).Transects;
            var places = CoverageAlong.Places(generator.Stratum, transects, CoverageAlong.Step(generator.Stratum, transects, most), least: 1);
            for (var i = 0; i < transects.Length; i++)
            {
                var (total, moment) = (0.0, 0.0);
                foreach (var piece in transects[i].Pieces)
                {
                    var (from, to) = (generator.Stratum.Frame.ToFrame(piece.Plane[0].X, piece.Plane[0].Y), generator.Stratum.Frame.ToFrame(piece.Plane[^1].X, piece.Plane[^1].Y));
                    total += Math.Abs(to.X - from.X);
                    moment += Math.Abs(to.X - from.X) * (from.X + to.X) / 2;
                }

                var own = places.Where(place => place.Transect == i).ToList();
                Assert.Equal(total, own.Sum(place => place.Weight), 1e-6 * total);
                Assert.Equal(moment / total, own.Sum(place => place.Weight * place.X) / own.Sum(place => place.Weight), 1e-3);
            }
        }
    }

    /// <summary>Held against steps thirty times finer. Shapes with borders across the lines, at which coverage jumps, are among them.</summary>
    [Fact]
    public void The_mean_of_exact_coverage_errs_by_less_than_half_a_percent_of_nominal()
    {
        var worst = 0.0;
        foreach (var stratum in RandomShapes.Sample(20))
        {
            foreach (var halfWidth in new[] { 100, 500 })
            {
                var generator = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(1_500, halfWidth));
                var transects = Judge.Draw(generator).Transects;
                var means = Means(halfWidth / 16.0, CoverageAlong.LeastExactPlaces);
                var finer = Means(halfWidth / 500.0, 1000);
                for (var i = 0; i < transects.Length; i++)
                {
                    worst = Math.Max(worst, Math.Abs(finer[i].Mean!.Value - means[i].Mean!.Value) / generator.NominalCoverage);
                }

                ImmutableArray<TransectCoverage> Means(double step, int least)
                {
                    var places = CoverageAlong.Places(generator.Stratum, transects, step, least);
                    var grid = CellGrid.OfPlaces([.. places.Select(place => (place.X, place.Y))], out var order);
                    var exact = ExactCoverage.At(generator, grid)!;
                    var inOrder = new double[places.Count];
                    for (var i = 0; i < inOrder.Length; i++)
                    {
                        inOrder[order[i]] = exact[i];
                    }

                    return CoverageAlong.Means(transects, places, inOrder, isExact: true, isTold: true);
                }
            }
        }

        Assert.InRange(worst, 1e-9, 5e-3);
    }

    private static (StratumCoverage Coverage, Layout Layout) Run(SurveyPlanner.Regions.Stratum stratum, LayoutDesign design)
        => (Judge.Of(stratum, design, 500), Judge.Draw(PlaneStrata.Prepare(stratum, design)));
}
