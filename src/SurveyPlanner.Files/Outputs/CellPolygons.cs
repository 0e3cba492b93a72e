using NetTopologySuite.Geometries;
using SurveyPlanner.Coverage;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// The cells of a stratum as polygons, cut at its boundary, for drawing. Their areas are the coverage's own and not taken from here:
/// the general overlay that cuts them has known faults on slivers, and where it fails a cell stays the whole square.
/// </summary>
internal sealed class CellPolygons
{
    private readonly StratumCoverage _coverage;
    private readonly Geometry _stratum;
    private readonly double _cos;
    private readonly double _sin;

    public CellPolygons(Stratum stratum, StratumCoverage coverage)
    {
        _coverage = coverage;
        (_sin, _cos) = Math.SinCos(coverage.RowBearingRadians);
        _stratum = Turned(stratum.Shape);
    }

    /// <summary>For each cell, in order, its polygons as rings in the plane, shell first.</summary>
    public IEnumerable<IReadOnlyList<IReadOnlyList<IReadOnlyList<PlanePoint>>>> All()
    {
        var (strip, bottom) = (_stratum, double.NaN);
        foreach (var cell in _coverage.Cells)
        {
            var (u, v) = Turn(cell.SquareCentre);
            var half = _coverage.CellSizeMetres / 2;
            if (!(Math.Abs(v - half - bottom) < half))
            {
                // Row by row: a cell is then cut from a strip of the stratum and not from all of it.
                bottom = v - half;
                var width = _stratum.EnvelopeInternal;
                strip = Cut(_stratum, new Envelope(width.MinX - half, width.MaxX + half, bottom, v + half)) ?? _stratum;
            }

            yield return Polygons(cell, strip, new Envelope(u - half, u + half, v - half, v + half));
        }
    }

    private IReadOnlyList<IReadOnlyList<IReadOnlyList<PlanePoint>>> Polygons(CoverageCell cell, Geometry strip, Envelope square)
    {
        var isWhole = cell.AreaKm2 * 1e6 > square.Area * (1 - 1e-9);
        var cut = isWhole ? null : Cut(strip, square);
        var whole = Nts.Factory.ToGeometry(square);
        return [.. LonLatPolygons.Polygons(cut is null || cut.Area == 0 ? whole : cut).Select(piece => (IReadOnlyList<IReadOnlyList<PlanePoint>>)
            [Back(piece.Shell), .. piece.Holes.Select(Back)])];
    }

    /// <summary>Null where the overlay fails.</summary>
    private static Geometry? Cut(Geometry geometry, Envelope window)
    {
        try
        {
            return Nts.Factory.ToGeometry(window).Intersection(geometry);
        }
        catch (TopologyException)
        {
            return null;
        }
    }

    /// <summary>The shape in the frame in which the rows of cells run along x.</summary>
    private MultiPolygon Turned(PlaneShape shape)
    {
        LinearRing Ring(int ring)
        {
            var vertices = Enumerable.Range(shape.RingStarts[ring], shape.RingStarts[ring + 1] - shape.RingStarts[ring])
                .Select(i => Turn(new PlanePoint(shape.X[i], shape.Y[i])))
                .Select(turned => new Coordinate(turned.U, turned.V))
                .ToList();
            return Nts.Factory.CreateLinearRing([.. vertices, vertices[0].Copy()]);
        }

        return Nts.Factory.CreateMultiPolygon(
        [
            .. Enumerable.Range(0, shape.PartCount).Select(part => Nts.Factory.CreatePolygon(
                Ring(shape.PartStarts[part]),
                [.. Enumerable.Range(shape.PartStarts[part] + 1, shape.PartStarts[part + 1] - shape.PartStarts[part] - 1).Select(Ring)])),
        ]);
    }

    private (double U, double V) Turn(PlanePoint point) => ((point.X * _cos) + (point.Y * _sin), (point.Y * _cos) - (point.X * _sin));

    private IReadOnlyList<PlanePoint> Back(LineString ring) =>
        [.. ring.Coordinates.SkipLast(1).Select(vertex => new PlanePoint((vertex.X * _cos) - (vertex.Y * _sin), (vertex.X * _sin) + (vertex.Y * _cos)))];
}
