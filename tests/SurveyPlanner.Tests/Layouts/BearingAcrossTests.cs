using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Lines at right angles to a coast or contour drawn on the map.</summary>
public class BearingAcrossTests
{
    private static readonly LonLat Centre = new(10, 60);

    [Theory]
    [InlineData(10, 59, 10, 61, 90)] // a coast that runs north
    [InlineData(10, 61, 10, 59, 90)] // or south
    [InlineData(9.99, 60, 10.01, 60, 0)] // east, near the centre
    public void A_straight_coast_is_crossed_at_right_angles(double lon0, double lat0, double lon1, double lat1, double expected)
        => Assert.Equal(expected, Bearing([new(lon0, lat0), new(lon1, lat1)]), 0.01);

    /// <summary>Ten degrees to the east, north itself leans west by 10° × sin 60° against the centre's: meridians converge.</summary>
    [Fact]
    public void North_is_that_of_the_centre()
        => Assert.Equal(90 - (10 * Math.Sin(60 * Math.PI / 180)), Bearing([new(20, 59.9), new(20, 60.1)]), 0.1);

    /// <summary>Legs to the north-east and south-east, twice as long to the north-east: the mean of doubled angles is (90° and 270°) 90°, so north-east.</summary>
    [Fact]
    public void Legs_count_by_their_length_and_not_by_their_number()
    {
        var east = 0.01 / Math.Cos(60 * Math.PI / 180);
        var wound = Bearing([new(10, 60), new(10 + (2 * east), 60.02), new(10 + (3 * east), 60.01)]);
        Assert.Equal(135, wound, 0.2);
    }

    [Fact]
    public void A_line_without_a_direction_is_refused()
    {
        var east = 0.01 / Math.Cos(60.005 * Math.PI / 180);
        ImmutableArray<LonLat> square = [new(10, 60), new(10 + east, 60), new(10 + east, 60.01), new(10, 60.01), new(10, 60)];
        Assert.Throws<InputException>(() => Bearing(square));
        Assert.Throws<InputException>(() => Bearing([new(10, 60), new(10, 60)]));
        Assert.Throws<InputException>(() => Bearing([]));
    }

    private static double Bearing(ImmutableArray<LonLat> line)
    {
        var design = EveryKind.Of(LayoutKind.Parallel, 1000) with { Bearing = new Bearing.Across([line]) };
        return new StratumFrame(EveryKind.Islands with { CentreLonLat = Centre }, design).BearingDegrees;
    }
}
