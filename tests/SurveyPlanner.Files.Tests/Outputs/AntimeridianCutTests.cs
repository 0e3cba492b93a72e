using System.Collections.Immutable;
using CsCheck;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class AntimeridianCutTests
{
    [Fact]
    public void The_example_of_RFC_7946_section_3_1_9_is_cut_as_it_says()
    {
        // RFC 7946, 3.1.9: a line from 45°N 170°E across to 45°N 170°W is [[[170,45],[180,45]],[[-180,45],[-170,45]]].
        var parts = AntimeridianCut.Cut(TestPlans.Path(170, 45, -170, 45));

        Assert.Equal(2, parts.Length);
        Assert.Equal(TestPlans.Path(170, 45, 180, 45), parts[0]);
        Assert.Equal(TestPlans.Path(-180, 45, -170, 45), parts[1]);
    }

    [Fact]
    public void The_latitude_of_a_cut_lies_on_the_straight_edge()
    {
        var parts = AntimeridianCut.Cut(TestPlans.Path(-179, 10, 179, 14));

        Assert.Equal(TestPlans.Path(-179, 10, -180, 12), parts[0]);
        Assert.Equal(TestPlans.Path(180, 12, 179, 14), parts[1]);
    }

    [Fact]
    public void A_path_that_only_touches_180_is_left_whole()
    {
        Assert.Single(AntimeridianCut.Cut(TestPlans.Path(179, 0, -180, 1)));
        Assert.Single(AntimeridianCut.Cut(TestPlans.Path(-180, 0, 179, 1)));
        Assert.Single(AntimeridianCut.Cut(TestPlans.Path(-180, 0, -180, 1)));
        Assert.Single(AntimeridianCut.Cut(TestPlans.Path(-179, 0, -180, 0.5, -179, 1)));
    }

    [Fact]
    public void A_path_with_a_vertex_on_180_has_it_once_on_each_side()
    {
        var parts = AntimeridianCut.Cut(TestPlans.Path(179, 0, -180, 1, -179, 2));

        Assert.Equal(TestPlans.Path(179, 0, 180, 1), parts[0]);
        Assert.Equal(TestPlans.Path(-180, 1, -179, 2), parts[1]);
    }

    [Fact]
    public void Longitudes_of_another_turn_are_the_same_places() =>
        Assert.Equal(TestPlans.Path(10, 1, 11, 2), AntimeridianCut.Cut(TestPlans.Path(370, 1, 371, 2))[0]);

    [Fact]
    public void Every_part_keeps_to_one_side_and_no_length_is_lost()
    {
        // A walk of short steps near 180°: lengths in degrees add up however often it crosses.
        var step = Gen.Select(Gen.Double[-3, 3], Gen.Double[-1, 1]);
        step.Array[1, 30].Hold(2000, seed: 1, steps =>
        {
            var path = steps.Aggregate(
                ImmutableArray.Create(new LonLat(179.5, 0)),
                (walked, next) => walked.Add(new LonLat(Longitude.Normalise(walked[^1].Lon + next.Item1), walked[^1].Lat + next.Item2)));
            var parts = AntimeridianCut.Cut(path);

            // Each crossing may drop a part that vanishes in rounding, at most 1e-7 degrees long.
            var expected = steps.Sum(next => Math.Sqrt((next.Item1 * next.Item1) + (next.Item2 * next.Item2)));
            Assert.Equal(expected, parts.Sum(Length), 30 * 1e-7);
            Assert.All(parts.SelectMany(part => part), vertex => Assert.InRange(vertex.Lon, -180, 180));
            Assert.All(parts.Skip(1), part => Assert.Equal(180, Math.Abs(part[0].Lon)));
            Assert.All(parts.SkipLast(1), part => Assert.Equal(180, Math.Abs(part[^1].Lon)));
        });
    }

    [Fact]
    public void A_box_over_180_has_west_greater_than_east_as_in_RFC_7946_section_5_2()
    {
        // RFC 7946, 5.2: the Fiji archipelago, 16°S to 20°S, 177°E to 178°W, is [177.0, -20.0, -178.0, -16.0].
        var box = BoundingBox.Round([TestPlans.Path(177, -20, 180, -18), TestPlans.Path(-180, -18, -178, -16)]);

        Assert.Equal(new BoundingBox(177, -20, -178, -16), box);
    }

    [Fact]
    public void A_box_with_a_pole_goes_all_the_way_round_as_in_RFC_7946_section_5_3()
    {
        // RFC 7946, 5.3: a box with the North Pole runs from -180 to 180.
        var box = BoundingBox.Round([TestPlans.Path(10, 80, 10, 90)]);

        Assert.Equal(new BoundingBox(-180, 80, 180, 90), box);
    }

    [Fact]
    public void A_box_elsewhere_is_the_plain_one_and_round_nothing_there_is_none()
    {
        Assert.Equal(new BoundingBox(-10, 0, 30, 5), BoundingBox.Round([TestPlans.Path(20, 0, 30, 5), TestPlans.Path(-10, 1)]));
        Assert.Equal(new BoundingBox(-170, 0, 170, 1), BoundingBox.Round([TestPlans.Path(-170, 0, 0, 1), TestPlans.Path(0, 1, 170, 1)]));
        Assert.Null(BoundingBox.Round([]));
    }

    private static double Length(ImmutableArray<LonLat> part) => part.Zip(part.Skip(1), (a, b) =>
        Math.Sqrt(((b.Lon - a.Lon) * (b.Lon - a.Lon)) + ((b.Lat - a.Lat) * (b.Lat - a.Lat)))).Sum();
}
