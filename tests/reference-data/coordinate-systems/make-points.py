#!/usr/bin/env python3
"""Makes points.tsv: positions in coordinate systems as PROJ has them, for the tests of SurveyPlanner.Files.CoordinateSystems.

    python3 make-points.py /usr/share/proj/proj.db ../../../src/SurveyPlanner.Files/CoordinateSystems/projected.tsv > points.tsv

Run with PROJ 9.1.1 and GDAL 3.6.2. For each system of our table a point of its area of use (four times as many for those that people use
most), sent from longitude and latitude on the system's own datum into its plane by `gdaltransform -s_srs BASE -t_srs CODE`, so that no
datum shift takes part. Columns: code, longitude, latitude (degrees, own datum and Greenwich), easting, northing (units of the system).
"""
import random
import sqlite3
import subprocess
import sys

db = sqlite3.connect(sys.argv[1])
random.seed(3)
MOST_USED = {"3035", "5070", "3338", "3005", "3577", "27700", "2154", "25832", "3857", "6931", "6932", "3031", "3413", "3995", "6933", "26931", "28992", "5880", "3395", "32633",
             "32733", "2230", "2263", "2193", "3832", "3347", "3978", "3979", "3153", "3067", "3006", "31370", "2056", "21781", "3812", "3844", "3763", "25833", "28355", "7856",
             "6360", "ESRI:102003", "ESRI:102001", "ESRI:102008", "5641", "3408", "32661", "3411", "3976", "5938", "29873", "3167", "3168", "3994", "3388"}

print("code\tlon\tlat\tx\ty")
for line in open(sys.argv[2], encoding="utf-8").read().splitlines()[1:]:
    code = line.split("\t")[0]
    authority, number = code.split(":") if ":" in code else ("EPSG", code)
    base = db.execute("select geodetic_crs_auth_name||':'||geodetic_crs_code from projected_crs where auth_name=? and code=?", (authority, number)).fetchone()[0]
    box = db.execute("""select west_lon, south_lat, east_lon, north_lat from usage u join extent e on e.auth_name=u.extent_auth_name and e.code=u.extent_code
       where u.object_table_name='projected_crs' and u.object_auth_name=? and u.object_code=?""", (authority, number)).fetchone()
    west, south, east, north = box
    east += 360 if east < west else 0
    points = []
    for _ in range(20 if code in MOST_USED else 1):
        points.append((round(random.uniform(west, east), 6), round(random.uniform(max(south, -85), min(north, 85)), 6)))
    datum = line.split("\t")[2]
    if datum == "6807":
        continue  # counted in grads from Paris: tested by hand
    result = subprocess.run(["gdaltransform", "-output_xy", "-s_srs", base, "-t_srs", f"{authority}:{number}"], input="\n".join(f"{x} {y}" for x, y in points), capture_output=True, text=True)
    for (lon, lat), answer in zip(points, result.stdout.splitlines()):
        x, y = answer.split()
        if "inf" in answer:
            sys.exit(f"{code}: {lon} {lat} gives {answer}")
        print(f"{code}\t{lon}\t{lat}\t{float(x):.5f}\t{float(y):.5f}")
