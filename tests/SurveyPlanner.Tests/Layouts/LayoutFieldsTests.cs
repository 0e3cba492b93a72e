using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Spacing, bearing and half-width that the boundary holds, zone by zone.</summary>
public class LayoutFieldsTests
{
    private static readonly LayoutDesign BySpacing = EveryKind.Of(LayoutKind.Parallel, 1) with { Sizing = new Sizing.FromField(new LengthField(Squares.Field, 1000)) };

    [Fact]
    public void Each_stratum_takes_its_own()
    {
        var plan = Draw(BySpacing with { HalfWidthField = new LengthField("wide", 0.3048), HalfWidthMetres = 0 }, ("north", "1.5"), ("south", "2"));
        Assert.Equal([1500, 2000], plan.Strata.Select(stratum => stratum.Layout.SpacingMetres));
        Assert.All(plan.Strata, stratum => Assert.Equal(250.5 * 0.3048, stratum.Layout.Design.HalfWidthMetres, 1e-9));
    }

    [Fact]
    public void All_that_is_wrong_is_said_at_once()
    {
        var design = BySpacing with { Bearing = new Bearing.FromField("heading"), HalfWidthField = new LengthField("with", 1) };
        var problems = Assert.Throws<InputException>(() => Draw(design, ("north", "2,5 km"))).Problems;
        Assert.Equal(["layout.spacing_field", "layout.bearing_field", "layout.half_width_field"], problems.Select(problem => problem.Key));
        Assert.Contains("is '2,5 km', which is not a number above 0", problems[0].Message, StringComparison.Ordinal);
        Assert.Contains("is '400', which is not degrees from 0 to below 360", problems[1].Message, StringComparison.Ordinal);
        Assert.Contains("has no attribute 'with' on whose value all its features agree; it has: 'heading', 'km between lines', 'wide', 'zone'", problems[2].Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("0")]
    [InlineData("-1")]
    [InlineData("NaN")]
    [InlineData("1e3")]
    [InlineData("")]
    public void A_spacing_must_be_a_plain_number_above_0(string value)
        => Assert.Single(Assert.Throws<InputException>(() => Draw(BySpacing, ("north", value))).Problems);

    [Fact]
    public void Features_of_one_stratum_must_agree()
    {
        var problem = Assert.Throws<InputException>(() => Draw(BySpacing, ("north", "1"), ("north", "2"))).Problems.Single();
        Assert.Contains("all its features agree", problem.Message, StringComparison.Ordinal);
    }

    private static SurveyPlan Draw(LayoutDesign layout, params (string Zone, string Value)[] squares)
    {
        var design = new SurveyDesign(
            "fields", 1, "zone", [], layout, ImmutableSortedDictionary<string, LayoutDesign>.Empty, EffortDesign.None, new CoverageDesign());
        return PlanSurvey.DrawOnly(design, new SurveyInputs(Squares.Boundary(squares), [], null));
    }
}
