"""Random response and band transmissibility: quadrature in ln f at 40 digits, graded towards resonance on both sides.
Run: python3 test/reference/random_more.py"""
import mpmath as mp

from rows import digits, write

mp.mp.dps = 40
FLAT = [[20.0, 0.01], [2000.0, 0.01]]
MIXED = [[20.0, 0.0053], [150.0, 0.04], [600.0, 0.04], [2000.0, 0.0064]]
STEEP = [[10.0, 1e-6], [20.0, 0.1], [21.0, 0.1], [22.0, 1e-5], [500.0, 1e-5]]
CLIFF = [[50.0, 1e-150], [50.5, 1.0], [60.0, 1.0], [60.001, 1e-200]]
NARROW = [[100.0, 1.0], [100.00000000000001, 3.0]]


def squared_gain(v, zeta, response, model):
    r2 = mp.exp(2 * v)
    b2 = 4 * zeta**2 * (r2 if model == "viscous" else 1)
    top = 1 + b2 if response == "acceleration" else 1
    return top / (mp.expm1(2 * v) ** 2 + b2)


def cuts(v1, v2, zeta):
    points = {v1, v2}
    for side in (-1, 1):
        x = mp.mpf(1)
        while x > zeta / 100 and x > mp.mpf(10) ** -12:
            points.add(side * x)
            x /= 4
    points.add(mp.mpf(0))
    count = 12
    points |= {v1 + (v2 - v1) * i / count for i in range(1, count)}
    return sorted(p for p in points if v1 <= p <= v2)


def rms(profile, fn, zeta, response, model):
    fn, zeta = mp.mpf(fn), mp.mpf(zeta)
    total = mp.mpf(0)
    for (f1, s1), (f2, s2) in zip(profile, profile[1:]):
        f1, s1, f2, s2 = map(mp.mpf, (f1, s1, f2, s2))
        n = mp.log(s2 / s1) / mp.log(f2 / f1)
        v1, v2 = mp.log(f1 / fn), mp.log(f2 / fn)
        g = lambda v: s1 * mp.exp(n * (v - v1)) * mp.exp(v) * fn * squared_gain(v, zeta, response, model)
        total += mp.quad(g, cuts(v1, v2, zeta))
    result = mp.sqrt(total)
    return result if response == "acceleration" else result / (2 * mp.pi * fn) ** 2


def band(fc, fn, zeta, b):
    half = mp.mpf(3) / 20 / b * mp.log(10)
    fc, fn, zeta = mp.mpf(fc), mp.mpf(fn), mp.mpf(zeta)
    v1, v2 = mp.log(fc / fn) - half, mp.log(fc / fn) + half
    total = mp.quad(lambda v: mp.exp(v) * squared_gain(v, zeta, "acceleration", "viscous"), cuts(v1, v2, zeta))
    return mp.sqrt(total / (mp.exp(v2) - mp.exp(v1)))


rows = []
for name, profile, cases in [
    ("flat", FLAT, [(100.0, 1e-6), (100.0, 10.0), (20.0, 1e-4), (2000.0, 0.3), (5.0, 0.0), (100.0, 1.0), (1e-3, 0.05), (1e7, 0.05)]),
    ("mixed", MIXED, [(150.0, 1e-6), (300.0, 0.7), (80.0, 3.0), (599.9999, 1e-5)]),
    ("steep", STEEP, [(21.5, 1e-6), (30.0, 10.0), (20.0, 0.01)]),
    ("cliff", CLIFF, [(50.2, 0.001), (60.0005, 1e-5), (7.0, 0.1)]),
    ("narrow", NARROW, [(100.0, 1e-6), (3.0, 0.1), (100.00000000000003, 1e-9)]),
]:
    for fn, zeta in cases:
        for model in ("viscous", "hysteretic"):
            for response in ("acceleration", "deflection"):
                out = digits(rms(profile, fn, zeta, response, model))
                row = {"profile": name, "points": profile, "fn": fn, "zeta": zeta, "model": model, "response": response}
                rows.append({"table": "response", "in": row, "out": out})
for fc, fn, zeta, b in [
    (20.0, 5.0, 0.05, 3), (5.0, 5.0, 0.05, 1), (5.0, 5.0, 1e-6, 3), (6.3, 5.0, 0.0, 3), (5.0, 5.7, 0.01, 12),
    (100.0, 5.0, 10.0, 24), (0.01, 5.0, 0.1, 3), (4.6, 5.0, 0.001, 6),
]:
    rows.append({"table": "band", "in": {"fc": fc, "fn": fn, "zeta": zeta, "b": b}, "out": digits(band(fc, fn, zeta, b))})
write("random_more", "quadrature at 40 digits, see the script", rows)
