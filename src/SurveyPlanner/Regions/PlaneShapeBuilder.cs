using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>Collects rings into a <see cref="PlaneShape"/>: start a part, start its rings (shell first), add vertices without closing them.</summary>
internal sealed class PlaneShapeBuilder
{
    private readonly ImmutableArray<double>.Builder _x = ImmutableArray.CreateBuilder<double>();
    private readonly ImmutableArray<double>.Builder _y = ImmutableArray.CreateBuilder<double>();
    private readonly ImmutableArray<int>.Builder _ringStarts = ImmutableArray.CreateBuilder<int>();
    private readonly ImmutableArray<int>.Builder _partStarts = ImmutableArray.CreateBuilder<int>();

    public void StartPart() => _partStarts.Add(_ringStarts.Count);

    public void StartRing() => _ringStarts.Add(_x.Count);

    public void Add(double x, double y)
    {
        _x.Add(x);
        _y.Add(y);
    }

    /// <summary>All parts of another shape.</summary>
    public void Add(PlaneShape shape)
    {
        for (var part = 0; part < shape.PartCount; part++)
        {
            AddPart(shape, part);
        }
    }

    /// <summary>One part of another shape.</summary>
    public void AddPart(PlaneShape shape, int part)
    {
        StartPart();
        for (var ring = shape.PartStarts[part]; ring < shape.PartStarts[part + 1]; ring++)
        {
            StartRing();
            for (var i = shape.RingStarts[ring]; i < shape.RingStarts[ring + 1]; i++)
            {
                Add(shape.X[i], shape.Y[i]);
            }
        }
    }

    public PlaneShape Build()
    {
        _partStarts.Add(_ringStarts.Count);
        _ringStarts.Add(_x.Count);
        return new PlaneShape(_x.DrainToImmutable(), _y.DrainToImmutable(), _ringStarts.DrainToImmutable(), _partStarts.DrainToImmutable());
    }
}
