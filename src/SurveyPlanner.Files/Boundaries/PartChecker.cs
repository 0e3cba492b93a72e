using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Prepared;
using NetTopologySuite.Operation.Overlay;
using NetTopologySuite.Operation.OverlayNG;
using NetTopologySuite.Operation.Union;
using NetTopologySuite.Operation.Valid;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Holds one part against the rules of a simple polygon. What has one reading only is mended and told; the rest is refused with its place.
/// Cost: the library's check stops at the first fault, so a hostile star costs no more than an honest coast.
/// </summary>
internal sealed class PartChecker(Frame frame, double wholeArea, string source, RepairLog log)
{
    private readonly LoopSplitter _splitter = new(frame, wholeArea);
    private readonly List<Problem> _problems = [];

    /// <summary>What is wrong beyond repair in the parts checked so far.</summary>
    public IReadOnlyList<Problem> Problems => _problems;

    /// <summary>The part itself if it is sound, else what it comes apart into; empty when it is refused.</summary>
    public IReadOnlyList<Part> Check(Part part)
    {
        if (FirstFault(part) is not { } fault)
        {
            return [part];
        }

        if (fault.ErrorType is TopologyValidationErrors.SelfIntersection or TopologyValidationErrors.RingSelfIntersection)
        {
            return TakeApart(part);
        }

        return MergeHoles(part, fault);
    }

    private List<Part> TakeApart(Part part)
    {
        var holes = new List<Outline>();
        foreach (var hole in part.Holes)
        {
            if (Loops(hole) is not { } loops)
            {
                return [];
            }

            holes.AddRange(loops.Shells.Select(points => new Outline(hole.Place, points)));
        }

        if (Loops(part.Shell) is not { } shell)
        {
            return [];
        }

        holes.AddRange(shell.Holes.Select(points => new Outline(part.Shell.Place, points)));
        var parts = shell.Shells.Select(points => new Part(new Outline(part.Shell.Place, points), [])).ToList();
        if (!Distribute(holes, parts))
        {
            return [];
        }

        return [.. parts.SelectMany(piece => FirstFault(piece) is { } fault ? MergeHoles(piece, fault) : [piece])];
    }

    /// <summary>The loops of an outline, or null, with a problem noted, when it crosses itself.</summary>
    private LoopSplitter.Loops? Loops(Outline outline)
    {
        if (FirstFault(new Part(outline, [])) is not { } fault)
        {
            return new LoopSplitter.Loops([outline.Points], [], 0, 0);
        }

        if (_splitter.Split(outline.Points) is not { } loops)
        {
            Refuse(outline, fault, "the outline crosses itself");
            return null;
        }

        var place = $"{outline.Place}: near {frame.Position(fault.Coordinate.X, fault.Coordinate.Y)}";
        if (loops.Cuts > 0)
        {
            var after = loops.Shells.Sum(Area) - loops.Holes.Sum(Area);
            log.Repair(
                "loops too small to matter, where an outline crosses itself, were cut off",
                $"{place}, {Wording.Count(loops.Cuts, "loop", "loops")} of {Wording.Area(loops.CutOff)}",
                after - frame.Area(outline));
        }

        if (loops.Shells.Count + loops.Holes.Count > 1)
        {
            log.Repair("outlines that touch themselves were taken apart at the touching points into parts and holes", place, 0);
        }

        return loops;
    }

    private double Area(List<FilePoint> points) => Math.Abs(frame.SignedArea(points));

    /// <summary>Gives each hole to the part that holds it.</summary>
    private bool Distribute(List<Outline> holes, List<Part> parts)
    {
        if (parts.Count == 1)
        {
            parts[0].Holes.AddRange(holes);
            return true;
        }

        var shells = parts.Select(part => PreparedGeometryFactory.Prepare(Nts.ToPolygon(part.Shell))).ToList();
        foreach (var hole in holes)
        {
            var polygon = Nts.ToPolygon(hole);
            var home = shells.FindIndex(shell => shell.Covers(polygon));
            if (home < 0)
            {
                Refuse(hole, polygon.Coordinate, "the hole lies outside its outline");
                return false;
            }

            parts[home].Holes.Add(hole);
        }

        return true;
    }

    /// <summary>Holes that touch along a line, overlap each other or cut the part in two leave one reading: the shell less all holes.</summary>
    private List<Part> MergeHoles(Part part, TopologyValidationError fault)
    {
        var shell = Nts.ToPolygon(part.Shell);
        var prepared = PreparedGeometryFactory.Prepare(shell);
        var holes = part.Holes.Select(Nts.ToPolygon).ToArray();
        var outside = Array.FindIndex(holes, hole => !prepared.Covers(hole));
        if (outside >= 0)
        {
            var crosses = prepared.Intersects(holes[outside]);
            Refuse(part.Holes[outside], fault.Coordinate, crosses ? "the hole crosses its outline" : "the hole lies outside its outline");
            return [];
        }

        if (fault.ErrorType == TopologyValidationErrors.NestedHoles)
        {
            Refuse(HoleAt(part, fault.Coordinate), fault.Coordinate, "a hole lies inside another hole");
            return [];
        }

        var rest = OverlayNGRobust.Overlay(shell, UnaryUnionOp.Union(holes, Nts.Factory), SpatialFunction.Difference);
        var pieces = Nts.ToParts(rest, part.Shell.Place).ToList();
        log.Repair(
            "holes that overlap or touch along a line were made one",
            $"{part.Shell.Place}: near {frame.Position(fault.Coordinate.X, fault.Coordinate.Y)}",
            pieces.Sum(frame.Area) - frame.Area(part));
        return pieces;
    }

    private static TopologyValidationError? FirstFault(Part part)
    {
        var check = new IsValidOp(Nts.ToPolygon(part));
        return check.IsValid ? null : check.ValidationError;
    }

    /// <summary>The hole that a place lies on; the shell if none.</summary>
    private static Outline HoleAt(Part part, Coordinate place)
        => part.Holes.Find(hole => Nts.ToPolygon(hole).Distance(Nts.Factory.CreatePoint(place)) == 0) ?? part.Shell;

    private void Refuse(Outline outline, TopologyValidationError fault, string what) => Refuse(outline, fault.Coordinate, what);

    private void Refuse(Outline outline, Coordinate at, string what)
        => _problems.Add(new Problem(
            $"{what} near {frame.Position(at.X, at.Y)}; correct it in a GIS program, because any repair would be a guess", source, Key: outline.Place));
}
