"""Shock response spectrum and history of a made record, exact for straight lines between samples: complex modes at 50
digits over each interval, extremes by reading 24 places per interval (or per radian) and the derivative's root.
Run: python3 test/reference/history_more.py"""
import math

import mpmath as mp

from rows import digits, write

mp.mp.dps = 50
DT = 0.001
RECORD = [math.exp(-i / 60) * (3 * math.sin(0.31 * i + 0.4) + math.sin(1.9 * i)) + 0.2 for i in range(160)]


def roots(zeta):
    zeta = mp.mpf(zeta)
    if zeta == 1:
        zeta -= mp.mpf(10) ** -25
    return zeta, -zeta + mp.sqrt(mp.mpc(zeta**2 - 1)), -zeta - mp.sqrt(mp.mpc(zeta**2 - 1))


def piece(zeta, l1, l2, w0, u0, p0, slope):
    e, v = w0 - (p0 - 2 * zeta * slope), u0 - slope
    A = (v - l2 * e) / (l1 - l2)
    B = e - A
    def at(t):
        x, y = A * mp.exp(l1 * t), B * mp.exp(l2 * t)
        return p0 - 2 * zeta * slope + slope * t + (x + y).real, slope + (l1 * x + l2 * y).real
    return at


def run(fn, zeta0, response):
    zeta, l1, l2 = roots(zeta0)
    omega = 2 * mp.pi * mp.mpf(fn)
    theta = omega * mp.mpf(DT)
    law = 2 * zeta if response == "acceleration" else mp.mpf(0)
    w, u, best = mp.mpf(0), mp.mpf(0), mp.mpf(0)
    history = [mp.mpf(0)]
    for p0, p1 in list(zip(RECORD, RECORD[1:])) + [(0.0, None)]:
        p0 = mp.mpf(p0)
        last = p1 is None
        length = 4 * mp.pi * max(1, zeta) if last else theta
        slope = mp.mpf(0) if last else (mp.mpf(p1) - p0) / theta
        at = piece(zeta, l1, l2, w, u, p0, slope)
        def value(t):
            x, y = at(t)
            return x + law * y
        def gradient(t):
            x, y = at(t)
            return y + law * (p0 + slope * t - 2 * zeta * y - x)
        n = int(max(12, mp.ceil(length * 12)))
        if zeta0 > 1 and last:
            n = 400
        ts = [length * i / n for i in range(n + 1)]
        ds = [gradient(t) for t in ts]
        for t1, t2, d1, d2 in zip(ts, ts[1:], ds, ds[1:]):
            best = max(best, abs(value(t2)))
            if d1 * d2 < 0 and abs(value(t1)) > best * mp.mpf("0.9"):
                root = mp.findroot(gradient, (t1, t2), solver="anderson", tol=mp.mpf(10) ** -45, maxsteps=50, verify=False)
                best = max(best, abs(value(root)))
        w, u = at(length)
        if not last:
            history.append(w + law * u)
    if response == "deflection":
        return best / omega**2, [-h / omega**2 for h in history]
    return best, history


rows = [{"table": "record", "in": {"dt": DT}, "samples": RECORD}]
for fn in (0.01, 1.0, 30.0, 100.0, 150.0, 170.0, 480.0, 1500.0, 4000.0):
    for zeta in (0.0, 0.05, 0.5, 1.0, 2.0):
        if fn > 500 and zeta > 0.5:
            continue
        for response in ("acceleration", "deflection"):
            best, history = run(fn, zeta, response)
            rows.append({"table": "srs", "in": {"fn": fn, "zeta": zeta, "response": response}, "out": digits(best),
                         "history": {str(i): digits(history[i]) for i in (1, 2, 40, 159)}})
write("history_more", "record: exp(-i/60) (3 sin(0.31 i + 0.4) + sin(1.9 i)) + 0.2 as doubles; from rest, zero after it", rows)
