"""From kilometres to degrees, GeoJSON as RFC 7946 asks for it, and areas on the ellipsoid."""

import json
import math

_A, _F = 6378137.0, 1 / 298.257223563  # WGS 84
_E2 = _F * (2 - _F)
_E = math.sqrt(_E2)


def degrees(ring, origin):
    """A ring in kilometres about an origin (lon, lat) to degrees, rounded to 6 decimals (about 0.1 m)."""
    lon0, lat0 = origin
    east = 111.32 * math.cos(math.radians(lat0))
    out = []
    for x, y in ring:
        place = (round(lon0 + x / east, 6), round(lat0 + y / 111.2, 6))
        if not out or place != out[-1]:
            out.append(place)
    return out


def area_km2(polygon):
    """Area of a polygon (shell, holes) on WGS 84 with edges straight in longitude and latitude, square kilometres.

    Between the equator and latitude f a sliver of width dlon has the area S(f) dlon, where
    S = b^2/2 [ sin f / (1 - e^2 sin^2 f) + artanh(e sin f) / e ] (the authalic latitude's integral, Snyder 1987,
    USGS Professional Paper 1395, eq. 3-12, times a^2/2). Summed round each ring; along an edge by Gauss-Legendre, 5 nodes.
    """
    return abs(sum(_ring_area(ring) for ring in polygon)) / 1e6


def _ring_area(ring):
    total = 0.0
    for (lon1, lat1), (lon2, lat2) in zip(ring, ring[1:] + ring[:1]):
        middle, half = (lat1 + lat2) / 2, (lat2 - lat1) / 2
        mean = sum(weight * _sliver(math.radians(middle + half * node)) for node, weight in _GAUSS) / 2
        total += math.radians(lon2 - lon1) * mean
    return total


def _sliver(latitude):
    s = math.sin(latitude)
    return _A * _A * (1 - _E2) / 2 * (s / (1 - _E2 * s * s) + math.atanh(_E * s) / _E)


_GAUSS = [(0.0, 128 / 225)] + [
    (sign * math.sqrt(5 + k * 2 * math.sqrt(10 / 7)) / 3, (322 - k * 13 * math.sqrt(70)) / 900)
    for sign in (-1, 1) for k in (-1, 1)
]


def write(path, features):
    """Features as (attributes, polygon in degrees), one Polygon each, rings closed, six positions a line."""
    parts = []
    for attributes, polygon in features:
        rings = ",\n".join(_ring(ring) for ring in polygon)
        parts.append(
            '    {\n      "type": "Feature",\n      "properties": ' + json.dumps(attributes, ensure_ascii=False)
            + ',\n      "geometry": {\n        "type": "Polygon",\n        "coordinates": [\n' + rings
            + "\n        ]\n      }\n    }")
    text = '{\n  "type": "FeatureCollection",\n  "features": [\n' + ",\n".join(parts) + "\n  ]\n}\n"
    path.write_text(text, encoding="utf-8", newline="\n")


def _ring(ring):
    places = [f"[{lon:.6f},{lat:.6f}]" for lon, lat in ring + ring[:1]]
    lines = [",".join(places[i:i + 6]) for i in range(0, len(places), 6)]
    return "          [" + (",\n           ").join(lines) + "]"
