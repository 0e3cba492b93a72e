#!/usr/bin/env python3
"""Makes wkt.tsv: coordinate systems as two families of programs write them, for the tests of SurveyPlanner.Files.CoordinateSystems.

    python3 make-wkt.py points.tsv > wkt.tsv

Run with GDAL 3.6.2 (PROJ 9.1.1): `gdalsrsinfo -o wkt1 --single-line CODE` and `-o wkt_esri` for every system that has more than one point
in points.tsv, some NAD83 state planes and some systems in degrees. Columns: code, dialect, text.
"""
import collections
import subprocess
import sys

codes = collections.Counter(line.split("\t")[0] for line in open(sys.argv[1]).read().splitlines()[1:])
wanted = [code for code, count in codes.items() if count > 1] + ["2225", "2236", "2249", "2276", "2285", "26910", "26911", "6339", "6350", "6596", "3435", "3650",
          "4269", "4258", "4326", "4277", "4267", "4283", "4674", "4807", "27572", "5514", "2180", "31700", "5880", "29902", "27200", "23032", "4314"]
print("code\tdialect\twkt")
for code in dict.fromkeys(wanted):
    for dialect in ("wkt1", "wkt_esri"):
        name = code if ":" in code else "EPSG:" + code
        text = subprocess.run(["gdalsrsinfo", "-o", dialect, "--single-line", name], capture_output=True, text=True).stdout.strip()
        if text and "\t" not in text and "\n" not in text:
            print(f"{code}\t{dialect}\t{text}")
