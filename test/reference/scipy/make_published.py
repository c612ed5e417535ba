"""Makes published.json: decay laws of published data by SciPy, with covariance and 95 % intervals of the profile.

Run in this folder: python3 make_published.py
curve_fit and odr each find the law and its covariance by their own code. The profile is made here by hand: the sum of
squares, least over the other numbers, rises by s^2 F(1, N - p) at the ends of an interval.
"""

import csv
import json
import warnings

import numpy
import scipy
from scipy.optimize import brentq, curve_fit, least_squares
from scipy.stats import f as fisher

with warnings.catch_warnings():
    warnings.simplefilter("ignore")
    from scipy import odr

TIGHT = {"xtol": 1e-15, "ftol": 1e-15, "gtol": 1e-15}


def residual(numbers, x, y):
    log_a, x0, n = numbers
    return y - (log_a - n * numpy.log(x - x0))


def by_curve_fit(x, y, start, held_x0):
    def law(at, log_a, n, x0=held_x0):
        return log_a - n * numpy.log(at - x0)

    first = [start[0], start[2]] if held_x0 is not None else [start[0], start[2], start[1]]
    values, covariance = curve_fit(law, x, y, first, **TIGHT)
    x0 = held_x0 if held_x0 is not None else values[2]
    return {
        "lnA": values[0],
        "n": values[1],
        "x0": x0,
        "deviations": numpy.sqrt(numpy.diag(covariance)).tolist(),
    }


def by_odr(x, y, found, held_x0):
    def law(numbers, at):
        return numbers[0] - numbers[1] * numpy.log(at - (numbers[2] if held_x0 is None else held_x0))

    first = [found["lnA"], found["n"]] + ([found["x0"]] if held_x0 is None else [])
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")
        problem = odr.ODR(odr.Data(x, y), odr.Model(law), beta0=first, sstol=1e-15, partol=1e-15)
    problem.set_job(fit_type=2, deriv=1)
    ended = problem.run()
    return {
        "lnA": ended.beta[0],
        "n": ended.beta[1],
        "x0": ended.beta[2] if held_x0 is None else held_x0,
        "deviations": ended.sd_beta.tolist(),
    }


def profile_ends(x, y, found, held_x0, key):
    """Ends of the interval of n or x0, everything else refitted."""
    names = ["lnA", "x0", "n"]
    free = [name for name in names if name != key and not (name == "x0" and held_x0 is not None)]

    def least(value):
        def of(some):
            now = dict(found, **{key: value}, **dict(zip(free, some)))
            return residual([now[name] for name in names], x, y)

        return 2 * least_squares(of, [found[name] for name in free], x_scale="jac", **TIGHT).cost

    best = numpy.sum(residual([found[name] for name in names], x, y) ** 2)
    freedom = len(x) - len(free) - 1
    drop = best / freedom * fisher.ppf(0.95, 1, freedom)
    index = {"lnA": 0, "n": 1, "x0": 2}[key]
    step = found["deviations"][index]
    ends = []
    for side in (-1, 1):
        far = 2
        while least(found[key] + side * far * step) - best < drop:
            far *= 1.3
        ends.append(brentq(lambda at: least(at) - best - drop, found[key], found[key] + side * far * step, xtol=1e-13))
    return ends


def told(x, y, start, held_x0=None):
    found = by_curve_fit(x, y, start, held_x0)
    keys = ["n"] if held_x0 is not None else ["n", "x0"]
    return {
        "curve_fit": found,
        "odr": by_odr(x, y, found, held_x0),
        "interval": {key: profile_ends(x, y, found, held_x0, key) for key in keys},
    }


def rows(path):
    with open(path, newline="") as file:
        return list(csv.DictReader(file))


history = [(float(row["time"]), float(row["kinetic_energy_K"])) for row in rows("../agard_hom02/hom02_history.csv")]
t, k = numpy.array([(t, k) for t, k in history if 2.5 - 1e-9 <= t <= 5.8 + 1e-9]).T
table = rows("../cbc1971/cbc1971_table4_gross_properties.csv")
x = numpy.array([float(row["tU0_over_M"]) for row in table])
u1 = numpy.array([float(row["u1_rms_cm_s"]) for row in table])
with open("published.json", "w") as out:
    json.dump(
        {
            "scipy": scipy.__version__,
            "HOM02": told(t, numpy.log(k), [numpy.log(0.27), 0.75, 1.155]),
            "CBC1971": told(x, numpy.log(u1**2), [8, 3.5, 1.25], 3.5),
        },
        out,
        indent=1,
    )
    out.write("\n")
