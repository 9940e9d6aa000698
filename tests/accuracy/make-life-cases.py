"""Writes life-cases.json: random questions and what an independent integrator answers.

Every rate is written out from its published formula and integrated numerically by scipy's adaptive quadrature
(QUADPACK), between readings and between kinks of the rate, to 1e-13 relative. Nothing here is taken from the product.

Run: python3 tests/accuracy/make-life-cases.py   (needs scipy; the seed is fixed)
"""
import json
import math
import os
import random
from datetime import date

import scipy
from scipy.integrate import quad
from scipy.optimize import brentq

R = 8.314462618  # J/(mol K), CODATA 2018
R_PRINTED = 8.3144  # as printed in USP <1160>, for the mean kinetic temperature
CASES_PER_MODEL = 50
random.seed(20260412)


def rate_of(model):
    """rate(celsius) relative to 1 at the reference, kinks in celsius, range, full life in hours."""
    kind = model["kind"]
    inf = math.inf
    if kind == "q10":
        q, ref = model["q10"], model["referenceCelsius"]
        return (lambda t: q ** ((t - ref) / 10)), [], (-inf, inf), model["lifeHours"]
    if kind == "twoLives":
        (c1, h1), (c2, h2) = sorted(model["points"])
        return (lambda t: (h1 / h2) ** ((t - c1) / (c2 - c1))), [], (-inf, inf), h1
    if kind == "arrhenius":
        e, ref = model["activationEnergyKjPerMol"] * 1000, model["referenceCelsius"] + 273.15
        return (lambda t: math.exp(e / R * (1 / ref - 1 / (t + 273.15)))), [], (-inf, inf), model["lifeHours"]
    if kind == "squareRoot":
        lo, ref = model["minCelsius"], model["referenceCelsius"]
        return (lambda t: 0.0 if t <= lo else ((t - lo) / (ref - lo)) ** 2), [lo], (-inf, inf), model["lifeHours"]
    if kind == "lifeTable":
        points = sorted(model["points"])

        def life(t):
            if t <= points[0][0]:
                return points[0][1]
            if t >= points[-1][0]:
                return points[-1][1]
            for (c1, h1), (c2, h2) in zip(points, points[1:]):
                if t <= c2:
                    return math.exp(math.log(h1) + (math.log(h2) - math.log(h1)) * (t - c1) / (c2 - c1))

        return (lambda t: points[0][1] / life(t)), [c for c, _ in points], (points[0][0], points[-1][0]), points[0][1]
    bands = sorted(model["bands"])
    ends = [b[0] for b in bands[1:]] + [inf]

    def log_from_foot(t):
        total = 0.0
        for (foot, q), end in zip(bands, ends):
            total += math.log(q) * max(0.0, min(t, end) - foot) / 10
        return total

    ref = log_from_foot(model["referenceCelsius"])
    return (lambda t: math.exp(log_from_foot(t) - ref)), [b[0] for b in bands], (bands[0][0], inf), model["lifeHours"]


def pieces(t0, c0, t1, c1, kinks):
    """The step cut at every kink its temperature crosses."""
    cuts = [0.0, 1.0]
    for k in kinks:
        if c0 != c1:
            x = (k - c0) / (c1 - c0)
            if 0 < x < 1:
                cuts.append(x)
    cuts.sort()
    return list(zip(cuts, cuts[1:]))


def step_hours(rate, kinks, t0, c0, t1, c1, until=1.0):
    total = []
    for a, b in pieces(t0, c0, t1, c1, kinks):
        b = min(b, until)
        if b > a:
            total.append(quad(lambda x: rate(c0 + (c1 - c0) * x), a, b, epsabs=0, epsrel=1e-13, limit=400)[0])
    return math.fsum(total) * (t1 - t0) / 3600


def cumulated(rate, kinks, readings, shift=0.0):
    used, parts = [0.0], []
    for (t0, c0), (t1, c1) in zip(readings, readings[1:]):
        parts.append(step_hours(rate, kinks, t0, c0 + shift, t1, c1 + shift) if t1 > t0 else 0.0)
        used.append(math.fsum(parts))
    return used


def seconds_beyond(readings, limit, sign):
    parts = []
    for (t0, c0), (t1, c1) in zip(readings, readings[1:]):
        a, b = sign * (c0 - limit), sign * (c1 - limit)
        if a <= 0 and b <= 0:
            continue
        parts.append((t1 - t0) * (1.0 if a >= 0 and b >= 0 else max(a, b) / abs(a - b)))
    return math.fsum(parts)


def mkt(readings, delta_h):
    steps = [t1 - t0 for (t0, _), (t1, _) in zip(readings, readings[1:]) if t1 > t0]
    usual = min(s for s in set(steps) if steps.count(s) == max(steps.count(x) for x in set(steps)))
    weights = [t1 - t0 for (t0, _), (t1, _) in zip(readings, readings[1:])] + [usual]
    theta = delta_h * 1000 / R_PRINTED
    share = math.fsum(w * math.exp(-theta / (c + 273.15)) for w, (_, c) in zip(weights, readings)) / math.fsum(weights)
    return theta / -math.log(share) - 273.15


def exhausted(rate, kinks, readings, used, life):
    if used[-1] < life:
        return None
    i = next(i for i, u in enumerate(used) if u >= life)
    (t0, c0), (t1, c1) = readings[i - 1], readings[i]
    x = brentq(
        lambda x: used[i - 1] + step_hours(rate, kinks, t0, c0, t1, c1, x) - life, 0, 1, xtol=1e-15, rtol=1e-14
    )
    return t0 + x * (t1 - t0)


def random_model(kind):
    u = random.uniform
    ref = round(u(-2, 8), 1)
    life = round(u(24, 1500), 1)
    base = {"referenceCelsius": ref, "lifeHours": life}
    if kind == "q10":
        return {"kind": kind, "q10": random.choice([1, 1.0001, round(u(1, 5), 3), round(u(5, 20), 2)]), **base}
    if kind == "twoLives":
        points = [[round(u(-3, 3), 1), life], [round(u(4, 20), 1), round(life / u(1, 12), 2)]]
        random.shuffle(points)
        return {"kind": kind, "points": points}
    if kind == "arrhenius":
        return {"kind": kind, "activationEnergyKjPerMol": round(u(20, 160), 2), **base}
    if kind == "squareRoot":
        return {"kind": kind, "minCelsius": round(ref - u(2, 15), 1), **base}
    if kind == "lifeTable":
        celsius = sorted(random.sample(range(-20, 250), random.randint(2, 7)))
        hours = [life]
        for _ in celsius[1:]:
            hours.append(round(hours[-1] / random.choice([1, u(1, 2), u(1, 4)]), 4))
        points = [[c / 10, h] for c, h in zip(celsius, hours)]
        random.shuffle(points)
        return {"kind": kind, "points": points}
    feet = sorted(random.sample(range(-10, 30), random.randint(1, 5)))
    feet[0] = min(feet[0], math.floor(ref))
    bands = [[f, random.choice([1, round(u(1, 6), 2)])] for f in feet]
    return {"kind": kind, "bands": bands, **base}


def random_readings():
    """Uneven steps, gaps of days, plateaus, jumps at one time, slopes too small to see."""
    t = random.randint(1_600_000_000, 1_800_000_000)
    c = random.uniform(-8, 20)
    readings = [[t, round(c, 2)]]
    for _ in range(random.randint(3, 24)):
        t += random.choice([0, 60, 300, 600, 600, 600, random.randint(1, 5000), random.randint(40_000, 260_000)])
        c = random.choice([c, c, c + random.uniform(-1, 1), c + random.uniform(-8, 8), c + 1e-6, random.uniform(-30, 40)])
        readings.append([t, round(c, random.choice([1, 2, 7]))])
    readings.append([t + 600, readings[-1][1]])
    return readings


def case(kind):
    model = random_model(kind)
    readings = random_readings()
    rate, kinks, (low, high), life = rate_of(model)
    accuracy = random.choice([0, 0.1, 0.5, 1.0])
    limits = {"above": sorted({0, 5, round(random.uniform(-5, 15), 1)}), "below": sorted({-1, 2})}
    delta_h = random.choice([60, 83.144, 100])
    used = cumulated(rate, kinks, readings)
    span = readings[-1][0] - readings[0][0]
    area = math.fsum((t1 - t0) * (c0 + c1) / 2 for (t0, c0), (t1, c1) in zip(readings, readings[1:]))
    outside = (seconds_beyond(readings, low, -1) if low > -math.inf else 0) + (
        seconds_beyond(readings, high, 1) if high < math.inf else 0
    )
    return {
        "question": {
            "model": model,
            "readings": readings,
            "limits": limits,
            "accuracyCelsius": accuracy,
            "mkt": {"deltaHKjPerMol": delta_h},
        },
        "expected": {
            "usedFraction": used[-1] / life,
            "usedHours": used[-1],
            "usedFractionAtReading": [u / life for u in used],
            "lowUsedFraction": cumulated(rate, kinks, readings, -accuracy)[-1] / life,
            "highUsedFraction": cumulated(rate, kinks, readings, accuracy)[-1] / life,
            "mktCelsius": mkt(readings, delta_h),
            "meanCelsius": area / span,
            "secondsAbove": {f"{x:g}": seconds_beyond(readings, x, 1) for x in limits["above"]},
            "secondsBelow": {f"{x:g}": seconds_beyond(readings, x, -1) for x in limits["below"]},
            "secondsOutsideModel": outside,
            "exhaustedAtEpochSeconds": exhausted(rate, kinks, readings, used, life),
        },
    }


kinds = ["q10", "twoLives", "arrhenius", "squareRoot", "lifeTable", "bandedQ10"]
cases = [case(kind) for kind in kinds for _ in range(CASES_PER_MODEL)]
path = os.path.join(os.path.dirname(__file__), "life-cases.json")
with open(path, "w", encoding="utf-8") as file:
    head = {"source": f"scipy {scipy.__version__}, scipy.integrate.quad, epsrel 1e-13", "generated": date.today().isoformat()}
    file.write(json.dumps(head)[:-1] + ', "cases": [\n')
    file.write(",\n".join(json.dumps(one, separators=(",", ":")) for one in cases))
    file.write("\n]}\n")
