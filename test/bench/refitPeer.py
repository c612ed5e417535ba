"""Refits of one decay law to many profiles with SciPy's curve_fit, as a plain script would do it.

usage: python3 refitPeer.py PROFILES.json ROUNDS
Reads {"x", "qs", "error", "start"}; prints one line of JSON: CPU milliseconds of all refits in each round, the mean n and x0,
and how many refits failed.
"""

import json
import sys
import time

import numpy as np
import scipy
from scipy.optimize import curve_fit


def law(x, level, n, x0):
    return level - n * np.log(x - x0)


def refit(x, logs, error, start):
    found, _ = curve_fit(law, x, logs, p0=start, sigma=error, absolute_sigma=True)
    return found


def main():
    with open(sys.argv[1], encoding="utf-8") as file:
        profiles = json.load(file)
    x = np.array(profiles["x"])
    logs = np.log(np.array(profiles["qs"]))
    error = np.full(len(x), profiles["error"])
    begin = profiles["start"]
    start = [np.log(begin["A"]), begin["n"], begin["x0"]]
    times = []
    failed = 0
    found = []
    for _ in range(int(sys.argv[2])):
        since = time.process_time()
        found = []
        failed = 0
        for row in logs:
            try:
                found.append(refit(x, row, error, start))
            except RuntimeError:
                failed += 1
        times.append(1000 * (time.process_time() - since))
    mean = np.mean(found, axis=0)
    print(
        json.dumps(
            {
                "times": times,
                "mean": {"n": mean[1], "x0": mean[2]},
                "failed": failed,
                "scipy": scipy.__version__,
            }
        )
    )


main()
