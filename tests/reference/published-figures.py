"""Published figures and claims by numpy and scipy, written from the rules and not from the project's code.

/usr/bin/python3 tests/reference/published-figures.py > tests/reference/published-figures.json
"""

import json
import random

import numpy as np
import scipy
from scipy import stats

dice = random.Random(20261201)


def make_case(number):
    """Figures of one device, with households, shared units, limits, withdrawn figures and earlier revisions."""
    members = [f"m{i}" for i in range(dice.choice([1, 1, 2, 3, 5, 6, 8, 12, 25]))]
    home = {m: (f"h{dice.randrange(len(members))}" if dice.random() < 0.25 else None) for m in members}
    middle = dice.choice([0.4, 8, 43, 180])
    models = ["alpha"] if dice.random() < 0.3 else ["alpha", "beta", "gamma"]
    figures = []
    for m in members:
        for _ in range(dice.choice([1, 1, 1, 2, 3])):
            value = middle * (dice.choice([7, 0.1]) if dice.random() < 0.05 else dice.lognormvariate(0, 0.12))
            limit = middle * dice.choice([0.9, 1.4]) if dice.random() < 0.12 else None
            for revision in range(dice.choice([1, 1, 1, 2])):
                figures.append({
                    "figureId": str(len(figures) + 1), "reportId": f"r{m}{_}", "revisionId": str(8 + 3 * revision),
                    "contributorId": m, "householdId": home[m],
                    "unitId": f"u{dice.randrange(30)}" if dice.random() < 0.4 else None,
                    "deviceId": "d", "instrumentModel": dice.choice(models),
                    "value": round(value * (1 + 0.01 * revision), 3),
                    "standardUncertainty": round(value * 0.02, 5), "gainUncertainty": round(value * 0.01, 5),
                    "censoredAt": None if limit is None else round(limit, 3),
                    "setAside": {"reason": "wrong mode"} if dice.random() < 0.08 else None,
                })
    return {"figures": figures, "unitSpread": 0.05, "categoryMedian": dice.choice([None, middle, middle * 6])}


def voices_of(figures):
    """Connected by contributor, household or unit: spread one label until nothing changes."""
    labels = list(range(len(figures)))
    changed = True
    while changed:
        changed = False
        for i, a in enumerate(figures):
            for j, b in enumerate(figures):
                shared = any(a[k] is not None and a[k] == b[k] for k in ("contributorId", "householdId", "unitId"))
                if shared and labels[i] != labels[j]:
                    labels[i] = labels[j] = min(labels[i], labels[j])
                    changed = True
    return [[f for f, own in zip(figures, labels) if own == label] for label in sorted(set(labels))]


def statistics(values):
    n = len(values)
    ordered = np.sort(values)
    d = max((d for d in range(1, n // 2 + 1) if 1 - 2 * stats.binom.cdf(d - 1, n, 0.5) >= 0.95), default=0)
    q = lambda p: float(np.quantile(ordered, p, method="linear"))
    return {
        "median": float(np.median(ordered)), "minimum": float(ordered[0]), "maximum": float(ordered[-1]),
        "lowerQuartile": q(0.25) if n >= 4 else None, "upperQuartile": q(0.75) if n >= 4 else None,
        "intervalLow": float(ordered[d - 1]) if d else None, "intervalHigh": float(ordered[n - d]) if d else None,
    }, (float(1 - 2 * stats.binom.cdf(d - 1, n, 0.5)) if d else None)


def uncertainty(values, us, gain, spread):
    n = len(values)
    variance = np.var(values, ddof=1) if n > 1 else 0.0
    s_w2 = (4 * (spread * np.median(values)) ** 2 + (n - 1) * variance) / (n + 3)
    c = 1 if n <= 2 else 1.2533
    return float(np.sqrt(np.median(us) ** 2 + c**2 * s_w2 / n + gain**2))


def publish(case):
    newest = {}
    for f in case["figures"]:
        newest[f["reportId"]] = max(newest.get(f["reportId"], 0), int(f["revisionId"]))
    latest = [f for f in case["figures"] if int(f["revisionId"]) == newest[f["reportId"]]]
    counted = [f for f in latest if f["setAside"] is None]
    if not counted:
        return None
    voices = voices_of(counted)
    low = [float(np.median([0 if f["censoredAt"] is not None else f["value"] for f in v])) for v in voices]
    high = [float(np.median([f["value"] if f["censoredAt"] is None else f["censoredAt"] for f in v])) for v in voices]
    n = len(voices)
    lower, coverage = statistics(low)
    upper, _ = statistics(high)
    us = [np.median([f["standardUncertainty"] for f in v]) for v in voices]
    one_model = len({f["instrumentModel"] for f in counted}) == 1
    gain = float(np.median([np.median([f["gainUncertainty"] for f in v]) for v in voices])) if one_model and n > 1 else 0.0
    logs = [np.log(h) for l, h in zip(low, high) if l == h]
    flagged = 0
    for l, h in zip(low, high):
        flag = False
        if l == h and len(logs) >= 5:
            spread = max(np.median(np.abs(np.array(logs) - np.median(logs))), 0.0675)
            flag = abs(0.6745 * (np.log(h) - np.median(logs)) / spread) > 3.5
        m = case["categoryMedian"]
        if m is not None:
            flag = flag or (l == h and h > 5 * m) or h < m / 5
        flagged += bool(flag)
    return {
        "n": n, **upper, "coverage": coverage, "medianLow": lower["median"],
        "atMostOf": sorted(k for k in upper if lower[k] != upper[k]),
        "standardUncertainty": max(uncertainty(low, us, gain, 0.05), uncertainty(high, us, gain, 0.05)),
        "degreesOfFreedom": n + 3, "flagged": flagged, "setAside": len(latest) - len(counted),
        "contributors": len({f["contributorId"] for f in counted}), "reports": len({f["reportId"] for f in counted}),
        "instruments": len({f["instrumentModel"] for f in counted}),
    }


def conformity():
    rows = []
    for _ in range(60):
        y, u, df = round(dice.uniform(20, 80), 2), round(dice.uniform(0.3, 9), 3), dice.choice([4, 5, 7, 12, 40])
        lower = round(dice.uniform(20, 60), 1) if dice.random() < 0.8 else None
        upper = None if lower is not None and dice.random() < 0.15 else round((lower or 20) + dice.uniform(1, 40), 1)
        t = stats.t(df)
        below = 0.0 if lower is None else float(t.cdf((lower - y) / u))
        above = 0.0 if upper is None else float(t.sf((upper - y) / u))
        within = 1 - below - above
        outcome = next((w for w, p in [("below", below), ("within", within), ("above", above)] if p >= 0.95), "too-close")
        rows.append({"y": y, "u": u, "df": df, "lower": lower, "upper": upper,
                     "below": below, "within": within, "above": above, "outcome": outcome})
    return rows


cases = [make_case(i) for i in range(40)]
print(json.dumps({
    "made_by": f"numpy {np.__version__}, scipy {scipy.__version__}",
    "published": [{**case, "expected": publish(case)} for case in cases],
    "conformity": conformity(),
}, separators=(",", ":")))
