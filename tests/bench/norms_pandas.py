"""The norms of print-norms.ts as a script with pandas takes them: python3 norms_pandas.py FILE [PRECISION] [exact]

PRECISION is read_csv's float_precision: default, high or round_trip, of which only the last reads every number right.
With exact, sines are those of the C library, within a unit of the last digit, and sums are rounded once, at their end
(math.fsum): what the answers of all programs are compared with.
"""
import math
import sys

import numpy as np
import pandas as pd

is_exact = "exact" in sys.argv[2:]
pi = np.pi
sin, cos = ((lambda angles, each=each: np.array(list(map(each, angles.tolist())))) for each in (math.sin, math.cos)) if is_exact else (np.sin, np.cos)
add = math.fsum if is_exact else np.sum
EXACT = {
    "rho": lambda x, y, z: 1.0 + 0.15 * sin(0.75 * pi * x) - 0.10 * cos(pi * y) + 0.08 * sin(1.25 * pi * z),
    "u": lambda x, y, z: 800.0 + 50.0 * sin(1.50 * pi * x) - 30.0 * cos(0.60 * pi * y) + 25.0 * cos(0.50 * pi * z),
    "v": lambda x, y, z: 800.0 - 75.0 * cos(0.50 * pi * x) + 40.0 * sin(0.667 * pi * y) - 35.0 * sin(1.30 * pi * z),
    "w": lambda x, y, z: 800.0 + 15.0 * sin(0.33 * pi * x) - 25.0 * sin(1.50 * pi * y) + 35.0 * cos(pi * z),
    "p": lambda x, y, z: 1e5 + 2e4 * cos(2.00 * pi * x) + 5e4 * sin(pi * y) - 1e4 * cos(0.33 * pi * z),
}

path = sys.argv[1]
precision = sys.argv[2] if len(sys.argv) > 2 else "default"
table = pd.read_csv(path, engine="c", **({} if precision == "default" else {"float_precision": precision}))
x, y, z = (table[name].to_numpy() for name in "xyz")
weight = table["volume"].to_numpy() if "volume" in table else np.ones_like(x)
total = add(weight)
print(f"{path}: {len(x)} rows, h = {(total / len(x) if 'volume' in table else 1 / len(x)) ** (1 / 3):.6g}")
for name, exact in EXACT.items():
    error = np.abs(table[name].to_numpy() - exact(x, y, z))
    at = error.argmax()
    norms = add(weight * error) / total, (add(weight * error * error) / total) ** 0.5, error[at]
    print(f"{name:<4} " + " ".join(f"{norm:.15e}" for norm in norms) + f" at {x[at]:.17g} {y[at]:.17g} {z[at]:.17g}")
