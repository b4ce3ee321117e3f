"""Shock pulses: each piece solved by its closed form at 60 digits (the characteristic roots as complex numbers, exactly
critical damping nudged by 1e-30), extremes by dense reading and the derivative's root. Long pulses are read about the
ends and the top of the pulse only: elsewhere the forced motion is lower by more than the ringing.
Run: python3 test/reference/shock_more.py"""
import mpmath as mp

from rows import digits, write

mp.mp.dps = 60


def pieces(shape, T):
    pi = mp.pi
    return {
        # (length, p at its start, slope, sine amplitude, its frequency, mean, cosine amplitude)
        "half-sine": [(T, 0, 0, 1, pi / T, 0)],
        "haversine": [(T, mp.mpf(1) / 2, 0, 0, 2 * pi / T, -mp.mpf(1) / 2)],
        "initial-peak sawtooth": [(T, 1, -1 / T, 0, 0, 0)],
        "terminal-peak sawtooth": [(T, 0, 1 / T, 0, 0, 0)],
        "triangle": [(T / 2, 0, 2 / T, 0, 0, 0), (T / 2, 1, -2 / T, 0, 0, 0)],
        "rectangle": [(T, 1, 0, 0, 0, 0)],
        "trapezoid": [(T / 10, 0, 10 / T, 0, 0, 0), (T * 8 / 10, 1, 0, 0, 0, 0), (T / 10, 1, -10 / T, 0, 0, 0)],
    }[shape]


def solution(piece, zeta, w0, u0):
    """w(t), u(t) of w'' + 2 zeta w' + w = p with p = level + slope t + s sin(a t) + c cos(a t)."""
    _, level, slope, s, a, c = piece
    l1 = -zeta + mp.sqrt(mp.mpc(zeta**2 - 1))
    l2 = -zeta - mp.sqrt(mp.mpc(zeta**2 - 1))
    amplitude = mp.mpc(c, -s)  # Re(amplitude e^{i a t}) = c cos + s sin
    swing = amplitude / (1 - mp.mpf(a) ** 2 + 2j * zeta * a) if (s or c) else mp.mpc(0)
    particular = lambda t: (level - 2 * zeta * slope + slope * t + (swing * mp.expj(a * t)).real,
                            slope + (1j * a * swing * mp.expj(a * t)).real)
    P0, Q0 = particular(mp.mpf(0))
    e, v = w0 - P0, u0 - Q0
    A = (v - l2 * e) / (l1 - l2)
    B = e - A
    def at(t):
        P, Q = particular(t)
        x, y = A * mp.exp(l1 * t), B * mp.exp(l2 * t)
        return P + (x + y).real, Q + (l1 * x + l2 * y).real
    return at


def largest(shape, fnD, zeta, response):
    zeta = mp.mpf(zeta)
    if zeta == 1:
        zeta -= mp.mpf(10) ** -30
    T = 2 * mp.pi * mp.mpf(fnD)
    law = 2 * zeta if response == "acceleration" else mp.mpf(0)
    w, u = mp.mpf(0), mp.mpf(0)
    best = mp.mpf(0)
    free = (8 * mp.pi, 0, 0, 0, 0, 0)
    for piece in pieces(shape, T) + [free]:
        at = solution(piece, zeta, w, u)
        length, level, slope, s, a, c = piece
        length = mp.mpf(length)
        def value(t):
            x, y = at(t)
            return x + law * y
        def gradient(t):
            x, y = at(t)
            p = level + slope * t + s * mp.sin(a * t) + c * mp.cos(a * t)
            return y + law * (p - 2 * zeta * y - x)
        windows = [(mp.mpf(0), length)]
        if length > 400:
            windows = [(mp.mpf(0), mp.mpf(30)), (length / 2 - 30, length / 2 + 30), (length - 30, length)]
        for lo, hi in windows:
            n = int(max(40, mp.ceil((hi - lo) * 8)))
            ts = [lo + (hi - lo) * i / n for i in range(n + 1)]
            ds = [gradient(t) for t in ts]
            best = max(best, abs(value(lo)), abs(value(hi)))
            for t1, t2, d1, d2 in zip(ts, ts[1:], ds, ds[1:]):
                if d1 * d2 < 0 and abs(value(t1)) > best * mp.mpf("0.97") - mp.mpf("0.001") * best:
                    root = mp.findroot(gradient, (t1, t2), solver="anderson", tol=mp.mpf(10) ** -60, maxsteps=60, verify=False)
                    best = max(best, abs(value(root)))
        w, u = at(length)
    return best


SHAPES = ["half-sine", "haversine", "initial-peak sawtooth", "terminal-peak sawtooth", "triangle", "rectangle", "trapezoid"]
rows = []
for k, shape in enumerate(SHAPES):
    cases = [(1e-6, 0.05), (1e-6, 0.0), (0.5, 1e-9), (0.7, 0.999999), (1.0, 1.0), (1.9, 0.02), (1.93, 0.02), (6.0, 0.3),
             (40.0, 0.001), (12345.0, 0.01), (1e6, 0.0), (1e6, 0.4)]
    for fnD, zeta in cases:
        for response in ("acceleration", "deflection"):
            rows.append({"in": {"shape": shape, "fnD": fnD, "zeta": zeta, "response": response},
                         "out": digits(largest(shape, fnD, zeta, response))})
write("shock_more", "unit peak and duration; deflection times (2 pi fn)^2; see the script", rows)
