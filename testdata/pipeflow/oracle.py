# Independent values for the tests of pipeflow. Run with Debian's python3, python3-scipy and python3-mpmath:
#   python3 oracle.py geometry > geometry.csv
#   python3 oracle.py depths > depths.csv
#
# Method. No closed form of the package is used. The right-hand wall is a function x(z) of height, made from the bare
# description of the shape (for arcs: centres and radii from the tangency conditions, solved together by Newton's method
# in 30 digits). Area, perimeter and first moment are integrals over x(z) by tanh-sinh quadrature (mpmath.quad, 30 digits);
# depths are roots by scipy.optimize.brentq (xtol 1e-15, rtol 4 eps) of those integrals in double precision.
import sys

import mpmath as mp
import scipy
from scipy.optimize import brentq

mp.mp.dps = 30


def circle(D):
    D = mp.mpf(D)
    return dict(rise=D, floor=0, joints=[], x=lambda z: mp.sqrt(max(z * (D - z), 0)), roof=0)


def ellipse(span, rise):
    a, b = mp.mpf(span) / 2, mp.mpf(rise) / 2
    return dict(rise=2 * b, floor=0, joints=[b], x=lambda z: a * mp.sqrt(max(1 - ((z - b) / b) ** 2, 0)), roof=0)


def haunched(span, rise, h):
    span, rise, h = mp.mpf(span), mp.mpf(rise), mp.mpf(h)

    def x(z):
        return span / 2 - max(0, h - z, z - (rise - h))

    return dict(rise=rise, floor=span - 2 * h, joints=[h, rise - h] if h else [], x=x, roof=span - 2 * h)


def arcs(span, rise, joints, pieces):
    """pieces: (centre x, centre z, radius) from the bottom up, joints the heights between them."""

    def x(z):
        i = sum(1 for j in joints if z >= j)
        c, v, r = pieces[i]
        return c + mp.sqrt(max(r * r - (z - v) ** 2, 0))

    return dict(rise=mp.mpf(rise), floor=0, joints=joints, x=x, roof=0)


def arch(span, rise, rb, rc):
    span, rise, rb, rc = map(mp.mpf, (span, rise, rb, rc))

    def tangent(c, v, rt):
        return [
            mp.sqrt(c**2 + (rb - v) ** 2) - (rb - rc),
            mp.sqrt(c**2 + (rt - (rise - v)) ** 2) - (rt - rc),
            c + rc - span / 2,
        ]

    c, v, rt = mp.findroot(tangent, (span / 2 - rc, rc * 1.2, span * 0.6))
    if v < rise - rt:  # the crown holds the widest point instead
        rt = span / 2

        def tangent(c, v):
            return [c**2 + (rb - v) ** 2 - (rb - rc) ** 2, c**2 + (rt - (rise - v)) ** 2 - (rt - rc) ** 2]

        c, v = mp.findroot(tangent, (span / 2 - rc, rc * 1.2))
    low = rb - rb * (rb - v) / (rb - rc)
    crown = rise - rt
    high = crown + rt * (v - crown) / (rt - rc)
    if v < crown:  # joint below the crown's centre
        high = crown - rt * (crown - v) / (rt - rc)
    return arcs(span, rise, [low, high], [(0, rb, rb), (c, v, rc), (0, crown, rt)])


def oval(span, rise, small):
    span, rise, r = map(mp.mpf, (span, rise, small))
    long, short = max(span, rise), min(span, rise)
    R = mp.findroot(lambda R: mp.sqrt((long / 2 - r) ** 2 + (R - short / 2) ** 2) - (R - r), long)
    if span > rise:  # large radius at invert and crown
        low = R - R * (R - rise / 2) / (R - r)
        return arcs(span, rise, [low, rise - low], [(0, R, R), (span / 2 - r, rise / 2, r), (0, rise - R, R)])
    low = rise / 2 - R * (rise / 2 - r) / (R - r)
    return arcs(span, rise, [low, rise - low], [(0, r, r), (span / 2 - R, rise / 2, R), (0, rise - r, r)])


def trapezoid(b, z):
    b, z = mp.mpf(b), mp.mpf(z)
    return dict(rise=None, floor=b, joints=[], x=lambda h: b / 2 + z * h, roof=None)


def parabola(width, depth):
    w, d = mp.mpf(width), mp.mpf(depth)
    return dict(rise=None, floor=0, joints=[], x=lambda h: w / 2 * mp.sqrt(h / d), roof=None)


SHAPES = {
    "circle 1.5": circle(1.5),
    "box 8 6": haunched(8, 6, 0),
    "haunched 8 6 0.5": haunched(8, 6, 0.5),
    "ellipse 60 38": ellipse(60, 38),
    "ellipse 38 60": ellipse(38, 60),
    "ellipse 10 1.5": ellipse(10, 1.5),
    "arch 36 22 51 6": arch(36, 22, 51, 6),
    "arch 36 28 51 6": arch(36, 28, 51, 6),
    "oval 60 38 14": oval(60, 38, 14),
    "oval 38 60 14": oval(38, 60, 14),
    "trapezoid 3 2": trapezoid(3, 2),
    "trapezoid 0 1.5": trapezoid(0, 1.5),
    "parabola 4 1": parabola(4, 1),
}


def measure(s, y):
    y = mp.mpf(y)
    cuts = [mp.mpf(0)] + [j for j in s["joints"] if j < y] + [y]
    x = s["x"]
    area = 2 * mp.quad(x, cuts)
    moment = 2 * mp.quad(lambda z: (y - z) * x(z), cuts)
    length = s["floor"]
    for lo, hi in zip(cuts, cuts[1:]):
        length += 2 * arc(x, lo, hi)
    return area, length, 2 * x(y), moment


def arc(x, lo, hi):
    """Length of the wall: z = lo + (hi-lo) sin² u makes the ends smooth; dx/du by a central difference in 30 digits."""
    h = mp.mpf(10) ** -10
    at = lambda u: lo + (hi - lo) * mp.sin(u) ** 2

    def speed(u):
        dx = (x(at(u + h)) - x(at(u - h))) / (2 * h)
        dz = (hi - lo) * mp.sin(2 * u)
        return mp.sqrt(dx * dx + dz * dz)

    return mp.quad(speed, [h, mp.pi / 4, mp.pi / 2 - h]) + h * (speed(h) + speed(mp.pi / 2 - h))


def head(what):
    print("# Computed for this project by oracle.py (method stated there), Python %s, mpmath %s, scipy %s." %
          (sys.version.split()[0], mp.__version__, scipy.__version__))
    print("# " + what)


def geometry():
    head("Coherent units. depth, area, wetted perimeter, top width, first moment about the water surface.")
    print("shape,depth,area,perimeter,top_width,moment")
    for name, s in SHAPES.items():
        for ratio in ("1e-6", "0.01", "0.1", "0.3", "0.5", "0.7", "0.9", "0.99"):
            y = float((s["rise"] or 1) * mp.mpf(ratio))
            print(name, repr(y), *(mp.nstr(v, 17) for v in measure(s, y)), sep=",")


def depths():
    head("k 1, g 9.80665, n 0.013, slope 0.004: flow; normal depth (lower), critical depth, depth conjugate and depth\n"
         "# alternate to the normal depth. Blank: none, or over the rise.")
    print("shape,flow,normal,critical,conjugate,alternate")
    g, k = 9.80665, 0.004**0.5 / 0.013
    for name, s in SHAPES.items():
        roof = float(s["rise"] or 50) * (1 - 1e-9)
        at = lambda y: [float(v) for v in measure(s, y)]
        K = lambda y: (lambda A, P, T, M: k * A * (A / P) ** (2 / 3))(*at(y))
        for share in (0.003, 0.1, 0.4, 0.8):
            flow = float("%.6g" % (share * K(roof if s["rise"] else 1)))
            root = lambda f, lo, hi: brentq(f, lo, hi, xtol=1e-15, rtol=9e-16) if f(lo) * f(hi) <= 0 else None
            normal = root(lambda y: K(y) - flow, roof * 1e-5, roof * (0.9 if s["rise"] else 1))
            crit = root(lambda y: (lambda A, P, T, M: flow**2 * T / (g * A**3) - 1)(*at(y)), roof * 1e-4, roof)
            force = lambda y: (lambda A, P, T, M: flow**2 / (g * A) + M)(*at(y))
            energy = lambda y: y + flow**2 / (2 * g * at(y)[0] ** 2)
            others = []
            for f in (force, energy):
                want = f(normal)
                lo, hi = (crit, roof) if normal < (crit or roof) else (roof * 1e-5, crit)
                others.append(root(lambda y: f(y) - want, lo, hi))
            print(name, flow, *("" if v is None else repr(v) for v in (normal, crit, *others)), sep=",")


{"geometry": geometry, "depths": depths}[sys.argv[1]]()
