using System.Collections.Immutable;
using System.Globalization;

namespace SurveyPlanner.Regions;

/// <summary>What the plan says about the region.</summary>
/// <param name="StratumField">Attribute that names the strata; null for one stratum.</param>
/// <param name="Strata">Strata to keep, in this order; empty for all.</param>
/// <param name="Projection"><c>azimuthal</c>, <c>conic</c> or null for the one that distorts less.</param>
/// <param name="ExclusionBufferMetres">Distance kept from the exclusions.</param>
public sealed record RegionDesign(
    string? StratumField = null, ImmutableArray<string> Strata = default, string? Projection = null, double ExclusionBufferMetres = 0);

/// <summary>
/// From boundary files to a <see cref="Region"/>: strata by attribute, projected to an equal-area plane, exclusions cut out.
/// Accuracy: edges stray from straight lines in longitude and latitude by at most 0.25 m, areas by less than 1e-6; both tested.
/// </summary>
public static class RegionBuilder
{
    /// <summary>The name of the only stratum where the plan names no stratum attribute.</summary>
    public const string SingleStratumName = "region";

    // Stray allowed to an edge, as a share of area over perimeter: edges bent like parabolas then cost at most two thirds of it in area,
    // inside the promised 1e-6 even if all bend the same way.
    private const double AreaTolerance = 1e-6;

    // Small outlines of long edges gain most, and cost nothing: their areas then hold to nine digits.
    private const double FurtherVertices = 5000;
    private const double FinestMetres = 1e-5;

    // Two outlines that share a border may cross it by rounding; a real overlap is wider than this.
    private const double BorderToleranceMetres = 0.01;

    // From here on lengths in the plane are noticeably wrong, and the user is told.
    private const double ScaleWarningPercent = 1;

    /// <exception cref="InputException">No such stratum, overlapping strata, nothing left of a stratum, a region too large for one plane.</exception>
    public static Region Build(Boundary boundary, RegionDesign design, ImmutableArray<Boundary> exclusions)
    {
        var groups = StratumGroups.From(boundary, design);
        var positions = groups.SelectMany(group => group.Features).SelectMany(Positions).ToList();
        var projection = PlanningProjection.Choose(positions, design.Projection);
        var densifier = new EdgeDensifier(projection, Tolerance(groups, projection));
        var notices = ImmutableArray.CreateBuilder<Notice>();
        notices.AddRange(boundary.Notices);
        notices.AddRange(exclusions.SelectMany(exclusion => exclusion.Notices));

        var shapes = groups.Select(group => Merge(boundary, group, projection.Centre.Lon, densifier, notices)).ToList();
        RefuseOverlaps(boundary, groups, shapes);
        notices.AddRange(StratumGaps.Find(shapes, projection));
        var cut = ExclusionShape(exclusions, densifier, design.ExclusionBufferMetres);
        notices.AddRange(ExclusionsThatMiss(exclusions, densifier, design.ExclusionBufferMetres, Union(shapes)));
        var strata = groups
            .Select((group, i) => (Shape: Cut(boundary, group, shapes[i], cut), Whole: shapes[i], Group: group))
            .Select(stratum => Describe(stratum.Group, stratum.Shape, projection) with
            {
                Closed = cut,
                ClosedKm2 = cut.IsEmpty ? 0 : (stratum.Whole.AreaSquareMetres - stratum.Shape.AreaSquareMetres) / 1e6,
            })
            .ToImmutableArray();
        var scaleError = 100 * PlanningProjection.MaxScaleError(projection, positions);
        if (scaleError > ScaleWarningPercent)
        {
            notices.Add(new Notice(NoticeKind.Warning, string.Create(
                CultureInfo.InvariantCulture,
                $"lengths in the plane are off by up to {scaleError:0.0} % at the edge of this region; areas are right, and lengths in the outputs are measured on the ellipsoid; split a region this large if spacing must be exact")));
        }

        var shown = cut.IsEmpty ? cut : PlaneGeometry.Intersect(cut, Union(shapes));
        return new Region(
            projection,
            strata,
            shown,
            scaleError,
            PlanningProjection.MaxConvergence(projection, positions),
            boundary.CoordinateSystem,
            notices.ToImmutable())
        {
            ExclusionBufferMetres = cut.IsEmpty ? 0 : design.ExclusionBufferMetres,
        };
    }

    /// <summary>A file of closed areas that closes nothing is most likely the wrong file.</summary>
    private static IEnumerable<Notice> ExclusionsThatMiss(
        ImmutableArray<Boundary> exclusions, EdgeDensifier densifier, double bufferMetres, PlaneShape region)
        => from exclusion in exclusions
           where PlaneGeometry.SharedArea(ExclusionShape([exclusion], densifier, bufferMetres), region) == 0
           select new Notice(NoticeKind.Warning, $"the closed areas of {exclusion.Source} lie wholly outside the region and cut nothing out of it; check that it is the right file");

    /// <summary>
    /// As fine as a fair number of further vertices allows (three times as many as the outline has, and some thousands), and always fine enough
    /// for the promised accuracy.
    /// </summary>
    private static double Tolerance(IReadOnlyList<StratumGroup> groups, EqualAreaProjection projection)
    {
        var coarse = new EdgeDensifier(projection, double.PositiveInfinity);
        var (narrowest, vertices, roots) = (double.PositiveInfinity, 0, 0.0);
        foreach (var feature in groups.SelectMany(group => group.Features))
        {
            var shape = Shape(feature.Polygons, coarse);
            narrowest = Math.Min(narrowest, shape.AreaSquareMetres / Perimeter(shape));
            vertices += shape.VertexCount;
            roots += feature.Polygons.Sum(polygon => coarse.RootOfStray(polygon.Shell) + polygon.Holes.Sum(hole => coarse.RootOfStray(hole)));
        }

        // An edge that strays by s is cut into the square root of s / tolerance pieces.
        var affordable = Math.Pow(roots / ((2.0 * vertices) + FurtherVertices), 2);
        var promised = Math.Clamp(AreaTolerance * narrowest, 1e-3, 0.25);
        return Math.Clamp(affordable, FinestMetres, promised);
    }

    private static double Perimeter(PlaneShape shape)
    {
        var total = 0.0;
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            total += shape.RingLength(ring);
        }

        return total;
    }

    private static PlaneShape Shape(IEnumerable<GeographicPolygon> polygons, EdgeDensifier densifier)
    {
        var builder = new PlaneShapeBuilder();
        foreach (var polygon in polygons)
        {
            builder.StartPart();
            densifier.AddRing(builder, polygon.Shell);
            foreach (var hole in polygon.Holes)
            {
                densifier.AddRing(builder, hole);
            }
        }

        return builder.Build();
    }

    /// <summary>
    /// The features of one stratum as one shape. Polygons that share a border become one; where features overlap, the overlap counts once and is told.
    /// </summary>
    private static PlaneShape Merge(
        Boundary boundary, StratumGroup group, double meridian, EdgeDensifier densifier, ImmutableArray<Notice>.Builder notices)
    {
        var (polygons, together) = SharedBorders.Find([.. group.Features.SelectMany(feature => feature.Polygons)], meridian);
        var whole = Shape(polygons, densifier);
        var (shapes, next) = (new List<PlaneShape>(), 0);
        foreach (var count in group.Features.Select(feature => feature.Polygons.Length))
        {
            shapes.Add(Shape(polygons.Skip(next).Take(count), densifier));
            next += count;
        }

        var overlap = 0.0;
        for (var i = 0; i < shapes.Count; i++)
        {
            for (var j = i + 1; j < shapes.Count; j++)
            {
                overlap += Overlap(shapes[i], shapes[j]);
            }
        }

        if (overlap == 0)
        {
            return PlaneGeometry.Join(whole, together);
        }

        var merged = PlaneGeometry.Unite(whole);
        notices.Add(new Notice(NoticeKind.Repair, string.Create(
            CultureInfo.InvariantCulture,
            $"{boundary.Source}: features of stratum '{group.Name}' overlap; they were merged, so that {(whole.AreaSquareMetres - merged.AreaSquareMetres) / 1e6:0.###} km² count once and not twice")));
        return merged;
    }

    private static void RefuseOverlaps(Boundary boundary, IReadOnlyList<StratumGroup> groups, List<PlaneShape> shapes)
    {
        var problems = new List<Problem>();
        for (var i = 0; i < shapes.Count; i++)
        {
            for (var j = i + 1; j < shapes.Count; j++)
            {
                var overlap = Overlap(shapes[i], shapes[j]);
                if (overlap > 0)
                {
                    problems.Add(new Problem(
                        string.Create(
                            CultureInfo.InvariantCulture,
                            $"strata '{groups[i].Name}' and '{groups[j].Name}' overlap by {overlap / 1e6:0.###} km²; a place can belong to one stratum only, so cut one of them back in your GIS"),
                        boundary.Source));
                }
            }
        }

        if (problems.Count > 0)
        {
            throw new InputException(problems);
        }
    }

    /// <summary>Area that two shapes share, 0 where it is only a border crossed by rounding.</summary>
    private static double Overlap(PlaneShape a, PlaneShape b)
    {
        if (a.MinX >= b.MaxX || b.MinX >= a.MaxX || a.MinY >= b.MaxY || b.MinY >= a.MaxY)
        {
            return 0;
        }

        var shared = PlaneGeometry.Intersect(a, b);
        return shared.IsEmpty || shared.AreaSquareMetres < BorderToleranceMetres * Perimeter(shared) / 2 ? 0 : shared.AreaSquareMetres;
    }

    private static PlaneShape Union(IEnumerable<PlaneShape> shapes)
    {
        var builder = new PlaneShapeBuilder();
        foreach (var shape in shapes)
        {
            builder.Add(shape);
        }

        return builder.Build();
    }

    private static PlaneShape ExclusionShape(ImmutableArray<Boundary> exclusions, EdgeDensifier densifier, double bufferMetres)
    {
        if (exclusions.IsDefaultOrEmpty)
        {
            return PlaneShape.Empty;
        }

        var shape = Shape(exclusions.SelectMany(exclusion => exclusion.Features).SelectMany(feature => feature.Polygons), densifier);
        return bufferMetres > 0 ? PlaneGeometry.Grow(shape, bufferMetres) : PlaneGeometry.Unite(shape);
    }

    private static PlaneShape Cut(Boundary boundary, StratumGroup group, PlaneShape shape, PlaneShape exclusions)
    {
        if (exclusions.IsEmpty)
        {
            return shape;
        }

        var left = PlaneGeometry.Subtract(shape, exclusions);
        return left.AreaSquareMetres > 0
            ? left
            : throw new InputException(new Problem(
                $"nothing is left of stratum '{group.Name}' once the exclusions are cut out; check that the exclusions file holds only the closed areas",
                boundary.Source));
    }

    private static Stratum Describe(StratumGroup group, PlaneShape shape, EqualAreaProjection projection)
    {
        var centre = Centroid(shape);
        var position = projection.Unproject(centre);
        var convergence = PlanningProjection.Convergence(projection, position);
        var (longSide, shortSide, angle) = StratumAxes.Of(PlaneGeometry.ConvexHull(shape));
        var bearing = (90 - (angle * 180 / Math.PI) + convergence) % 180;
        return new Stratum(
            group.Name,
            shape,
            EllipsoidArea.Of(shape, projection) / 1e6,
            centre,
            position,
            convergence,
            bearing < 0 ? bearing + 180 : bearing,
            longSide / 1000,
            shortSide / 1000,
            group.SharedAttributes)
        {
            OutlineVertices = group.Features.Sum(Vertices),
        };
    }

    private static PlanePoint Centroid(PlaneShape shape)
    {
        double area = 0, sumX = 0, sumY = 0;
        for (var part = 0; part < shape.PartCount; part++)
        {
            for (var ring = shape.PartStarts[part]; ring < shape.PartStarts[part + 1]; ring++)
            {
                var sign = (ring == shape.PartStarts[part]) == (shape.SignedRingArea(ring) > 0) ? 1 : -1;
                var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
                for (var i = start; i < end; i++)
                {
                    var next = i + 1 == end ? start : i + 1;
                    var cross = sign * ((shape.X[i] * shape.Y[next]) - (shape.X[next] * shape.Y[i]));
                    area += cross;
                    sumX += cross * (shape.X[i] + shape.X[next]);
                    sumY += cross * (shape.Y[i] + shape.Y[next]);
                }
            }
        }

        return new PlanePoint(sumX / (3 * area), sumY / (3 * area));
    }

    /// <summary>Rings are closed: their last vertex is the first again.</summary>
    private static int Vertices(BoundaryFeature feature)
        => feature.Polygons.Sum(polygon => polygon.Shell.Length - 1 + polygon.Holes.Sum(hole => hole.Length - 1));

    private static IEnumerable<LonLat> Positions(BoundaryFeature feature) => feature.Polygons.SelectMany(polygon => polygon.Shell);
}
