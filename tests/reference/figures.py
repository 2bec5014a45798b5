"""Figures of traces by numpy, written from the rules and not from the project's code.

/usr/bin/python3 tests/reference/figures.py > tests/reference/figures.json
"""

import json

import numpy as np

dice = np.random.default_rng(20261201)


def trace(kind):
    """An uneven trace with a few gaps."""
    n = int(dice.integers(20, 90))
    steps = dice.choice([1.0, 1.0, 1.0, 1.5, 0.7, 2.0], n - 1) * 10
    if kind in ("samples", "averages"):
        steps[dice.integers(3, n - 3, 2)] = [400.0, 130.0]
    times = np.concatenate([[0.0], np.cumsum(steps)])
    watts = np.round(np.abs(dice.normal(dice.choice([0.9, 40]), 8, n)), 1)
    return times, np.round(np.cumsum(watts) / 360, 3) if kind == "counter" else watts


def percentile(values, weights, share):
    order = np.argsort(values, kind="stable")
    reached = np.cumsum(weights[order])
    return float(values[order][np.argmax(reached >= share * reached[-1] - 1e-9 * reached[-1])])


def answer(kind, times, values):
    steps = np.diff(times)
    dt = np.median(steps)
    if kind == "samples":
        counts = steps <= max(10 * dt, 60)
        seconds = steps[counts].sum()
        joules = (((values[1:] + values[:-1]) / 2) * steps)[counts].sum()
        half = np.where(counts, steps / 2, 0)
        weights = np.concatenate([half, [0]]) + np.concatenate([[0], half])
        watts = values
    elif kind == "averages":
        weights = np.concatenate([[dt], np.where(steps > 2.5 * dt, dt, steps)])
        watts, seconds, joules = values, weights.sum(), (values * weights).sum()
    elif kind == "changes":
        watts, weights = values[:-1], steps
        seconds, joules = steps.sum(), (values[:-1] * steps).sum()
    else:
        watts, weights = np.diff(values) * 3600 / steps, steps
        seconds, joules = steps.sum(), (values[-1] - values[0]) * 3600
    span = times[-1] - times[0] + (dt if kind == "averages" else 0)
    counted = weights > 0
    return {
        "countedSeconds": seconds, "coverage": seconds / span, "energyWattHours": joules / 3600,
        "meanWatts": joules / seconds,
        "minimumWatts": watts[counted].min(), "maximumWatts": watts[counted].max(),
        "p05Watts": percentile(watts, weights, 0.05), "p50Watts": percentile(watts, weights, 0.5),
        "p95Watts": percentile(watts, weights, 0.95),
        "shareBelowOneWatt": weights[watts < 1].sum() / weights.sum(),
    }


def batches(values):
    """The repeatability of an even series whose batches are all of one size."""
    n = len(values)
    means = values.reshape(10, n // 10).mean(axis=1)
    centred = values - values.mean()
    r = max(0, (centred[1:] * centred[:-1]).sum() / (centred**2).sum())
    if n // 10 >= max(30, 5 * (1 + r) / (1 - r)):
        return means.std(ddof=1) / np.sqrt(10)
    thirds = values.reshape(3, n // 3).mean(axis=1)
    return (thirds.max() - thirds.min()) / np.sqrt(12)


def steady(n, memory):
    noise = dice.normal(0, 1, n)
    for i in range(1, n):
        noise[i] += memory * noise[i - 1]
    return np.round(43 + noise, 3)


cases = []
for kind in ["samples", "averages", "changes", "counter"] * 4:
    times, values = trace(kind)
    cases.append({"kind": kind, "times": list(times), "values": list(values), "figures": answer(kind, times, values)})
series = [steady(n, memory) for n, memory in [(600, 0), (600, 0.5), (600, 0.97), (120, 0), (1200, 0.9)]]
made = f"/usr/bin/python3 tests/reference/figures.py, numpy {np.__version__}"
repeat = [{"values": list(values), "uncertainty": float(batches(values))} for values in series]
print(json.dumps({"made": made, "traces": cases, "repeatability": repeat}, default=float))
