"""Writes refit-reference.json: fits of an invented dataset by scipy, independent of the engine.

Written with Python 3.11, numpy 2.4.6 and scipy 1.17.1 (scipy.optimize.least_squares, method "lm", which is MINPACK's
lmder). Derivatives by complex steps, so they carry no truncation. Seeded: run again it gives the same file.

    python3 tests/reference/compute-refit-reference.py > tests/reference/refit-reference.json
"""
import json

import numpy as np
from scipy.optimize import least_squares

R = 8.31446261815324
KELVIN = [298.15, 310.15]
U0 = 0.01
RANDOM = np.random.default_rng(20261201)

CONCENTRATIONS = [0, 0.5, 1, 2, 4, 8, 16, 32, 64, 150, 400, 1500]  # µM
VOLTAGES = [-40, 0, 40]  # mV, reference 0
U_A = 0.02


def expected(gap, n, k_inactive, k_active, slope, c, v):
    f = gap - n * (np.log(1 + c / k_inactive) - np.log(1 + c / k_active)) + slope * v
    return 1 / (1 + np.exp(-f))


C = np.array([c for c in CONCENTRATIONS for _ in VOLTAGES], dtype=float)
V = np.array([v for _ in CONCENTRATIONS for v in VOLTAGES], dtype=float)

# gap kT, n, K_I µM, K_A µM, slope kT/mV
TRUTH = [(2.1, 2.2, 16.0, 130.0, 0.015), (0.9, 2.2, 16.0, 160.0, 0.02)]
STATED = [(2.4, 2.5, 18.0, 140.0, 0.02), (1.3, 2.0, 18.0, 140.0, 0.025)]
MEASURED = [np.round(expected(*truth, C, V) + RANDOM.normal(0, U_A, C.size), 4) for truth in TRUTH]


def series(index):
    gap, n, k_inactive, k_active, slope = STATED[index]
    kt = R * KELVIN[index] / 1000
    as_energy = {"value": gap, "unit": "kT", "orientation": "inactive-minus-active"}
    if index == 1:
        as_energy = {"value": -gap * kt, "unit": "kJ/mol", "orientation": "active-minus-inactive"}
    k_a = {"value": k_active, "unit": "uM"} if index == 0 else {"value": k_active / 1000, "unit": "mM"}
    return {
        "id": ["wt", "hinge"][index],
        "temperature": {"value": KELVIN[index], "unit": "K"},
        "parameters": {
            "origin": "independent",
            "gap": as_energy,
            "siteClasses": [
                {
                    "id": "main",
                    "sites": {"value": n},
                    "binding": [
                        {"ligand": "velline", "inactive": {"value": k_inactive, "unit": "uM"}, "active": k_a}
                    ],
                }
            ],
            "modulation": [
                {
                    "modulator": "V",
                    "slope": {"value": slope, "unit": "kT", "orientation": "inactive-minus-active"},
                    "reference": 0,
                }
            ],
        },
        "points": [
            {"ligands": {"velline": c}, "modulators": {"V": v}, "activity": a, "u": U_A}
            for c, v, a in zip(C.tolist(), V.tolist(), MEASURED[index].tolist())
        ],
    }


DATASET = {
    "temperature": {"value": 298.15, "unit": "K"},
    "ligands": [{"id": "velline", "unit": "uM", "concentration": "free"}],
    "modulators": [{"id": "V"}],
    "normalisation": {"method": "two-reference"},
    "series": [series(0), series(1)],
}


def fit(unpack, start):
    """unpack: variables -> the five parameters of either series."""

    def residuals(x):
        parts = [(expected(*unpack(x)[s], C, V) - MEASURED[s]) / np.hypot(U_A, U0) for s in (0, 1)]
        return np.concatenate(parts)

    def jacobian(x):
        columns = []
        for j in range(x.size):
            moved = x.astype(complex)
            moved[j] += 1e-30j
            columns.append(residuals(moved).imag / 1e-30)
        return np.array(columns).T

    tight = {"xtol": 1e-15, "ftol": 1e-15, "gtol": 1e-15, "max_nfev": 10000}
    found = least_squares(residuals, np.array(start), jac=jacobian, method="lm", **tight)
    covariance = np.linalg.inv(jacobian(found.x).T @ jacobian(found.x))
    error = np.sqrt(np.diag(covariance))
    return {
        "chiSquared": float(np.sum(residuals(found.x) ** 2)),
        "variables": found.x.tolist(),
        "standardErrors": error.tolist(),
        "correlations": (covariance / np.outer(error, error)).tolist(),
    }


# gap per series, n and K_I shared, K_A and slope as stated
SHARED = fit(
    lambda x: [
        (x[s], np.exp(x[2]), np.exp(x[3]), STATED[s][3], STATED[s][4]) for s in (0, 1)
    ],
    [2.4, 1.3, np.log(np.sqrt(5.0)), np.log(18.0)],
)

# gap, K_I, K_A and slope per series, n as stated
PER_SERIES = fit(
    lambda x: [(x[s], STATED[s][1], np.exp(x[2 + s]), np.exp(x[4 + s]), x[6 + s]) for s in (0, 1)],
    [2.4, 1.3, np.log(18.0), np.log(18.0), np.log(140.0), np.log(140.0), 0.02, 0.025],
)

print(
    json.dumps(
        {
            "about": "An invented dataset and fits of it by scipy 1.17.1 (least_squares, method lm), numpy 2.4.6, Python 3.11; made by compute-refit-reference.py. Variables: gaps in kT, ln n, ln K in µM, slopes in kT per mV.",
            "dataset": DATASET,
            "fits": [
                {
                    "free": [
                        {"parameter": "gap", "share": "series"},
                        {"parameter": "sites", "siteClass": "main", "share": "dataset"},
                        {"parameter": "inactive", "siteClass": "main", "ligand": "velline", "share": "dataset"},
                    ],
                    **SHARED,
                },
                {
                    "free": [
                        {"parameter": "gap", "share": "series"},
                        {"parameter": "inactive", "siteClass": "main", "ligand": "velline", "share": "series"},
                        {"parameter": "active", "siteClass": "main", "ligand": "velline", "share": "series"},
                        {"parameter": "slope", "modulator": "V", "share": "series"},
                    ],
                    **PER_SERIES,
                },
            ],
        },
        indent=1,
    )
)
