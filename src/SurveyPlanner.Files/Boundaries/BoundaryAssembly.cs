using System.Collections.Immutable;
using SurveyPlanner.Files.CoordinateSystems;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// From outlines as a file has them to a <see cref="Boundary"/>: the same steps for every format. Coordinates are checked against the system
/// they are in, outlines mended, parts held against the rules of polygons, all in the file's own coordinates where its edges are straight;
/// then everything is turned to degrees.
/// </summary>
internal sealed class BoundaryAssembly
{
    private readonly string _source;
    private readonly RepairLog _log;
    private readonly CoordinateSystem _system;
    private readonly string _systemOrigin;
    private readonly Frame _frame;

    private BoundaryAssembly(string source, RepairLog log, CoordinateSystem system, string systemOrigin)
    {
        (_source, _log, _system, _systemOrigin) = (source, log, system, systemOrigin);
        _frame = new Frame(system);
    }

    public static Boundary Assemble(RawBoundary raw, string source, BoundaryOptions options, RepairLog log)
    {
        log.Add(raw.Notices);
        var (system, origin) = ChosenSystem.Of(raw, source, options);
        var inDegrees = system.DegreesPerUnit == 1 ? raw : InDegrees(raw, system.DegreesPerUnit);
        CoordinateCheck.Demand(inDegrees, system, source);
        return new BoundaryAssembly(source, log, system, origin).Assemble(inDegrees.Features);
    }

    private static RawBoundary InDegrees(RawBoundary raw, double degreesPerUnit)
    {
        return raw with { Features = [.. raw.Features.Select(feature => feature with { Polygons = [.. feature.Polygons.Select(Turn)] })] };

        RawPolygon Turn(RawPolygon polygon) => new(TurnRing(polygon.Shell), [.. polygon.Holes.Select(TurnRing)]);

        RawRing TurnRing(RawRing ring) => ring with { Points = [.. ring.Points.Select(point => new FilePoint(point.X * degreesPerUnit, point.Y * degreesPerUnit))] };
    }

    private Boundary Assemble(IReadOnlyList<RawFeature> raw)
    {
        var features = raw.Select(Clean).Where(feature => feature.Parts.Count > 0).ToList();
        if (features.SelectMany(feature => feature.Parts).Any(part => part.Shell.RoundPole || part.Holes.Exists(hole => hole.RoundPole)))
        {
            return PolarBoundary(features);
        }

        return Finish(Checked(features));
    }

    private WorkFeature Clean(RawFeature feature)
    {
        var parts = new List<Part>();
        foreach (var polygon in feature.Polygons)
        {
            if (Clean(polygon.Shell) is not { } shell)
            {
                _log.Repair("parts without any width were left out", polygon.Shell.Place, 0);
                continue;
            }

            var holes = new List<Outline>();
            foreach (var raw in polygon.Holes)
            {
                if (Clean(raw) is { } hole)
                {
                    holes.Add(hole);
                }
                else
                {
                    _log.Repair("holes without any width were left out", raw.Place, 0);
                }
            }

            parts.Add(new Part(shell, holes));
        }

        return new WorkFeature(feature, parts);
    }

    private Outline? Clean(RawRing raw)
    {
        var cleaner = new RingCleaner(_frame, _log);
        var closed = cleaner.Close(raw);
        if (!_system.IsGeographic)
        {
            return cleaner.Clean(raw, closed, roundPole: false);
        }

        if (raw.Points.Any(point => Math.Abs(point.X) > 180))
        {
            _log.Repair("longitudes beyond 180° were taken as a further turn of the globe", raw.Place, 0);
        }

        var (points, crossed, roundPole) = Longitudes.Unwrap(closed);
        if (!roundPole && points.Count > 0 && points[^1].X - points[0].X != 0)
        {
            throw FileBytes.Refusal(_source, "the outline goes round the globe more than once; correct it in a GIS program", raw.Place);
        }

        if (crossed)
        {
            _log.Repair("outlines that cross 180° without being cut there were read as running on across it", raw.Place, 0);
        }

        return cleaner.Clean(raw, points, roundPole);
    }

    /// <summary>The features held against the rules of polygons.</summary>
    private List<WorkFeature> Checked(List<WorkFeature> features)
    {
        if (_system.IsGeographic)
        {
            Longitudes.Align([.. features.SelectMany(feature => feature.Parts)]);
        }

        var distinct = RepeatedFeatures.LeaveOut(features, _frame, _log);
        var checker = new PartChecker(_frame, distinct.SelectMany(feature => feature.Parts).Sum(_frame.Area), _source, _log);
        var sound = distinct.Select(feature => new WorkFeature(feature.Raw, [.. feature.Parts.SelectMany(checker.Check)])).ToList();
        Demand(checker.Problems);
        var overlaps = new OverlapChecker(_frame, _source, _log);
        var apart = sound.Select(feature => new WorkFeature(feature.Raw, overlaps.Check(feature.Parts))).ToList();
        Demand(overlaps.Problems);
        return apart;
    }

    private static void Demand(IReadOnlyList<Problem> problems)
    {
        if (problems.Count > 0)
        {
            throw new InputException(problems);
        }
    }

    /// <summary>
    /// A boundary in degrees that goes round a pole is no polygon in the plane of longitude and latitude: it is taken into a polar plane, and
    /// goes on from there like a file in a polar projection.
    /// </summary>
    private Boundary PolarBoundary(List<WorkFeature> features)
    {
        var north = features.Sum(feature => feature.Parts.Sum(part => part.Shell.Points.Sum(point => point.Y))) >= 0;
        var plane = new PolarPlane(north, _system);
        var polar = new BoundaryAssembly(_source, _log, plane, _systemOrigin);
        var densifier = new Densifier(plane.FromDegrees, polar._frame.Distance, isTurn: false, Tolerance(features));
        var inPlane = features.Select(feature => new WorkFeature(feature.Raw, [.. feature.Parts.Select(part => part.Map(outline => densifier.Map(Closed(outline))))])).ToList();
        _log.Warn("the boundary goes round a pole");
        return polar.Finish(polar.Checked(inPlane));
    }

    /// <summary>Points from the first back to the first, which is a turn further on when the outline goes round a pole.</summary>
    private static List<FilePoint> Closed(Outline outline)
    {
        var (first, last) = (outline.Points[0], outline.Points[^1]);
        return [.. outline.Points, outline.RoundPole ? new FilePoint(first.X + (360 * Math.Sign(last.X - first.X)), first.Y) : first];
    }

    private double Tolerance(List<WorkFeature> features)
    {
        var parts = features.SelectMany(feature => feature.Parts).ToList();
        var perimeter = parts.Sum(part => part.Holes.Prepend(part.Shell).Sum(outline => _frame.Perimeter(outline.Points)));

        // An edge of length l that bends by h cuts off 2/3 h·l: with this h all edges together cut off less than 2e-7 of the area, even if all
        // bend the same way, which leaves room for the core to do the same under the promised 1e-6. Never above a quarter of a metre.
        return Math.Clamp(2e-7 * parts.Sum(_frame.Area) / perimeter, 0.0005, 0.25);
    }

    private Boundary Finish(List<WorkFeature> features)
    {
        if (features.Count == 0)
        {
            throw FileBytes.Refusal(_source, "nothing with an area is left of the boundary; export it again");
        }

        var inDegrees = _system.IsWgs84Degrees ? features : ToDegrees(features);
        return new Boundary(
            _source,
            [.. inDegrees.Select(feature => new BoundaryFeature(feature.Raw.Number, feature.Raw.Attributes, [.. feature.Parts.Select(ToPolygon)]))],
            $"{_system.Name}, from {_systemOrigin}" + (_system.DatumShift is { } shift ? $"; {shift}" : ""),
            _log.ToNotices());
    }

    private List<WorkFeature> ToDegrees(List<WorkFeature> features)
    {
        var degrees = new Frame(Wgs84Degrees.Instance);
        var densifier = new Densifier(ToWgs84, degrees.Distance, isTurn: true, Tolerance(features));
        var turned = features.Select(feature => new WorkFeature(feature.Raw, [.. feature.Parts.Select(part => part.Map(outline => densifier.Map([.. outline.Points, outline.Points[0]])).MapWhole(RunOn))])).ToList();
        Longitudes.Align([.. turned.SelectMany(feature => feature.Parts)]);
        return turned;
    }

    private FilePoint ToWgs84(FilePoint point)
    {
        var position = _system.ToWgs84(point.X, point.Y);
        return double.IsFinite(position.Lon) && Math.Abs(position.Lat) <= 90
            ? new FilePoint(position.Lon, position.Lat)
            : throw FileBytes.Refusal(
                _source,
                $"the position {Wording.Number(point.X)}, {Wording.Number(point.Y)} lies outside what {_system.Name} can hold; the coordinate system may be wrong ({_systemOrigin})");
    }

    /// <summary>Longitudes that jump at 180° made to run on.</summary>
    private static Outline RunOn(Outline outline)
    {
        var (points, _, roundPole) = Longitudes.Unwrap([.. outline.Points, outline.Points[0]]);
        points.RemoveAt(points.Count - 1);
        return new Outline(outline.Place, points) { RoundPole = roundPole };
    }

    private static GeographicPolygon ToPolygon(Part part) => new(ToRing(part.Shell), [.. part.Holes.Select(ToRing)]);

    private static ImmutableArray<LonLat> ToRing(Outline outline)
    {
        var closed = Closed(outline);
        var ring = ImmutableArray.CreateBuilder<LonLat>(closed.Count);
        foreach (var point in closed)
        {
            // Adding 0 takes the sign off -0.0, which would be printed otherwise.
            ring.Add(new LonLat(point.X + 0.0, point.Y + 0.0));
        }

        return ring.MoveToImmutable();
    }
}
