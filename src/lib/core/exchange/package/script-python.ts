/**
 * The Python script of the package: reads the runs and refits the model with sessions fixed by least squares (numpy only).
 * Checked by: test/core/exchange/package/make-package.test.ts (run with Python where it and numpy are installed)
 */
export const scriptPython = `"""Reads this data package, fits the model with sessions fixed again and compares with results/means.csv.

Run it in the folder of the package:  python3 refit.py
Needs Python 3 and numpy.
"""

import csv
import sys

import numpy as np


def read(path):
    with open(path, encoding="utf-8", newline="") as file:
        return list(csv.DictReader(file))


def sum_to_zero(values, levels):
    """Columns of a factor whose coefficients add to zero."""
    columns = np.zeros((len(values), len(levels) - 1))
    for i, value in enumerate(values):
        j = levels.index(value)
        if j < len(levels) - 1:
            columns[i, j] = 1.0
        else:
            columns[i, :] = -1.0
    return columns


runs = read("data/runs.csv")
means = read("results/means.csv")
model = {line["measurand"]: line for line in read("results/model.csv")}
worst = 0.0

for measurand in dict.fromkeys(line["measurand"] for line in means):
    told = [m for m in means if m["measurand"] == measurand and m["model"] == "fixed" and m["adjusted"]]
    kept = [r for r in runs if r["ruined"] != "true" and r["y_" + measurand]]
    for part in dict.fromkeys(m["part"] for m in told):
        here = [m for m in told if m["part"] == part]
        treatments = [m["treatment"] for m in here]
        data = [r for r in kept if r["treatment"] in treatments]
        sessions = sorted({r["session"] for r in data})
        if len(treatments) < 2 or len(sessions) < 2:
            continue
        y = np.array([float(r["y_" + measurand]) for r in data])
        shift = y.mean()
        columns = [
            np.array([[float(r["treatment"] == t) for t in treatments] for r in data]),
            sum_to_zero([r["session"] for r in data], sessions),
        ]
        if model[measurand]["slot"] == "true":
            slots = sorted({r["slot"] for r in data})
            columns.append(sum_to_zero([r["slot"] for r in data], slots))
        X = np.hstack(columns)
        coefficients, _, rank, _ = np.linalg.lstsq(X, y - shift, rcond=None)
        residual = y - shift - X @ coefficients
        df = len(y) - rank
        print(f"\\n{measurand}, sessions fixed" + (f", part {part}" if part else ""))
        covariance = np.linalg.pinv(X.T @ X) * (residual @ residual / df) if df > 0 else None
        for i, line in enumerate(here):
            estimate = coefficients[i] + shift
            worst = max(worst, abs(estimate - float(line["adjusted"])) / max(abs(float(line["adjusted"])), 1e-300))
            text = f"{line['treatment']:>12}  {estimate:.8f}"
            if covariance is not None and line["se"]:
                se = covariance[i, i] ** 0.5
                worst = max(worst, abs(se - float(line["se"])) / float(line["se"]))
                text += f"  se {se:.8f}"
            print(text)

print(f"\\nWorst relative difference, sessions fixed: {worst:.3e}")
if worst > 1e-8:
    sys.exit("The refit does not agree with the results to 1e-8.")
`;
