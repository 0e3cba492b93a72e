#!/usr/bin/env python3
"""Makes the two tables of src/SurveyPlanner.Files/CoordinateSystems from the register that PROJ installs.

    python3 make-tables.py /usr/share/proj/proj.db ../../../src/SurveyPlanner.Files/CoordinateSystems

Run with PROJ 9.1.1 (EPSG dataset v10.076, 2022-08-31). Parameters are those of the EPSG Geodetic Parameter Dataset (IOGP), brought to
common units: degrees, metres, position-vector rotations in arc seconds. What is chosen, and the names that other programs use for a datum,
is ours. Neither the program nor its tests need PROJ or this script.
"""
import math
import sqlite3
import sys

db = sqlite3.connect(sys.argv[1])
out = sys.argv[2]

# Datums of the ellipsoids GRS 80, WGS 84 and CGCS2000 are taken as WGS 84 when the register has a shift to it of at most 3 m without
# rotation; these few are too although it has none.
SAME_TOO = ["6326", "6258", "1116", "1117", "1118", "6759", "1133", "6140", "1193", "1194", "1195", "1197", "1198", "1168", "1043", "1128", "6656", "1313", "1312", "6171",
            "1178", "1305", "1293", "1187", "6674", "6686", "1057", "1120", "1026"]


def same_as_wgs84():
    rows = db.execute("""select distinct d.code from geodetic_datum d join ellipsoid e on e.auth_name=d.ellipsoid_auth_name and e.code=d.ellipsoid_code
      join geodetic_crs g on g.datum_auth_name=d.auth_name and g.datum_code=d.code
      join helmert_transformation_table h on h.source_crs_auth_name=g.auth_name and h.source_crs_code=g.code
      where d.auth_name='EPSG' and d.deprecated=0 and e.code in (7019, 7030, 1024) and h.target_crs_auth_name='EPSG' and h.target_crs_code='4326' and h.deprecated=0
      and h.rx is null and max(abs(h.tx), abs(h.ty), abs(h.tz)) <= 3""")
    return sorted({str(row[0]) for row in rows} | set(SAME_TOO), key=int)


# Datums with a shift: datum code -> EPSG operations, tried in order of their areas.
SHIFTED = {6277: [1314], 6267: [1173, 1176], 6230: [1133], 6284: [1267], 6200: [1281], 6314: [1777], 6312: [1618], 6149: [1766], 6150: [1676],
           6289: [15934], 6313: [15929], 6299: [1641], 6300: [1954], 6272: [1564], 6202: [15788], 6203: [1669], 6301: [1231], 6618: [1864],
           6124: [1680], 6275: [1193], 6807: [1193], 6265: [1660], 6156: [1623], 6237: [1448], 6123: [10099], 6611: [1825], 6322: [1237],
           6222: [1128], 6121: [1272], 6274: [1987], 6207: [1988], 6231: [3905], 6179: [15995], 6209: [1113], 6210: [1122], 6143: [1470], 6756: [5194]}

# Datums whose systems are found by the text of a .prj only: thousands of zones nobody names by code.
BY_TEXT_ONLY = {"6284", "6200", "6322", "6152", "6759", "1133"}

METHODS = {9807: "transverse-mercator", 9802: "lambert-conformal-conic", 9801: "lambert-conformal-conic", 9822: "albers", 9820: "azimuthal-equal-area",
           9810: "polar-stereographic", 9829: "polar-stereographic", 9804: "mercator", 9805: "mercator", 1024: "pseudo-mercator",
           9835: "cylindrical-equal-area", 9809: "oblique-stereographic", 9812: "hotine-oblique-mercator", 9815: "oblique-mercator",
           9818: "polyconic"}

PARAMETERS = {8801: "lat0", 8802: "lon0", 8805: "k", 8806: "fe", 8807: "fn", 8811: "lat0", 8812: "lon0", 8813: "azimuth", 8814: "gamma", 8815: "k",
              8816: "fe", 8817: "fn", 8821: "lat0", 8822: "lon0", 8823: "lat1", 8824: "lat2", 8826: "fe", 8827: "fn", 8832: "lat1", 8833: "lon0"}
COLUMNS = ["lat0", "lon0", "lat1", "lat2", "k", "fe", "fn", "azimuth", "gamma"]

# ESRI codes that agencies use by name.
ESRI = [102001, 102002, 102003, 102004, 102008, 102009, 102013, 102014, 102015, 102017, 102020, 102022, 102025, 102028, 102033]


def in_si(value, authority, code):
    if str(code) in ("9110",):  # sexagesimal DDD.MMSSs
        sign, text = (-1 if value < 0 else 1), "%.11f" % abs(value)
        degrees, rest = text.split(".")
        return sign * (int(degrees) + int(rest[:2]) / 60 + float(rest[2:4] + "." + rest[4:]) / 3600)
    kind, factor = db.execute("select type, conv_factor from unit_of_measure where auth_name=? and code=?", (authority, code)).fetchone()
    if kind == "angle":
        return value if str(code) in ("9102", "9122") else math.degrees(value * factor)
    return value * factor


def number(value):
    text = "%.15g" % value
    return "0" if text == "-0" else text


def other_datums():
    """Every other datum that the register can bring to WGS 84 by three or seven parameters: with the operation of the largest area."""
    known = set(same_as_wgs84()) | {str(c) for c in SHIFTED}
    best = {}
    for datum, operation, west, south, east, north, accuracy in db.execute("""select d.code, h.code, x.west_lon, x.south_lat, x.east_lon, x.north_lat, h.accuracy
      from geodetic_datum d join ellipsoid e on e.auth_name=d.ellipsoid_auth_name and e.code=d.ellipsoid_code
      join geodetic_crs g on g.datum_auth_name=d.auth_name and g.datum_code=d.code and g.type='geographic 2D'
      join helmert_transformation_table h on h.source_crs_auth_name=g.auth_name and h.source_crs_code=g.code
      join usage u on u.object_table_name='helmert_transformation' and u.object_auth_name=h.auth_name and u.object_code=h.code
      join extent x on x.auth_name=u.extent_auth_name and x.code=u.extent_code
      where d.auth_name='EPSG' and d.deprecated=0 and h.auth_name='EPSG' and h.target_crs_auth_name='EPSG' and h.target_crs_code='4326' and h.deprecated=0
      and h.method_code in (9603, 9606, 9607) and h.accuracy < 60 and h.accuracy > 0"""):
        width = east - west + (360 if east < west else 0)
        rank = (width * (north - south), -accuracy, -int(operation))
        if str(datum) not in known and rank > best.get(datum, ((), 0))[0]:
            best[datum] = (rank, operation)
    return {int(datum): [int(operation)] for datum, (_, operation) in sorted(best.items())}


OTHER = other_datums()
SHIFTS = SHIFTED | OTHER


def datum_rows():
    for code in [c for c in same_as_wgs84() if int(c) not in SHIFTED] + [str(c) for c in SHIFTS]:
        row = db.execute("""select d.name, e.semi_major_axis, e.inv_flattening, e.semi_minor_axis, p.longitude, p.uom_auth_name, p.uom_code, e.uom_auth_name, e.uom_code
          from geodetic_datum d join ellipsoid e on e.auth_name=d.ellipsoid_auth_name and e.code=d.ellipsoid_code
          join prime_meridian p on p.auth_name=d.prime_meridian_auth_name and p.code=d.prime_meridian_code
          where d.auth_name='EPSG' and d.code=?""", (code,)).fetchone()
        if row is None:
            sys.exit(f"no datum {code}")
        name, a, rf, b, pm, pa, pc, ea, ec = row
        a = in_si(a, ea, ec)
        rf = rf if rf else a / (a - in_si(b, ea, ec))
        aliases = sorted({r[0] for r in db.execute("select alt_name from alias_name where table_name='geodetic_datum' and auth_name='EPSG' and code=?", (code,))})
        codes = [str(r[0]) for r in db.execute("select code from geodetic_crs where auth_name='EPSG' and type='geographic 2D' and datum_code=? and deprecated=0", (code,))]
        systems = [r[0] for r in db.execute("select name from geodetic_crs where auth_name='EPSG' and type='geographic 2D' and datum_code=? and deprecated=0", (code,))]
        shifts = [shift(operation) for operation in SHIFTS.get(int(code), [])]
        yield [code, systems[0] if systems else name, "|".join([name] + aliases), number(a), number(rf), number(in_si(pm, pa, pc)), ",".join(codes), ";".join(shifts)]


def shift(operation):
    row = db.execute("""select tx,ty,tz,rx,ry,rz,scale_difference,method_code,accuracy,rotation_uom_auth_name,rotation_uom_code from helmert_transformation_table
       where auth_name='EPSG' and code=?""", (operation,)).fetchone()
    tx, ty, tz, rx, ry, rz, s, method, accuracy, ra, rc = row
    rotations = [3600 * in_si(r, ra, rc) for r in (rx, ry, rz)] if rx is not None else [0, 0, 0]
    if int(method) == 9607:  # coordinate frame: the same rotation seen the other way
        rotations = [-r for r in rotations]
    box = db.execute("""select west_lon, south_lat, east_lon, north_lat from usage u join extent e on e.auth_name=u.extent_auth_name and e.code=u.extent_code
       where u.object_table_name='helmert_transformation' and u.object_auth_name='EPSG' and u.object_code=?""", (operation,)).fetchone()
    return ",".join([str(operation)] + [number(v) for v in [tx, ty, tz] + rotations + [s or 0, accuracy] + list(box)])


def projected_rows(datums):
    rows = db.execute("""select p.auth_name, p.code, p.name, p.conversion_auth_name, p.conversion_code, g.datum_code, p.coordinate_system_code, p.coordinate_system_auth_name
       from projected_crs p join geodetic_crs g on g.auth_name=p.geodetic_crs_auth_name and g.code=p.geodetic_crs_code
       where p.deprecated=0 and (p.auth_name='EPSG' or (p.auth_name='ESRI' and p.code in (%s)))""" % ",".join("'%d'" % c for c in ESRI)).fetchall()
    for authority, code, name, ca, cc, datum, cs, csa in sorted(rows, key=lambda r: (r[0], int(r[1]))):
        axes = db.execute("select orientation, uom_auth_name, uom_code from axis where coordinate_system_auth_name=? and coordinate_system_code=? order by coordinate_system_order", (csa, cs)).fetchall()
        if str(datum) not in datums or str(datum) in BY_TEXT_ONLY or int(datum) in OTHER or len(axes) != 2:
            continue
        conversion = db.execute("select * from conversion_table where auth_name=? and code=?", (ca, cc)).fetchone()
        method = int(conversion[5]) if conversion[4] == "EPSG" else 0
        if method not in METHODS:
            continue
        polar = all(" along " in o for o, _, _ in axes)
        if not polar and {o for o, _, _ in axes} != {"north", "east"}:
            continue  # southing or westing: other programs disagree about the signs in such files
        values = {}
        for i in range(7):
            pa, pc, value, ua, uc = conversion[6 + 5 * i: 11 + 5 * i]
            if pc is not None:
                values[PARAMETERS[int(pc)]] = in_si(value, ua, uc)
        if method in (9835, 9805) and "lat1" not in values and "lat0" in values:
            values["lat1"] = values.pop("lat0")
        unit = db.execute("select conv_factor from unit_of_measure where auth_name=? and code=?", axes[0][1:]).fetchone()[0]
        if method == 9805:
            values.setdefault("lat1", 0)
        yield [("" if authority == "EPSG" else authority + ":") + str(code), name, str(datum), METHODS[method], number(unit)] + [number(values[c]) if c in values else "" for c in COLUMNS]


def write(name, header, rows):
    with open(f"{out}/{name}", "w", encoding="utf-8", newline="\n") as file:
        file.write("\t".join(header) + "\n")
        for row in rows:
            file.write("\t".join(row).rstrip("\t") + "\n")


datums = list(datum_rows())
write("datums.tsv", ["code", "name", "also", "a", "rf", "prime_meridian", "geographic_codes", "shifts"], datums)
write("projected.tsv", ["code", "name", "datum", "method", "unit"] + COLUMNS, projected_rows({d[0] for d in datums}))
