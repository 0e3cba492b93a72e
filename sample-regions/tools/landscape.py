"""Invented landscapes: smooth fractal noise, and the outlines where it crosses zero.

Nothing here is taken from a map. A field is a function of x, y in kilometres; inside is where it is positive.
Only arithmetic, so that the same seed gives the same outline everywhere.
"""

import math

_DIRECTIONS = [(math.cos(k * math.pi / 8), math.sin(k * math.pi / 8)) for k in range(16)]


def _hash(ix, iy, seed):
    """A well-mixed 32-bit number for one corner of the noise lattice."""
    h = (ix * 0x9E3779B1 + iy * 0x85EBCA77 + seed * 0xC2B2AE3D) & 0xFFFFFFFF
    h = ((h ^ (h >> 15)) * 0x2C1B3C6D) & 0xFFFFFFFF
    h = ((h ^ (h >> 12)) * 0x297A2D39) & 0xFFFFFFFF
    return h ^ (h >> 15)


def _gradient_noise(x, y, seed):
    """Gradient noise on the unit lattice, about -0.7 to 0.7, zero at the corners."""
    ix, iy = math.floor(x), math.floor(y)
    fx, fy = x - ix, y - iy

    def corner(dx, dy):
        gx, gy = _DIRECTIONS[_hash(ix + dx, iy + dy, seed) & 15]
        return gx * (fx - dx) + gy * (fy - dy)

    ux = fx * fx * fx * (fx * (fx * 6 - 15) + 10)
    uy = fy * fy * fy * (fy * (fy * 6 - 15) + 10)
    low = corner(0, 0) + ux * (corner(1, 0) - corner(0, 0))
    high = corner(0, 1) + ux * (corner(1, 1) - corner(0, 1))
    return low + uy * (high - low)


def fractal(x, y, seed, wavelength, octaves, gain=0.5):
    """Octaves of noise, each at half the wavelength and `gain` times the height of the one before."""
    x, y = x / wavelength, y / wavelength
    total, height = 0.0, 1.0
    for octave in range(octaves):
        total += height * _gradient_noise(x, y, seed + 101 * octave)
        height *= gain
        # Turned by the 3-4-5 angle at each octave, so that the lattice does not show.
        x, y = 2 * (0.8 * x - 0.6 * y) + 0.37, 2 * (0.6 * x + 0.8 * y) + 0.73
    return total


def outlines(field, x0, y0, x1, y1, step):
    """Closed rings of the zero line of `field` over a rectangle, inside on the left (marching squares).

    The rectangle's rim counts as outside, so every ring closes.
    """
    nx, ny = round((x1 - x0) / step), round((y1 - y0) / step)

    def value(i, j):
        if i in (0, nx) or j in (0, ny):
            return -1.0
        v = field(x0 + i * step, y0 + j * step)
        return v if v != 0 else 1e-12

    grid = [[value(i, j) for i in range(nx + 1)] for j in range(ny + 1)]
    following = {}
    for j in range(ny):
        for i in range(nx):
            for start, end in _cell(grid, i, j):
                following[start] = end

    def place(edge):
        (i, j), (k, l) = edge
        a, b = grid[j][i], grid[l][k]
        t = min(max(a / (a - b), 0.02), 0.98)
        return (x0 + (i + t * (k - i)) * step, y0 + (j + t * (l - j)) * step)

    rings = []
    while following:
        first = edge = next(iter(following))
        ring = []
        while True:
            ring.append(place(edge))
            edge = following.pop(edge)
            if edge == first:
                break
        rings.append(ring)
    return rings


def _cell(grid, i, j):
    """The one or two pieces of the zero line through a cell, from grid edge to grid edge, inside on the left."""
    corners = [(i, j), (i + 1, j), (i + 1, j + 1), (i, j + 1)]
    inside = [grid[b][a] > 0 for a, b in corners]
    edges = [(min(p, q), max(p, q)) for p, q in zip(corners, corners[1:] + corners[:1])]
    # Anticlockwise round the cell: the line leaves the cell where inside turns to outside behind it.
    into = [k for k in range(4) if inside[k] and not inside[(k + 1) % 4]]
    out = [k for k in range(4) if not inside[k] and inside[(k + 1) % 4]]
    if len(into) == 2:
        joined = sum(grid[b][a] for a, b in corners) > 0
        turn = 1 if joined else 3
        return [(edges[k], edges[(k + turn) % 4]) for k in into]
    return [(edges[into[0]], edges[out[0]])] if into else []
