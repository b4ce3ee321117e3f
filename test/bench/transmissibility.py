"""Plain absolute transmissibility over columns in numpy, for comparison: prints the milliseconds of each round."""

import sys
import time

import numpy as np

n, rounds = int(sys.argv[1]), int(sys.argv[2])
i = np.arange(n)
f = 1 + (i % 9973) * 0.01
fn = 5 + (i % 4999) * 0.002
zeta = 0.01 + (i % 997) * 0.001
for k in range(-2, rounds):
    start = time.perf_counter()
    r = f / fn
    b = 2 * zeta * r
    b *= b
    out = np.sqrt((1 + b) / ((1 - r * r) ** 2 + b))
    if k >= 0:
        print((time.perf_counter() - start) * 1e3)
