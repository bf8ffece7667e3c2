"""The bench's formulas over the whole grid, vectorised. Prints the best time in milliseconds and a checksum."""
import time

import numpy as np

E_CHARGE, M_E, C = 1.602176634e-19, 9.1093837139e-31, 299792458.0


def to_figures(x, figures):
    scale = 10.0 ** (figures - 1 - np.floor(np.log10(np.abs(x))))
    return np.round(x * scale) / scale


def run():
    index = np.arange(1_000_000)
    va = 150.0 + index // 5000
    b = (50 + index // 50 % 100) / 1e5
    d = (20 + index % 50) / 1e3
    v = np.sqrt(2 * E_CHARGE * va / M_E)
    r = to_figures(M_E * v / (E_CHARGE * b), 3)
    field = to_figures(va / d, 3)
    force = E_CHARGE * field
    a = force / M_E
    t = d / v
    sc = 2 * va / (b**2 * r**2)
    kept = (r < 0.08) & (v < 0.1 * C)
    return va, b, d, v, r, field, force, a, t, sc, kept


times = []
for _ in range(7):
    start = time.perf_counter()
    columns = run()
    times.append((time.perf_counter() - start) * 1000)
print(min(times), columns[9][columns[10]].sum(), columns[10].sum())
