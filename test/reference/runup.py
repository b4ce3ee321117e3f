"""Run-up through resonance in closed form: with a quadratic phase the response is a pair of complex error functions,
  J(t) = int_0^t exp(l (t - s) + i phi(s)) ds,  phi = r s + m s^2/2,  t in radians of natural motion,
here by mpmath's erf at 50 digits; extremes by reading 16 places per radian and the derivative's root.
Run: python3 test/reference/runup.py"""
import mpmath as mp

from rows import digits, write

mp.mp.dps = 50


def peak(fn, zeta, rate, start, end):
    fn, zeta, rate, start, end = map(mp.mpf, (fn, zeta, rate, start, end))
    if zeta == 1:
        zeta -= mp.mpf(10) ** -20
    sign = 1 if end > start else -1
    r, m = start / fn, sign * rate / (2 * mp.pi * fn**2)
    length = abs(end - start) / rate * 2 * mp.pi * fn
    l1 = -zeta + mp.sqrt(mp.mpc(zeta**2 - 1))
    l2 = -zeta - mp.sqrt(mp.mpc(zeta**2 - 1))
    q = mp.sqrt(mp.mpc(0, -m) / 2)  # exp(i m s^2/2 + (i r - l) s) = exp(-(q s - g)^2 + g^2)

    def J(l, t):
        g = (1j * r - l) / (2 * q)
        return mp.exp(l * t + g * g) * mp.sqrt(mp.pi) / (2 * q) * (mp.erf(q * t - g) - mp.erf(-g))

    # x'' + 2 zeta x' + x = u + 2 zeta u', u = Im exp(i phi): transfer (1 + 2 zeta l)/((l - l1)(l - l2)) by residues
    k1, k2 = (1 + 2 * zeta * l1) / (l1 - l2), (1 + 2 * zeta * l2) / (l2 - l1)

    def both(t):
        e = mp.expj(r * t + m * t * t / 2)
        a, b = J(l1, t), J(l2, t)
        # the response to the conjugate force is needed for the imaginary part: Im over real kernels k1 e^{l1 t} + k2 e^{l2 t}
        x = k1 * a + k2 * b
        v = k1 * (l1 * a + e) + k2 * (l2 * b + e)
        return x.imag, v.imag

    n = int(mp.ceil(length * max(1, start / fn, end / fn) * 3))
    mp.mp.dps = 20
    coarse = [both(length * i / n)[1] for i in range(n + 1)]
    values = [abs(both(length * i / n)[0]) for i in range(n + 1)]
    mp.mp.dps = 50
    top = max(values)
    best = max(abs(both(length)[0]), abs(both(mp.mpf(0))[0]))
    for i in range(n):
        if coarse[i] * coarse[i + 1] <= 0 and max(values[i], values[i + 1]) > top * mp.mpf("0.93"):
            root = mp.findroot(lambda t: both(t)[1], (length * i / n, length * (i + 1) / n), solver="anderson",
                               tol=mp.mpf(10) ** -40, maxsteps=50, verify=False)
            best = max(best, abs(both(root)[0]))
    return best


rows = []
for case in [(8.0, 0.05, 5.0, 0.0, 30.0), (8.0, 0.05, 25.0, 1.0, 40.0), (8.0, 0.0, 3.0, 2.0, 14.0), (5.0, 0.1, 4.0, 25.0, 0.0),
             (10.0, 0.5, 100.0, 0.0, 50.0), (6.0, 0.02, 2.0, 12.0, 3.0), (3.0, 1.5, 10.0, 0.0, 12.0), (8.0, 0.05, 1000.0, 0.0, 80.0)]:
    rows.append({"in": dict(zip(("fn", "zeta", "rate", "from", "to"), case)), "out": digits(peak(*case))})
write("runup", "complex error functions at 50 digits, see the script", rows)
