"""Rings in the plane: smoothing, thinning, cutting, and the checks that make them a valid boundary."""

import math


def area(ring):
    """Signed area, positive anticlockwise."""
    return sum(a[0] * b[1] - b[0] * a[1] for a, b in zip(ring, ring[1:] + ring[:1])) / 2


def contains(ring, point):
    x, y = point
    odd = False
    for (ax, ay), (bx, by) in zip(ring, ring[1:] + ring[:1]):
        if (ay > y) != (by > y) and x < ax + (y - ay) * (bx - ax) / (by - ay):
            odd = not odd
    return odd


def smooth(ring):
    """Cuts every corner at a quarter and three quarters of its edges (Chaikin 1974)."""
    out = []
    for (ax, ay), (bx, by) in zip(ring, ring[1:] + ring[:1]):
        out.append((0.75 * ax + 0.25 * bx, 0.75 * ay + 0.25 * by))
        out.append((0.25 * ax + 0.75 * bx, 0.25 * ay + 0.75 * by))
    return out


def thin(ring, tolerance):
    """Leaves out vertices that lie within `tolerance` of the outline without them (Douglas and Peucker 1973)."""
    far = max(range(len(ring)), key=lambda i: math.dist(ring[0], ring[i]))
    return _thin(ring[: far + 1], tolerance)[:-1] + _thin(ring[far:] + ring[:1], tolerance)[:-1]


def _thin(path, tolerance):
    keep, todo = {0, len(path) - 1}, [(0, len(path) - 1)]
    while todo:
        start, end = todo.pop()
        worst, at = tolerance, None
        for i in range(start + 1, end):
            away = _distance(path[i], path[start], path[end])
            if away > worst:
                worst, at = away, i
        if at is not None:
            keep.add(at)
            todo += [(start, at), (at, end)]
    return [path[i] for i in sorted(keep)]


def _distance(p, a, b):
    """Distance of p from the segment a-b."""
    dx, dy = b[0] - a[0], b[1] - a[1]
    length2 = dx * dx + dy * dy
    t = 0 if length2 == 0 else max(0, min(1, ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / length2))
    return math.dist(p, (a[0] + t * dx, a[1] + t * dy))


def nearest(ring, point):
    """Index of the vertex nearest to a point."""
    return min(range(len(ring)), key=lambda i: math.dist(ring[i], point))


def cut(ring, start, end, via=()):
    """Cuts a ring from vertex `start` through `via` to vertex `end`: the part on the left of the cut, and the other."""
    def walk(i, j):
        return [ring[(i + k) % len(ring)] for k in range((j - i) % len(ring) + 1)]
    return walk(end, start) + list(via), walk(start, end) + list(reversed(via))


def polygon(rings_found, inside_point, smallest_hole):
    """The shell round a point and its holes, from rings with inside on the left; smaller holes are filled."""
    shell = min((r for r in rings_found if area(r) > 0 and contains(r, inside_point)), key=area)
    holes = [r for r in rings_found if area(r) < -smallest_hole and contains(shell, r[0])]
    return shell, sorted(holes, key=area)


def check(polygons, least_angle_degrees=20):
    """Raises ValueError when an edge crosses or touches another of its polygon, a ring is wound wrongly, or a corner is a spike."""
    for shell, *holes in polygons:
        if area(shell) <= 0 or any(area(hole) >= 0 for hole in holes):
            raise ValueError("wound wrongly")
        edges = []
        for ring in (shell, *holes):
            n = len(ring)
            for i in range(n):
                corner = _angle(ring[i - 1], ring[i], ring[(i + 1) % n])
                if corner < least_angle_degrees:
                    raise ValueError(f"spike of {corner:.1f} degrees at {ring[i]}")
                edges.append((ring[i], ring[(i + 1) % n]))
        for i, (a, b) in enumerate(edges):
            for c, d in edges[i + 1:]:
                if not {a, b} & {c, d} and _cross(a, b, c, d):
                    raise ValueError(f"edges cross at {a}")
        if any(not contains(shell, vertex) for hole in holes for vertex in hole):
            raise ValueError("hole outside its shell")


def _angle(a, b, c):
    ux, uy, vx, vy = a[0] - b[0], a[1] - b[1], c[0] - b[0], c[1] - b[1]
    return math.degrees(abs(math.atan2(ux * vy - uy * vx, ux * vx + uy * vy)))


def _cross(a, b, c, d):
    if max(a[0], b[0]) < min(c[0], d[0]) or max(c[0], d[0]) < min(a[0], b[0]):
        return False
    if max(a[1], b[1]) < min(c[1], d[1]) or max(c[1], d[1]) < min(a[1], b[1]):
        return False

    def side(p, q, r):
        return (q[0] - p[0]) * (r[1] - p[1]) - (q[1] - p[1]) * (r[0] - p[0])
    return side(a, b, c) * side(a, b, d) <= 0 and side(c, d, a) * side(c, d, b) <= 0
