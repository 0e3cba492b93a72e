using SurveyPlanner.Regions;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Turns a shape anticlockwise about the origin, shifts it, and walks its rings the other way round from another vertex.</summary>
internal sealed class Mover(double degrees, double east, double north)
{
    private readonly double _sin = Math.Sin(degrees * Math.PI / 180);
    private readonly double _cos = Math.Cos(degrees * Math.PI / 180);

    public PlaneShape Move(PlaneShape shape)
    {
        var builder = new PlaneShapeBuilder();
        for (var part = 0; part < shape.PartCount; part++)
        {
            builder.StartPart();
            for (var ring = shape.PartStarts[part]; ring < shape.PartStarts[part + 1]; ring++)
            {
                builder.StartRing();
                var (start, count) = (shape.RingStarts[ring], shape.RingStarts[ring + 1] - shape.RingStarts[ring]);
                for (var i = 0; i < count; i++)
                {
                    var vertex = start + ((count + 2 - i) % count);
                    var (x, y) = (shape.X[vertex], shape.Y[vertex]);
                    builder.Add((x * _cos) - (y * _sin) + east, (x * _sin) + (y * _cos) + north);
                }
            }
        }

        return builder.Build();
    }
}
