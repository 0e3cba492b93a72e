#!/usr/bin/env python3
"""Makes shifts.tsv: positions on old datums brought to WGS 84 by PROJ, for the tests of SurveyPlanner.Files.CoordinateSystems.

    python3 make-shifts.py ../../../src/SurveyPlanner.Files/CoordinateSystems/datums.tsv > shifts.tsv

Run with PROJ 9.1.1 without grids. For every datum of our table that has a shift, three points in the area of each of its shifts, through
`cct +proj=pipeline +step +proj=cart +ellps... +step +proj=helmert ... +convention=position_vector +step +inv +proj=cart +ellps=WGS84`.
Then, marked `epsg`, points that PROJ brings over by its own choice of operation (`cs2cs CODE EPSG:4326`), which knows nothing of our table.
Columns: kind, datum code or system code, x, y (longitude, latitude, or easting, northing), longitude and latitude on WGS 84.
"""
import random
import subprocess
import sys

random.seed(4)
print("kind\tcode\tx\ty\tlon\tlat")
for line in open(sys.argv[1], encoding="utf-8").read().splitlines()[1:]:
    cells = line.split("\t")
    if len(cells) < 8:
        continue
    for shift in cells[7].split(";"):
        operation, *v = shift.split(",")
        dx, dy, dz, rx, ry, rz, s, _, west, south, east, north = map(float, v)
        east += 360 if east < west else 0
        pipeline = f"+proj=pipeline +step +proj=cart +a={cells[3]} +rf={cells[4]} +step +proj=helmert +x={dx} +y={dy} +z={dz} +rx={rx} +ry={ry} +rz={rz} +s={s} +convention=position_vector +step +inv +proj=cart +ellps=WGS84"
        points = [(round(random.uniform(west, east), 6), round(random.uniform(south, north), 6)) for _ in range(3)]
        text = "".join(f"{x} {y} 0 0\n" for x, y in points)
        answers = subprocess.run(["cct", "-d", "10"] + pipeline.split(), input=text, capture_output=True, text=True).stdout.splitlines()
        for (x, y), answer in zip(points, answers):
            lon, lat = answer.split()[:2]
            print(f"helmert\t{cells[0]}\t{x}\t{y}\t{lon}\t{lat}")

OWN = {"EPSG:27700": (530000, 180000), "EPSG:28992": (155000, 463000), "EPSG:31370": (150000, 170000), "EPSG:21781": (600000, 200000), "EPSG:2100": (480000, 4200000),
       "EPSG:29902": (316000, 234000), "EPSG:23030": (440000, 4475000), "EPSG:31467": (3500000, 5500000), "EPSG:3021": (1600000, 6600000), "EPSG:23700": (650000, 240000),
       "EPSG:2393": (3400000, 6800000), "EPSG:2056": (2600000, 1200000)}
for code, (x, y) in OWN.items():
    answer = subprocess.run(["gdaltransform", "-output_xy", "-s_srs", code, "-t_srs", "EPSG:4326"], input=f"{x} {y}\n", capture_output=True, text=True).stdout.split()
    print(f"epsg\t{code}\t{x}\t{y}\t{float(answer[0]):.9f}\t{float(answer[1]):.9f}")
