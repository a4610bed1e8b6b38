"""Operating points of saturated stages by a general-purpose root finder.

Solves the full Ebers-Moll transport equations (with a collector resistance, without Early effect) of randomly made
devices with scipy.optimize.root, first at the currents a data sheet would test, IC/IB = 10, then in a stage:

  IC = IS (e^(VBE/VT) - e^(VBC/VT)) - IS/bR (e^(VBC/VT) - 1)
  IB = IS/bF (e^(VBE/VT) - 1) + IS/bR (e^(VBC/VT) - 1)
  VCE = VBE - VBC + IC RC
  stage: IC = (VS - VCE)/RL, IB = (V - VBE)/RB - VBE/RBE

Writes ebers-moll-points.json beside itself:  python3 spec/reference/ebers_moll_points.py
One list per case: isA, betaF, betaR, rcOhm of the device; icA, ibA, vbeV, vceV of each of three tested rows; supplyV,
loadOhm, driveV, rbOhm, rbeOhm of the stage; icA, ibA, vbeV, vceV of its operating point.
Made with Python 3.11, numpy 2.4, scipy 1.17. The suite reads the table and needs no Python.
"""

import json
import pathlib

import numpy as np
from scipy.optimize import root

VT = 1.380649e-23 * 298.15 / 1.602176634e-19
RNG = np.random.default_rng(20261201)


def currents(device, vbe, vbc):
    forward, back = np.exp(vbe / VT), np.exp(vbc / VT)
    ic = device["isA"] * (forward - back) - device["isA"] / device["betaR"] * (back - 1)
    ib = device["isA"] / device["betaF"] * (forward - 1) + device["isA"] / device["betaR"] * (back - 1)
    return ic, ib


def solved(device, residual, ic_guess, ib_guess):
    """Junction voltages at which both residuals vanish, started where the currents would put them without the ones."""
    reverse = 1 / device["betaR"]
    forward, back = np.linalg.solve(
        [[1, -1 - reverse], [1 / device["betaF"], reverse]], [ic_guess, ib_guess]
    )
    start = np.log(np.array([forward, back]) / device["isA"])
    found = root(
        lambda x: residual(*(x * VT), *currents(device, *(x * VT))), start, tol=1e-13
    )
    if np.max(np.abs(residual(*(found.x * VT), *currents(device, *(found.x * VT))))) > 1e-9:
        raise RuntimeError(f"no solution: {found.message}")
    return found.x * VT


def tested(device, ic, ib):
    """VBE and VCE at a pair of forced currents, as a data sheet prints them."""
    vbe, vbc = solved(device, lambda a, b, c, d: [c / ic - 1, d / ib - 1], ic, ib)
    return {"icA": ic, "ibA": ib, "vbeV": vbe, "vceV": vbe - vbc + ic * device["rcOhm"]}


def stage_point(device, stage):
    def residual(vbe, vbc, ic, ib):
        vce = vbe - vbc + ic * device["rcOhm"]
        base = (stage["driveV"] - vbe) / stage["rbOhm"] - vbe / stage["rbeOhm"]
        load = (stage["supplyV"] - vce) / stage["loadOhm"]
        return [ic / load - 1, ib / base - 1]

    full = stage["supplyV"] / stage["loadOhm"]
    vbe, vbc = solved(device, residual, full, full / 10)
    ic, ib = currents(device, vbe, vbc)
    return {"icA": ic, "ibA": ib, "vbeV": vbe, "vceV": vbe - vbc + ic * device["rcOhm"]}


def case(low_beta, high_beta):
    device = {
        "isA": 10 ** RNG.uniform(-15, -13),
        "betaF": RNG.uniform(90, 300),
        "betaR": 10 ** RNG.uniform(-0.5, 1),
        "rcOhm": RNG.uniform(0.3, 2),
    }
    rows = [tested(device, ic, ic / 10) for ic in (0.01, 0.05, 0.15)]
    ic = 10 ** RNG.uniform(np.log10(0.012), np.log10(0.12))
    supply, drive = RNG.uniform(10, 30), RNG.uniform(3, 10)
    rbe = 10 ** RNG.uniform(4, 5)
    base = ic / RNG.uniform(low_beta, high_beta) + 0.75 / rbe
    stage = {
        "supplyV": supply,
        "loadOhm": supply / ic,
        "driveV": drive,
        "rbOhm": (drive - 0.75) / base,
        "rbeOhm": rbe,
    }
    return {"device": device, "rows": rows, "stage": stage, "point": stage_point(device, stage)}


def flat(case):
    """All figures of a case in the order told above, to ten digits."""
    parts = [case["device"], *case["rows"], case["stage"], case["point"]]
    return [float(f"{value:.10g}") for part in parts for value in part.values()]


table = {
    "asTested": [flat(case(8, 14)) for _ in range(40)],
    "beyondTest": [flat(case(18, 45)) for _ in range(40)],
}
target = pathlib.Path(__file__).with_name("ebers-moll-points.json")
target.write_text(json.dumps(table, indent=2) + "\n")
