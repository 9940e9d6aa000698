"""Writes fit-cases.json: tables of life with noise, and what numpy and scipy fit to them.

Run: python3 tests/accuracy/make-fit-cases.py   (needs numpy and scipy; the seed is fixed)
"""
import json
import os
from datetime import date

import numpy as np
import scipy
from scipy.optimize import least_squares

rng = np.random.default_rng(20260412)
R = 8.314462618


def line(x, y):
    slope, level = np.polyfit(x, y, 1)
    return slope, level


def square_root(t, y):
    """Best of several starts of ln life = a - 2 ln(T - Tmin); Tmin = coldest - e^d."""
    best = None
    for d in (-3, -1, 0, 1, 2, 3, 4):
        found = least_squares(
            lambda p: p[0] - 2 * np.log(t - (t.min() - np.exp(p[1]))) - y, [y.mean(), d], xtol=1e-15, ftol=1e-15, gtol=1e-15
        )
        if best is None or found.cost < best.cost:
            best = found
    return float(t.min() - np.exp(best.x[1])), float(best.cost)


cases = []
while len(cases) < 40:
    t = np.sort(rng.choice(np.arange(-10, 260) / 10, size=int(rng.integers(4, 10)), replace=False))
    truth = rng.uniform(-25, -4)
    y = np.log(600) - 2 * np.log((t - min(truth, t.min() - 1)) / 12) + rng.normal(0, 0.08, t.size)
    life = np.round(np.exp(y), 6)
    y = np.log(life)
    slope, level = line(t, y)
    inverse, _ = line(1 / (t + 273.15), y)
    tmin, cost = square_root(t, y)
    if slope >= 0 or t.min() - tmin > 150 or t.min() - tmin < 0.01:
        continue
    cases.append(
        {
            "points": [[float(c), float(h)] for c, h in zip(t, life)],
            "q10": float(np.exp(-10 * slope)),
            "lifeAtZero": float(np.exp(level)),
            "activationEnergyKjPerMol": float(R * inverse / 1000),
            "minCelsius": tmin,
            "squareRootLnScatter": float(np.sqrt(2 * cost / t.size)),
        }
    )
path = os.path.join(os.path.dirname(__file__), "fit-cases.json")
head = {"source": f"numpy {np.__version__} polyfit, scipy {scipy.__version__} least_squares", "generated": date.today().isoformat()}
with open(path, "w", encoding="utf-8") as file:
    file.write(json.dumps(head)[:-1] + ', "cases": [\n')
    file.write(",\n".join(json.dumps(one, separators=(",", ":")) for one in cases))
    file.write("\n]}\n")
