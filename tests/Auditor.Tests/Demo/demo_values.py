#!/usr/bin/env python3
"""Writes demo_values.json: what numpy and scipy say of the demo's left-out groups: python3 tests/Auditor.Tests/Demo/demo_values.py

Straight from the formulas: QR of the final model, the group's part orthogonal to it, HC3 (MacKinnon and White 1985), noncentral F as a Poisson
mixture of incomplete beta functions, Holm. Made with numpy 1.24.2 and scipy 1.10.1.
"""
import csv
import json
from pathlib import Path

import numpy as np
from scipy import optimize, special, stats

HERE = Path(__file__).resolve().parent
DEMO = HERE.parents[2] / "templates" / "demo" / "tractor-leases.csv"
BOUND, LEVEL = 0.01, 0.05

with DEMO.open(newline="", encoding="utf-8") as file:
    KEPT = [row for row in csv.DictReader(file) if row["status"] == "resold"]


def number(column):
    return np.array([float(row[column]) if row[column] else np.nan for row in KEPT])


def levels(column, others):
    return np.column_stack([[float(row[column] == level) for row in KEPT] for level in others])


def quarters():
    quarter = np.array([(int(row["returned_on"][5:7]) - 1) // 3 + 1 for row in KEPT])
    return np.column_stack([(quarter == k).astype(float) for k in (2, 3, 4)])


def noncentral_cdf(f, df1, df2, noncentrality):
    half = noncentrality / 2
    j = np.arange(int(half + 14 * np.sqrt(half)) + 200)
    weight = np.exp(-half + special.xlogy(j, half) - special.gammaln(j + 1))
    return float((weight * special.betainc(df1 / 2 + j, df2 / 2, df1 * f / (df1 * f + df2))).sum())


def limit(f, df1, df2, probability):
    if noncentral_cdf(f, df1, df2, 0) <= probability:
        return 0.0
    return optimize.brentq(lambda x: noncentral_cdf(f, df1, df2, x) - probability, 0, 2000, xtol=1e-12, rtol=1e-14)


def group(final, added, y):
    complete = ~np.isnan(np.column_stack([final, added, y])).any(axis=1)
    x, z, y = final[complete], added[complete], y[complete]
    q_final, _ = np.linalg.qr(x)
    residual = y - q_final @ (q_final.T @ y)
    rest = z - q_final @ (q_final.T @ z)
    q_group, _ = np.linalg.qr(rest - q_final @ (q_final.T @ rest))
    u = q_group.T @ residual
    e = residual - q_group @ u
    h = (q_final**2).sum(axis=1) + (q_group**2).sum(axis=1)
    df1, df2 = z.shape[1], len(y) - x.shape[1] - z.shape[1]
    variance = e @ e / df2
    covariance = (q_group * (e**2 / (1 - h) ** 2)[:, None]).T @ q_group
    wald = u @ np.linalg.solve(covariance, u) / df1
    spread = np.linalg.eigvalsh(covariance)
    rows, rows_lower = ((df1 + df2 + 1) * variance / s for s in (spread[-1], spread[0]))
    lower, upper = limit(wald, df1, df2, 1 - LEVEL), limit(wald, df1, df2, LEVEL)
    full = np.column_stack([x, z])
    inverse = np.linalg.inv(full.T @ full)
    t = (inverse @ full.T @ y) / np.sqrt(variance * np.diag(inverse))
    return {
        "rows": len(y),
        "df1": df1,
        "df2": df2,
        "classical_f": u @ u / df1 / variance,
        "classical_p": stats.f.sf(u @ u / df1 / variance, df1, df2),
        "hc3_f": wald,
        "hc3_p": stats.f.sf(wald, df1, df2),
        "partial_r_squared": u @ u / (residual @ residual),
        "basis_lower": lower / (lower + rows_lower),
        "basis_upper": upper / (upper + rows),
        "effective_rows": rows,
        "negligible_p": noncentral_cdf(wald, df1, df2, BOUND / (1 - BOUND) * rows),
        "largest_t": np.abs(t[-df1:]).max(),
    }


def holm(groups, raw, adjusted):
    running = 0.0
    for rank, one in enumerate(sorted(groups, key=lambda one: one[raw])):
        running = max(running, min(1.0, (len(groups) - rank) * one[raw]))
        one[adjusted] = running


def judge(one):
    one["verdict"] = "not_supported" if one["p_adjusted"] <= LEVEL else "supported" if one["negligible_p_adjusted"] <= LEVEL else "inconclusive"
    one["materiality"] = "shown_negligible" if one["basis_upper"] < BOUND else "shown_material" if one["basis_lower"] > BOUND else "not_shown"


def main():
    final = np.column_stack([
        np.ones(len(KEPT)), np.log(number("list_price")), number("term_months"), number("booked_residual"),
        levels("tractor_class", ["utility", "row_crop", "articulated"]), levels("region", ["coast", "heath", "upland"]), levels("front_loader", ["yes"]),
    ])
    added = {
        "wear": np.column_stack([number(c) for c in ("engine_hours", "field_days", "service_visits", "fuel_used")]),
        "steep ground": number("slope")[:, None],
        "running gear": levels("running_gear", ["tracks"]),
        "delivery distance": np.log(number("delivery_km"))[:, None],
        "quarter of return": quarters(),
        "dealer size": np.log(number("dealer_staff"))[:, None],
    }
    found = [{"group": name, **group(final, columns, number("shortfall"))} for name, columns in added.items()]
    holm(found, "hc3_p", "p_adjusted")
    holm(found, "negligible_p", "negligible_p_adjusted")
    for one in found:
        judge(one)
        print(*(f"{key} {value:.4g}" if isinstance(value, float) else f"{key} {value}" for key, value in one.items()), sep="  ")
    (HERE / "demo_values.json").write_text(json.dumps(found, indent=2) + "\n", encoding="utf-8", newline="\n")


if __name__ == "__main__":
    main()
