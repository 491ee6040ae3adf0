#!/usr/bin/env python3
"""The same work as the bench's own side, with numpy, and with statsmodels where it is installed: one thread.

    python3 numpy-peers.py time TASK     { "medianS": seconds, "values": [...] }: start-up and imports are not counted
    python3 numpy-peers.py record NAME   { "co2Ppm": [...], "temperatureK": [...] }: what both sides fit

Prints { "skipped": reason } where a library is missing. Records are invented, from fixed seeds.
"""
import json
import sys
import time

try:
    import numpy as np
except ImportError as missing:
    print(json.dumps({"skipped": str(missing)}))
    sys.exit()


def record(n, seed):
    """CO2 that rises faster and faster, a temperature that follows its logarithm with errors that remember."""
    draws = np.random.default_rng(seed)
    steps = np.arange(n)
    co2 = 315.0 * np.exp(0.0044 * steps + 0.00003 * steps**2 / 2)
    errors = np.convolve(draws.normal(0, 0.08, n + 4), [0.5**k for k in range(5)], "valid")
    return co2, 3.0 * np.log(co2 / co2[0]) + errors


RECORDS = {"annual": (61, 11), "monthly": (744, 12)}


def windows(n, shortest, step):
    for first in range(0, n, step):
        for last in range(first + shortest - 1, n, step):
            yield first, last


def newey_west(scores, bread, lag):
    meat = scores.T @ scores
    for j in range(1, lag + 1):
        lagged = scores[j:].T @ scores[:-j]
        meat = meat + (1 - j / (lag + 1)) * (lagged + lagged.T)
    return bread @ meat @ bread


def sweep(name, shortest, lag, origin, step=1):
    """Sum of all slopes and standard errors, and how many: a line with an intercept, and through the origin if asked."""
    co2, temperature = record(*RECORDS[name])
    total, count = 0.0, 0
    for first, last in windows(len(co2), shortest, step):
        x = np.log(co2[first : last + 1] / co2[first])
        y = temperature[first : last + 1] - temperature[first]
        for design in [np.column_stack([np.ones(len(x)), x])] + ([x[:, None]] if origin else []):
            bread = np.linalg.inv(design.T @ design)
            coefficients = bread @ (design.T @ y)
            errors = y - design @ coefficients
            total += coefficients[-1] + np.sqrt(newey_west(design * errors[:, None], bread, lag)[-1, -1])
            count += 1
    return [total, count]


def sweep_statsmodels(name, shortest, lag):
    import statsmodels.api as sm

    co2, temperature = record(*RECORDS[name])
    total, count = 0.0, 0
    for first, last in windows(len(co2), shortest, 1):
        x = np.log(co2[first : last + 1] / co2[first])
        y = temperature[first : last + 1] - temperature[first]
        for design in (np.column_stack([np.ones(len(x)), x]), x[:, None]):
            fit = sm.OLS(y, design).fit(cov_type="HAC", cov_kwds={"maxlags": lag, "use_correction": False})
            total += fit.params[-1] + fit.bse[-1]
            count += 1
    return [total, count]


def bootstrap(draws=10_000, block=5):
    co2, temperature = record(*RECORDS["annual"])
    x, y = np.log(co2 / co2[0]), temperature - temperature[0]
    n = len(x)
    starts = np.random.default_rng(4).integers(0, n - block + 1, (draws, -(-n // block)))
    rows = (starts[:, :, None] + np.arange(block)).reshape(draws, -1)[:, :n]
    xs, ys = x[rows], y[rows]
    spread = np.einsum("ij,ij->i", xs, xs) - xs.sum(1) ** 2 / n
    slopes = (np.einsum("ij,ij->i", xs, ys) - xs.sum(1) * ys.sum(1) / n) / spread
    return list(np.quantile(slopes, [0.025, 0.5, 0.975]))


def energy_budget(n=1_000_000):
    draws = np.random.default_rng(1)
    warming, forcing = draws.normal(0.75, 0.122, n), draws.normal(1.95, 0.353, n)
    uptake, doubling = draws.normal(0.65, 0.164, n), draws.normal(3.44, 0.209, n)
    levels = [0.05, 0.17, 0.5, 0.83, 0.95]
    # Where forcing does not exceed uptake the sensitivity is unbounded above, not negative.
    effcs = np.where(forcing > uptake, doubling * warming / (forcing - uptake), np.inf)
    return list(np.quantile(effcs, levels)) + list(np.quantile(doubling * warming / forcing, levels))


def ensemble(members=100_000, years=274):
    """The two modes of each member carried from year to year, forcing held within the year."""
    draws = np.random.default_rng(2)
    c, deep, gamma = draws.uniform(5, 10, members), draws.uniform(60, 150, members), draws.uniform(0.4, 1, members)
    feedback, efficacy = draws.uniform(0.6, 1.8, members), draws.uniform(1, 1.5, members)
    t = np.arange(years)
    forcing = 3.7 * (t / years) ** 2 - 2.0 * (t % 37 == 20)
    top, down, up = -(feedback + efficacy * gamma) / c, efficacy * gamma / c, gamma / deep
    root = np.sqrt((top + up) ** 2 + 4 * down * up)
    r1, r2 = (top - up + root) / 2, (top - up - root) / 2
    e1, e2 = np.exp(r1), np.exp(r2)
    p, q = (e1 - e2) / root, (r1 * e2 - r2 * e1) / root
    a, b, d, e = q + p * top, p * down, p * up, q - p * up
    g1, g2 = (1 - a - b) / feedback, (1 - d - e) / feedback
    surface, below, x, y = np.zeros(members), np.zeros(members), np.empty(members), np.empty(members)
    for year in range(years):
        np.multiply(a, surface, out=x)
        np.multiply(b, below, out=y)
        x += y
        np.multiply(g1, forcing[year], out=y)
        x += y
        np.multiply(d, surface, out=y)
        below *= e
        below += y
        np.multiply(g2, forcing[year], out=y)
        below += y
        surface, x = x, surface
    return list(np.quantile(surface, [0.05, 0.5, 0.95]))


TASKS = {
    "sweep-annual": lambda: sweep("annual", 20, 5, origin=True),
    "sweep-annual-statsmodels": lambda: sweep_statsmodels("annual", 20, 5),
    "sweep-monthly": lambda: sweep("monthly", 240, 12, origin=False, step=6),
    "bootstrap": bootstrap,
    "energy-budget": energy_budget,
    "ensemble": ensemble,
}


def timed(work):
    """Median of at least five runs and of at least a second, after one that is not counted."""
    values = work()
    seconds = []
    while len(seconds) < 5 or sum(seconds) < 1:
        start = time.perf_counter()
        work()
        seconds.append(time.perf_counter() - start)
    return {"medianS": float(np.median(seconds)), "values": [float(value) for value in values]}


if __name__ == "__main__":
    what, name = sys.argv[1:]
    if what == "record":
        co2, temperature = record(*RECORDS[name])
        print(json.dumps({"co2Ppm": co2.tolist(), "temperatureK": temperature.tolist()}))
    else:
        try:
            print(json.dumps(timed(TASKS[name])))
        except ImportError as missing:
            print(json.dumps({"skipped": str(missing)}))
