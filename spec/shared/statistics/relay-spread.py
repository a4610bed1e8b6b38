"""Spread of the relay driver of relay-stage.ts, calculated apart from the engine: the same rules, vectorised in numpy.

    python3 relay-spread.py [samples]

prints the yield, the 0.135, 50 and 99.865 % figures of ODF, VCE(sat) / V, IC / A, P / W and TJ / degC, and samples per
second. It made the table in monte-carlo.spec.ts, and is the yardstick for the engine's speed (one thread).
"""
import os

os.environ["OMP_NUM_THREADS"] = "1"
import sys
import time

import numpy as np

VT_PER_K = 1.380649e-23 / 1.602176634e-19


def normal(rng, n):
    """Normal in units of 3 sigma, redrawn beyond."""
    z = rng.standard_normal(n)
    while (beyond := np.abs(z) > 3).any():
        z[beyond] = rng.standard_normal(beyond.sum())
    return z / 3


def run(n, seed):
    rng = np.random.default_rng(seed)
    supply, ambient = rng.uniform(21.6, 26.4, n), rng.uniform(-20, 60, n)
    rail, source = rng.uniform(3.0, 3.6, n), rng.uniform(0, 0.6 / 0.008, n)
    rb, rbe = 1000 * (1 + 0.05 * normal(rng, n)), 22000 * (1 + 0.05 * normal(rng, n))
    coil = 1440 * (1 + 0.1 * normal(rng, n)) * (234.5 + ambient + 20) / 254.5
    gain_share, vbe_share, vce_share = normal(rng, n), normal(rng, n), normal(rng, n)

    full = supply / coil
    log_full = np.log(full)
    rows = np.log([1e-4, 1e-3, 0.01, 0.05, 0.1])
    low = np.interp(log_full, rows, np.log([40, 70, 100, 60, 30]))
    high = np.interp(log_full, rows, np.log([120, 210, 300, 180, 90]))
    gain25 = np.exp(low + (1 + gain_share) / 2 * (high - low))
    vbe_max = 0.85 + 0.1 * np.maximum(0, (log_full - np.log(0.01)) / np.log(5))
    vbe25 = vbe_max - 0.1 * (1 - vbe_share)
    part = 0.7 + 0.3 * vce_share
    first, second = 0.2 * part, 0.3 * part
    slope2 = (second - first) / 0.04
    start = np.minimum(np.maximum(first - slope2 * 0.01, VT_PER_K * 298.15 * np.log1p(11 / 0.5)), first)
    beyond = full > 0.01
    intercept = np.where(beyond, first - slope2 * 0.01, start)
    slope = np.where(beyond, slope2, (first - start) / 0.01)

    def solve(tj):
        kelvin = (tj + 273.15) / 298.15
        vbe = np.maximum(0, vbe25 - 0.002 * (tj - 25))
        gain = gain25 * kelvin**1.5
        drive = np.maximum(0, (rail - vbe) / (source + rb))
        base = np.maximum(0, drive - vbe / rbe)
        forced = full / base
        step = np.maximum(1, (forced + 1.5) / 11.5 * (gain - 10) / np.maximum(1e-9, gain - forced))
        step = np.where(forced > 10, VT_PER_K * (tj + 273.15) * np.log(step), 0)
        v0 = np.where(intercept > 0, intercept * kelvin, intercept) + step
        ic = np.clip((supply - v0) / (coil + slope * (1 + 0.004 * (tj - 25))), 0, full)
        ic = np.where(forced < gain, ic, gain * base)
        vce = np.maximum(0, supply - ic * coil)
        return vbe, drive, forced, gain * base / full, ic, vce, vce * ic + vbe * base

    tj = ambient
    for _ in range(3):
        tj = ambient + 200 * solve(tj)[-1]
    vbe, drive, forced, odf, ic, vce, power = solve(tj)

    hot = (155 - ambient) / 85
    icbo = 5e-8 * 2 ** (np.maximum(tj - 25, 0) / 10)
    off_v = (0.1 / rb + icbo) * rb * rbe / (rb + rbe)
    off_a = icbo + 0.01 * np.exp((off_v - 0.65 + 0.002 * (tj - 25)) / (VT_PER_K * (tj + 273.15)))
    met = (odf >= 2) & (forced <= 10) & (ic <= 0.16) & (drive <= 0.016) & (tj <= 120)
    met &= supply - vce >= 16.8 * np.maximum(1, (234.5 + ambient + 20) / 254.5)
    met &= power <= 0.5 * np.minimum(1, (150 - ambient) / 125)
    met &= drive**2 * rb <= 0.05 * np.clip(hot, 0, 1)
    met &= vbe**2 / rbe <= 0.05 * np.clip(hot, 0, 1)
    met &= (off_v <= 0.5 - 0.002 * (tj - 25)) & (np.minimum(off_a, full) <= 0.24 / 1440)
    met &= supply + 1 <= 32
    return met.mean(), [np.percentile(x, [0.135, 50, 99.865]) for x in (odf, vce, ic, power, tj)]


if __name__ == "__main__":
    samples = int(sys.argv[1]) if len(sys.argv) > 1 else 4_000_000
    start = time.perf_counter()
    share, figures = run(samples, 1)
    took = time.perf_counter() - start
    print(f"yield {share:.5f}")
    print(np.array(figures))
    print(f"{samples / took / 1e6:.2f} million samples per second")
