#!/usr/bin/env python3
"""Makes projections.tsv.gz with PROJ: 100,000 random positions in 20 planes, both hemispheres, across 180 degrees, at the poles.

Needs cs2cs of PROJ (Debian package proj-bin; the committed table was made with PROJ 9.1.1). Run: python3 make-projections.py
Columns: plane, lon, lat (degrees), x, y (metres). Planes: laea:lon0:lat0 or aea:lon0:lat0:lat1:lat2, all on WGS 84.
"""
import gzip
import math
import random
import subprocess

AZIMUTHAL = [(0, 0), (10, 52), (179.5, -17), (-180, 66), (21.17, 78.62), (0, 90), (-100, 90), (45, -90), (-70.5, -52.3), (146, -42)]
CONIC = [(-96, 37.5, 29.5, 45.5), (132, -25, -18, -36), (-154, 50, 55, 65), (179, -41, -36, -46), (-179.9, 60, 56, 64),
         (25, 60, 60, 60), (0, 5, 1, 9), (-60, -15, -30, 1), (78, 22, 12, 32), (15, 78, 77, 80)]
PER_PLANE = 5000


def sample(rng, lon0, lat0, reach):
    """A position at most so many degrees of arc away, spread evenly over the cap."""
    distance = math.acos(1 - rng.random() * (1 - math.cos(math.radians(reach))))
    bearing = rng.uniform(0, 2 * math.pi)
    phi = math.radians(lat0)
    lat = math.asin(math.sin(phi) * math.cos(distance) + math.cos(phi) * math.sin(distance) * math.cos(bearing))
    lon = lon0 + math.degrees(math.atan2(math.sin(bearing) * math.sin(distance) * math.cos(phi), math.cos(distance) - math.sin(phi) * math.sin(lat)))
    return round((lon + 180) % 360 - 180, 6), round(math.degrees(lat), 6)


def main():
    rng = random.Random(20261201)
    rows = []
    planes = [(f"laea:{a}:{b}", f"+proj=laea +lon_0={a} +lat_0={b} +datum=WGS84", a, b, 100) for a, b in AZIMUTHAL]
    planes += [(f"aea:{a}:{b}:{c}:{d}", f"+proj=aea +lon_0={a} +lat_0={b} +lat_1={c} +lat_2={d} +datum=WGS84", a, b, 35) for a, b, c, d in CONIC]
    for name, definition, lon0, lat0, reach in planes:
        points = [sample(rng, lon0, lat0, reach) for _ in range(PER_PLANE)]
        points[0] = (round((lon0 + 180) % 360 - 180, 6), lat0)
        text = "".join(f"{lon} {lat}\n" for lon, lat in points)
        out = subprocess.run(["cs2cs", "-f", "%.4f", "+proj=longlat", "+datum=WGS84", "+to"] + definition.split(),
                             input=text, capture_output=True, text=True, check=True).stdout
        for (lon, lat), line in zip(points, out.splitlines()):
            x, y = line.split()[:2]
            rows.append(f"{name}\t{lon}\t{lat}\t{x}\t{y}\n")
    with open("projections.tsv.gz", "wb") as raw, gzip.GzipFile(fileobj=raw, mode="wb", mtime=0, filename="") as packed:
        packed.write("".join(rows).encode())


main()
