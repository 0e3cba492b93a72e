#!/usr/bin/env python3
"""Makes the shapes and pilot tables of sample-regions/. Everything is invented; the seeds stand below.

Run from anywhere: python3 sample-regions/tools/make_samples.py
It writes boundary.geojson, closed-areas.geojson, pilot-transects.csv, pilot-detections.csv and areas.tsv.
The same files come out again, byte for byte, on every run; it takes about half a minute, nearly all of it noise
on fine grids. No module beyond the standard library.
"""

import math
from pathlib import Path

import geojson
import rings
from landscape import fractal, outlines
from pilots import Pilot

HERE = Path(__file__).resolve().parent.parent


def shaped(field, box, step, inside_point, smallest_hole, tolerance):
    """The polygon round a point where a field is positive, smoothed and thinned, kilometres."""
    shell, holes = rings.polygon(outlines(field, *box, step), inside_point, smallest_hole)
    polygon = [rings.thin(rings.smooth(ring), tolerance) for ring in (shell, *holes)]
    rings.check([polygon], least_angle_degrees=10)
    return polygon


def flattened(value, depth):
    """Grows towards `depth` and no further: far from the shore the noise alone decides, which makes islands."""
    return value / (1 + abs(value) / depth)


def capsule(x, y, start, end, start_radius, end_radius):
    """How far inside a tapering sausage a place lies."""
    dx, dy = end[0] - start[0], end[1] - start[1]
    t = max(0, min(1, ((x - start[0]) * dx + (y - start[1]) * dy) / (dx * dx + dy * dy)))
    return start_radius + (end_radius - start_radius) * t - math.hypot(x - start[0] - t * dx, y - start[1] - t * dy)


def sound():
    """Tolvane Sound: a funnel open to the west, an inner bay in the east, islands. Seed 13."""
    seed, origin = 13, (-31.0, 52.6)

    def field(x, y):
        x, y = x + 2.2 * fractal(x, y, seed + 7, 9, 3), y + 2.2 * fractal(x, y, seed + 8, 9, 3)
        sea = max(capsule(x, y, (-10, 0), (22, 0), 13, 9.5), capsule(x, y, (24, 3), (40, 9), 4.5, 5.5),
                  capsule(x, y, (22, -2), (30, -8), 5, 1.5))
        return flattened(sea, 3) + 4.2 * fractal(x, y, seed, 10, 7, 0.55)

    shell, *islands = shaped(field, (-12, -22, 52, 26), 0.15, (10, 0), 0.1, 0.035)
    south, north = rings.nearest(shell, (-5.6, -10.6)), rings.nearest(shell, (-6.6, 13.7))
    within, _ = rings.cut(shell, north, south, [(-7.6, 2.0)])
    north, south = rings.nearest(within, (25.0, 5.2)), rings.nearest(within, (23.6, -8.9))
    inner, outer = rings.cut(within, north, south, [(25.3, 0.5), (24.6, -4.6)])
    strata = [[shell] + [i for i in islands if rings.contains(shell, i[0])] for shell in (outer, inner)]
    rings.check(strata, least_angle_degrees=10)
    closed = [
        ("Velspar Isles seabird colony", "closed all year", [(-6.4, -2.4), (-6.3, -3.6), (-4.4, -5.4), (-2.6, -5.3),
                                                            (-2.4, -4.0), (-4.2, -2.0), (-5.4, -1.6)]),
        ("Ambreth mussel farm", "moorings at the surface", [(37.2, 8.9), (37.6, 7.2), (40.0, 7.8), (39.6, 9.5)]),
    ]
    return (
        [({"zone": zone, "name": name, "waters": waters}, polygon, origin) for (zone, name, waters), polygon in zip(
            [("outer sound", "Tolvane Sound", "open to swell"), ("inner bay", "Ambreth Bay", "sheltered")], strata)],
        [({"name": name, "reason": reason}, [ring], origin) for name, reason, ring in closed])


def sound_pilot(folder):
    """Eider-like flocks: 0.55 and 0.95 flocks/km, thinning out westward; dispersion about 2.2; sigma 140 m within 300 m; mean flock 4.5."""
    pilot = Pilot(51)
    for k in range(10):
        trend = 0.6 + 0.8 * k / 9
        length = round(pilot.between(5, 11), 1)
        pilot.transect("outer sound", f"O{k + 1:02}", length, 0.55 * trend * length, 2.2, lambda: pilot.line_distance(140, 300), 4.5)
    for k in range(10):
        length = round(pilot.between(3, 6), 1)
        pilot.transect("inner bay", f"B{k + 1:02}", length, 0.95 * length, 2.2, lambda: pilot.line_distance(140, 300), 4.5)
    pilot.write(folder, "length_km", with_strata=True)


def hills():
    """Orrendal Hills: an upland with a lake. Seed 24."""
    seed, origin = 24, (-118.0, -46.4)

    def field(x, y):
        up = 3.2 * (1 - math.hypot((0.85 * x + 0.2 * y) / 4.6, (y - 0.15 * x) / 3.3))
        up = flattened(up, 1.3) + 1.5 * fractal(x, y, seed, 3.6, 6)
        lake = 1 - math.hypot((x - 0.8 + 0.5 * (y - 0.4)) / 1.25, (y - 0.4) / 0.75) + 1.1 * fractal(x, y, seed + 50, 1.9, 6, 0.55)
        return min(up, -lake)

    polygon = shaped(field, (-8, -6, 8, 6), 0.04, (-2.5, 0), 0.03, 0.009)
    return [({"name": "Orrendal Hills", "cover": "heath and short grass"}, polygon, origin)], []


def hills_pilot(folder):
    """Plover-like birds alone or in pairs counted as one: 0.9 a visit, dispersion about 1.6; sigma 70 m within 150 m; one to three visits."""
    pilot = Pilot(110)
    for k in range(32):
        visits = 1 + (k % 4 > 0) + (k % 4 == 2)
        pilot.transect("", f"H{k + 1:02}", visits, 0.9 * visits, 1.6, lambda: pilot.point_distance(70, 150), None)
    pilot.write(folder, "visits", with_strata=False)


def shelf():
    """Keldrin Shelf: from an irregular coast in the south to the shelf edge in the north, two islands. Seed 23."""
    seed, origin = 23, (-160.0, 43.2)

    def field(x, y):
        wx, wy = x + 6 * fractal(x, y, seed + 7, 40, 3), y + 6 * fractal(x, y, seed + 8, 40, 3)
        sea = flattened(wy + 8 * math.sin(wx / 38), 14) + 17 * fractal(x, y, seed, 34, 7, 0.53)
        edge = 46 + 5 * math.sin(x / 31 + 1) - y + 9 * fractal(x, y, seed + 90, 30, 4, 0.4)
        return min(sea, edge, x + 88 - 0.12 * y, 92 - x - 0.05 * y)

    polygon = shaped(field, (-105, -45, 105, 75), 0.35, (0, 30), 1.0, 0.06)
    return [({"name": "Keldrin Shelf", "depth": "0 to 200 m"}, polygon, origin)], []


def shelf_pilot(folder):
    """Porpoise-like groups: 0.14 a km, fewer in the east; dispersion about 2.8; sigma 160 m within 400 m; mean group 1.6."""
    pilot = Pilot(216)
    for k in range(12):
        trend = 1.35 - 0.7 * k / 11
        length = round(pilot.between(20, 38), 1)
        pilot.transect("", f"Z{k + 1:02}", length, 0.14 * trend * length, 2.8, lambda: pilot.line_distance(160, 400), 1.6)
    pilot.write(folder, "length_km", with_strata=False)


def net_area(polygon, cuts):
    """Area of a polygon in degrees less the cuts that lie in it; islands in a cut are land already and not taken off twice."""
    inside = [ring for ring in cuts if rings.contains(polygon[0], ring[0])]
    for ring in inside:
        for hole in polygon[1:]:
            if len({rings.contains(ring, vertex) for vertex in hole}) != 1:
                raise ValueError("a closed area cuts an island in two")
        if not all(rings.contains(polygon[0], vertex) for vertex in ring):
            raise ValueError("a closed area runs over the shore")
    islands = sum(geojson.area_km2([hole]) for ring in inside for hole in polygon[1:] if rings.contains(ring, hole[0]))
    return geojson.area_km2(polygon) - sum(geojson.area_km2([ring]) for ring in inside) + islands


def main():
    lines = ["folder\tstratum\tvertices\tholes\tarea_km2\tarea_less_closed_km2"]
    scenarios = [("sea-ducks-sound", sound, sound_pilot), ("ground-birds-hills", hills, hills_pilot),
                 ("marine-mammals-shelf", shelf, shelf_pilot)]
    for name, shape, pilot in scenarios:
        folder = HERE / name
        folder.mkdir(exist_ok=True)
        areas, closed = ([(attributes, [geojson.degrees(ring, origin) for ring in polygon]) for attributes, polygon, origin in part]
                         for part in shape())
        rings.check([polygon for _, polygon in areas], least_angle_degrees=0)
        geojson.write(folder / "boundary.geojson", areas)
        if closed:
            geojson.write(folder / "closed-areas.geojson", closed)
        for attributes, polygon in areas:
            net = net_area(polygon, [ring for _, (ring,) in closed])
            lines.append("\t".join([name, attributes.get("zone", ""), str(sum(map(len, polygon))), str(len(polygon) - 1),
                                    f"{geojson.area_km2(polygon):.6f}", f"{net:.6f}"]))
        pilot(folder)
    (HERE / "areas.tsv").write_text("\n".join(lines) + "\n", encoding="utf-8", newline="\n")


if __name__ == "__main__":
    main()
