using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>Independent points, uniform over the stratum. In the order drawn.</summary>
internal sealed class RandomPoints : ListedPoints
{
    private readonly UniformPlaces _places;

    public RandomPoints(StratumFrame stratum, LayoutDesign design)
        : base(stratum, design, CountFor(stratum, design))
        => _places = new UniformPlaces(stratum.Clip);

    public override double NominalCoverage
        => 1 - Math.Pow(1 - Math.Min(1, Math.PI * Stratum.HalfWidthMetres * Stratum.HalfWidthMetres / Stratum.Clip.AreaSquareMetres), Count);

    protected override void AddList(int passedOver, int count, ref PhiloxStream random, PieceBuffer output)
    {
        for (var i = 0; i < passedOver + count; i++)
        {
            var (x, y) = _places.Draw(ref random);
            if (i >= passedOver)
            {
                output.Add(i - passedOver, x, y, x, y);
            }
        }
    }
}
