"""Writes odd-life-cases.json: questions at the edges of what may be asked, and what closed forms of 40 digits answer.

Where make-life-cases.py integrates numerically, this one writes each integral out (exponentials, the cube of a square
root, the exponential integral of Arrhenius) and works in mpmath. Questions are sent out of order and at fractions of a
second, with one reading, with several at one time, with limits on a reading, lives of seconds and of a century, Q10
next to 1 and Arrhenius energies from nothing to 600 kJ/mol. Nothing here is taken from the product.

Run: python3 tests/accuracy/make-odd-life-cases.py   (needs python3-mpmath; the seed is fixed)
"""
import json
import os
import random
from datetime import date

import mpmath
from mpmath import e1, exp, inf, log, mp, mpf

mp.dps = 40
CASES_PER_MODEL = 25
random.seed(20260503)
R = mpf("8.314462618")  # J/(mol K), CODATA 2018
R_PRINTED = mpf("8.3144")  # as printed in USP <1160>
KELVIN = mpf("273.15")
uniform = random.uniform


def random_model(kind):
    ref = random.choice([0, 5, -18, 25, 37, round(uniform(-30, 40), 3)])
    life = random.choice([1, 240, 336, 8760, 1e-3, 1e6, round(uniform(1, 3000), 3)])
    base = {"referenceCelsius": ref, "lifeHours": life}
    if kind == "q10":
        return {"kind": kind, "q10": random.choice([1, 1 + 1e-12, 1.5, 2, 3, 10, 50]), **base}
    if kind == "twoLives":
        points = [[ref, life], [ref + random.choice([1, 10, 30]), life / random.choice([1, 1.0000001, 2, 10, 100])]]
        return {"kind": kind, "points": random.sample(points, 2)}
    if kind == "arrhenius":
        return {"kind": kind, "activationEnergyKjPerMol": random.choice([1e-6, 20, 83.144, 150, 300, 600]), **base}
    if kind == "squareRoot":
        return {"kind": kind, "minCelsius": ref - random.choice([1e-3, 0.5, 1, 7, 10, 30]), **base}
    if kind == "lifeTable":
        points = []
        for c in sorted(random.sample(range(-300, 400), random.choice([2, 3, 8]))):
            points.append([c / 10, life])
            life /= random.choice([1, 1.01, 2, 5])
        return {"kind": kind, "points": random.sample(points, len(points))}
    feet = sorted(random.sample(range(-20, 40), random.choice([1, 2, 5])))
    feet[0] = min(feet[0], int(ref) - 1)
    bands = [[foot, random.choice([1, 1.5, 2, 4, 9])] for foot in feet]
    return {"kind": kind, "bands": random.sample(bands, len(bands)), **base}


def stretches(model):
    """Stretches of rate = r exp(s (T - anchor)) as (from, to, s, anchor, r), the full life, the model's own range."""
    kind = model["kind"]
    if kind == "q10":
        return [(-inf, inf, log(mpf(model["q10"])) / 10, mpf(model["referenceCelsius"]), mpf(1))], None, None
    if kind == "twoLives":
        (c1, h1), (c2, h2) = sorted(model["points"])
        return [(-inf, inf, log(mpf(h1) / mpf(h2)) / (mpf(c2) - mpf(c1)), mpf(c1), mpf(1))], None, None
    if kind == "lifeTable":
        p = [(mpf(c), mpf(h)) for c, h in sorted(model["points"])]
        first, last = p[0], p[-1]
        parts = [(-inf, first[0], mpf(0), first[0], mpf(1))]
        parts += [(a, b, log(h / g) / (b - a), a, first[1] / h) for (a, h), (b, g) in zip(p, p[1:])]
        return parts + [(last[0], inf, mpf(0), last[0], first[1] / last[1])], first[0], last[0]
    bands = sorted(model["bands"])
    ends = [mpf(foot) for foot, _ in bands[1:]] + [inf]

    def from_foot(t):
        return sum(log(mpf(q)) / 10 * max(mpf(0), min(t, end) - mpf(foot)) for (foot, q), end in zip(bands, ends))

    rate = lambda t: exp(from_foot(t) - from_foot(mpf(model["referenceCelsius"])))
    lowest = mpf(bands[0][0])
    parts = [(-inf, lowest, mpf(0), lowest, rate(lowest))]
    parts += [(mpf(f), e, log(mpf(q)) / 10, mpf(f), rate(mpf(f))) for (f, q), e in zip(bands, ends)]
    return parts, lowest, None


def mean_rate(model, parts, a, b):
    a, b = min(a, b), max(a, b)
    if model["kind"] == "squareRoot":
        low, ref = mpf(model["minCelsius"]), mpf(model["referenceCelsius"])
        if b <= low:
            return mpf(0)
        if a == b:
            return ((a - low) / (ref - low)) ** 2
        return ((b - low) ** 3 - (max(a, low) - low) ** 3) / 3 / (ref - low) ** 2 / (b - a)
    if model["kind"] == "arrhenius":
        theta = mpf(model["activationEnergyKjPerMol"]) * 1000 / R
        ref = mpf(model["referenceCelsius"]) + KELVIN
        if a == b:
            return exp(theta / ref - theta / (a + KELVIN)) if a + KELVIN > 0 else mpf(0)
        area = lambda k: k * exp(theta / ref - theta / k) - theta * exp(theta / ref) * e1(theta / k) if k > 0 else 0
        return (area(b + KELVIN) - area(a + KELVIN)) / (b - a)
    if a == b:
        return next(r * exp(s * (a - anchor)) for _, to, s, anchor, r in parts if a <= to)
    total = mpf(0)
    for low, high, s, anchor, r in parts:
        x, y = max(a, low), min(b, high)
        if y > x:
            total += r * (y - x) if s == 0 else r * (exp(s * (y - anchor)) - exp(s * (x - anchor))) / s
    return total / (b - a)


def random_readings():
    t = random.choice([0, 1.5e9, 1775196000.125, -1e9, 1e6 + 1 / 3])
    c = uniform(-30, 40)
    readings = []
    for _ in range(random.choice([1, 2, 3, 8, 16])):
        readings.append([t, 0.0 + round(c, random.choice([0, 1, 2, 9]))])
        t += random.choice([0, 1, 60, 600, 3600, 0.25, 86400, 1e6])
        c = random.choice([c, c + uniform(-0.5, 0.5), uniform(-40, 60), c + 1e-9, c + 10])
    return readings


def steps_of(readings):
    return [((mpf(t1) - mpf(t0)), mpf(c0), mpf(c1)) for (t0, c0), (t1, c1) in zip(readings, readings[1:])]


def cumulated(model, parts, readings, shift=mpf(0)):
    used = [mpf(0)]
    for seconds, c0, c1 in steps_of(readings):
        taken = seconds / 3600 * mean_rate(model, parts, c0 + shift, c1 + shift) if seconds > 0 else 0
        used.append(used[-1] + taken)
    return used


def seconds_beyond(readings, limit, sign):
    total = mpf(0)
    for seconds, c0, c1 in steps_of(readings):
        a, b = sign * (c0 - limit), sign * (c1 - limit)
        if a > 0 or b > 0:
            total += seconds * (1 if a >= 0 and b >= 0 else max(a, b) / abs(a - b))
    return total


def kinetic(readings, delta_h):
    theta = mpf(delta_h) * 1000 / R_PRINTED
    # To the microsecond: steps at fractions of a second are not alike to the last digit.
    taking = [round(float(s), 6) for s, _, _ in steps_of(readings) if s > 0]
    usual = mpf(min((s for s in taking if taking.count(s) == max(map(taking.count, taking))), default=0))
    weights = [s for s, _, _ in steps_of(readings)] + [usual]
    if sum(weights) == 0:
        weights = [mpf(1)] * len(readings)
    share = sum(w * exp(-theta / (mpf(c) + KELVIN)) for w, (_, c) in zip(weights, readings)) / sum(weights)
    return theta / -log(share) - KELVIN


def exhausted(model, parts, readings, used, life):
    if used[-1] < life:
        return None
    i = next(i for i, u in enumerate(used) if u >= life)
    seconds, c0, c1 = steps_of(readings)[i - 1]
    low, high = mpf(0), mpf(1)
    for _ in range(90):
        x = (low + high) / 2
        so_far = used[i - 1] + x * seconds / 3600 * mean_rate(model, parts, c0, c0 + x * (c1 - c0))
        low, high = (low, x) if so_far >= life else (x, high)
    return float(mpf(readings[i - 1][0]) + high * seconds)


def sent_order(readings):
    """Shuffled, but readings of one time stay in their order."""
    order = random.sample(range(len(readings)), len(readings))
    of_time = {}
    for at in range(len(readings)):
        of_time.setdefault(readings[at][0], []).append(at)
    return [of_time[readings[at][0]].pop(0) for at in order]


def case(kind):
    model, readings = random_model(kind), random_readings()
    parts, low, high = stretches(model) if kind not in ("squareRoot", "arrhenius") else ([], None, None)
    life = mpf(model["lifeHours"] if "lifeHours" in model else sorted(model["points"])[0][1])
    accuracy = random.choice([0, 0.1, 0.5, 2, 10])
    limits = sorted({0, 5, readings[0][1]})
    delta_h = random.choice([40, 83.144, 244])
    used = cumulated(model, parts, readings)
    span = mpf(readings[-1][0]) - mpf(readings[0][0])
    area = sum(seconds * (c0 + c1) / 2 for seconds, c0, c1 in steps_of(readings))
    outside = (0 if low is None else seconds_beyond(readings, low, -1)) + (
        0 if high is None else seconds_beyond(readings, high, 1)
    )
    order = sent_order(readings)
    return {
        "question": {
            "model": model,
            "readings": [readings[at] for at in order],
            "limits": {"above": limits, "below": limits},
            "accuracyCelsius": accuracy,
            "mkt": {"deltaHKjPerMol": delta_h},
        },
        "expected": {
            "usedFraction": float(used[-1] / life),
            "usedHours": float(used[-1]),
            "usedFractionAtReading": [float(used[at] / life) for at in order],
            "lowUsedFraction": float(cumulated(model, parts, readings, -mpf(accuracy))[-1] / life),
            "highUsedFraction": float(cumulated(model, parts, readings, mpf(accuracy))[-1] / life),
            "mktCelsius": float(kinetic(readings, delta_h)),
            "meanCelsius": float(area / span if span > 0 else sum(mpf(c) for _, c in readings) / len(readings)),
            "secondsAbove": [float(seconds_beyond(readings, mpf(x), 1)) for x in limits],
            "secondsBelow": [float(seconds_beyond(readings, mpf(x), -1)) for x in limits],
            "secondsOutsideModel": float(outside),
            "exhaustedAtEpochSeconds": exhausted(model, parts, readings, used, life),
        },
    }


kinds = ["q10", "twoLives", "arrhenius", "squareRoot", "lifeTable", "bandedQ10"]
cases = [case(kind) for kind in kinds for _ in range(CASES_PER_MODEL)]
path = os.path.join(os.path.dirname(__file__), "odd-life-cases.json")
with open(path, "w", encoding="utf-8") as file:
    head = {"source": f"mpmath {mpmath.__version__}, closed forms at 40 digits", "generated": date.today().isoformat()}
    file.write(json.dumps(head)[:-1] + ', "cases": [\n')
    file.write(",\n".join(json.dumps(one, separators=(",", ":")) for one in cases))
    file.write("\n]}\n")
