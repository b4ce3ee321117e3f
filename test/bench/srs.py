"""Plain shock response spectrum with a compiled filter library, for comparison: prints the ms of each round."""

import sys
import time

import numpy as np
from scipy.signal import lfilter

n, frequencies, rounds, top = int(sys.argv[1]), int(sys.argv[2]), int(sys.argv[3]), float(sys.argv[4])
p = np.random.default_rng(1).uniform(-1, 1, n)
for k in range(-1, rounds):
    start = time.perf_counter()
    for fn in np.geomspace(10, top, frequencies):
        zeta, w = 0.05, 2 * np.pi * fn / 20000
        wd, E = w * np.sqrt(1 - zeta * zeta), np.exp(-zeta * w)
        C, S = E * np.cos(wd), E * np.sin(wd) / wd
        np.abs(lfilter([1 - S, 2 * (S - C), E * E - S], [1, -2 * C, E * E], p)).max()
    if k >= 0:
        print((time.perf_counter() - start) * 1e3)
