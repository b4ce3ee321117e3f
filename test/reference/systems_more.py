"""Relaxation mount, two stages, plane load share and rigid-body modes at 60 digits by direct linear algebra.
Run: python3 test/reference/systems_more.py"""
import mpmath as mp

from rows import digits, write

mp.mp.dps = 60
rows = []
for f, fn, zeta, N in [(2.0, 1.0, 1e6, 3.0), (2.0000000000000004, 1.0, 1e8, 3.0), (1.0000000001, 1.0, 1e-9, 5.0), (0.3, 0.1, 0.2, 1e-6),
                       (1e5, 3.0, 0.1, 4.0), (3.3166247903554, 1.0, 50.0, 10.0), (7.0, 11.0, 0.4, 1e9), (1.0, 1.0, 1e-12, 2.0)]:
    F, G, z, n = map(mp.mpf, (f, fn, zeta, N))
    r = F / G
    k = 1 + n * 2j * z * r / (n + 2j * z * r)
    rows.append({"table": "relaxation", "in": [f, fn, zeta, N], "out": digits(abs(k) / abs(k - r * r))})
for f, a, b in [(3.0, (1e-3, 50.0, 0.01), (2e4, 1e9, 1e3)), (1e-3, (5.0, 2e5, 10.0), (1.0, 4e4, 0.0)), (31.0, (80.0, 3e6, 2e4), (400.0, 1e6, 9e4))]:
    (m1, k1, c1), (m2, k2, c2) = [tuple(map(mp.mpf, s)) for s in (a, b)]
    w = 2 * mp.pi * mp.mpf(f)
    K1, K2 = k1 + 1j * w * c1, k2 + 1j * w * c2
    M = mp.matrix([[K1 + K2 - m1 * w * w, -K2], [-K2, K2 - m2 * w * w]])
    rows.append({"table": "two stage", "in": [f, list(a), list(b)], "out": digits(abs(mp.lu_solve(M, mp.matrix([K1, 0]))[1]))})
    S = mp.matrix([[(k1 + k2) / m1, -k2 / mp.sqrt(m1 * m2)], [-k2 / mp.sqrt(m1 * m2), k2 / m2]])
    E = sorted(mp.eigsy(S, eigvals_only=True))
    rows.append({"table": "two stage frequencies", "in": [list(a), list(b)], "out": [digits(mp.sqrt(e) / (2 * mp.pi)) for e in E]})
for mounts, weight, cg in [
    ([(0.0, 0.0, 120e3), (1.8, 0.1, 90e3), (1.7, 1.2, 150e3), (-0.1, 1.1, 70e3)], 8000.0, (0.9, 0.4)),
    ([(0.0, 0.0, 1e5), (2.0, 0.0, 1e5), (1.0, 1.0, 1e5)], 500.0, (2.5, -0.2)),
    ([(1000.0, 500.0, 1e5), (1000.5, 500.0, 3e5), (1000.0, 500.3, 2e5), (1000.5, 500.3, 1e5), (1000.2, 500.1, 5e4)], 1234.5, (1000.3, 500.12)),
    ([(0.0, 0.0, 1.0), (1.0, 1e-4, 2.0), (2.0, 0.0, 1.0), (3.0, 1e-4, 2.0)], 10.0, (1.4, 5e-5)),
]:
    M, rhs = mp.matrix(3, 3), mp.matrix([mp.mpf(weight) * v for v in (1, mp.mpf(cg[0]), mp.mpf(cg[1]))])
    for x, y, k in mounts:
        b = [mp.mpf(1), mp.mpf(x), mp.mpf(y)]
        for i in range(3):
            for j in range(3):
                M[i, j] += mp.mpf(k) * b[i] * b[j]
    z = mp.lu_solve(M, rhs)
    loads = [mp.mpf(k) * (z[0] + z[1] * mp.mpf(x) + z[2] * mp.mpf(y)) for x, y, k in mounts]
    rows.append({"table": "loads", "in": [[list(m) for m in mounts], weight, list(cg)], "out": [digits(v) for v in loads]})
for mass, inertia, mounts in [
    (180.0, [[9.5, -0.7, 0.4], [-0.7, 13.2, -1.1], [0.4, -1.1, 15.9]],
     [((0.4, 0.3, -0.2), (6e4, 6e4, 1e5)), ((0.45, -0.3, -0.2), (6e4, 7e4, 1.4e5)), ((-0.4, 0.35, -0.25), (8e4, 6e4, 9e4)), ((-0.5, -0.3, -0.2), (5e4, 6e4, 1.1e5))]),
    (500.0, [[40.0, 0.0, 0.0], [0.0, 61.25, 0.0], [0.0, 0.0, 80.0]],  # one soft direction beside stiff ones
     [((0.45, 0.3, -0.4), (1e-3, 1e6, 1e8)), ((0.45, -0.3, -0.4), (1e-3, 1e6, 1e8)), ((-0.45, 0.3, -0.4), (1e-3, 1e6, 1e8)), ((-0.45, -0.3, -0.4), (1e-3, 1e6, 1e8))]),
]:
    K, Mm = mp.matrix(6, 6), mp.matrix(6, 6)
    for i in range(3):
        Mm[i, i] = mp.mpf(mass)
        for j in range(3):
            Mm[3 + i, 3 + j] = mp.mpf(inertia[i][j])
    for position, stiffness in mounts:
        x, y, z = map(mp.mpf, position)
        J = mp.matrix([[1, 0, 0, 0, z, -y], [0, 1, 0, -z, 0, x], [0, 0, 1, y, -x, 0]])
        K += J.T * mp.diag([mp.mpf(k) for k in stiffness]) * J
    L = mp.cholesky(Mm)
    A = mp.inverse(L) * K * mp.inverse(L).T
    E = sorted(mp.eigsy((A + A.T) / 2, eigvals_only=True))
    rows.append({"table": "modes", "in": {"mass": mass, "inertia": inertia, "positions": [list(p) for p, _ in mounts], "stiffnesses": [list(k) for _, k in mounts]},
                 "out": [digits(mp.sqrt(abs(e)) / (2 * mp.pi)) for e in E]})
write("systems_more", "60 digits, see the script", rows)
