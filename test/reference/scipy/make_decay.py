"""Makes decay.json: SciPy's curve_fit of a power law to stations with known errors, with its covariance.

Run in this folder: python3 make_decay.py
"""

import json

import numpy
import scipy
from scipy.optimize import curve_fit

TIGHT = {"xtol": 1e-15, "ftol": 1e-15, "gtol": 1e-15}


def log_law(x, log_a, x0, n):
    return log_a - n * numpy.log(x - x0)


def log_slopes(x, log_a, x0, n):
    return numpy.column_stack([numpy.ones_like(x), n / (x - x0), -numpy.log(x - x0)])


def law(x, log_a, x0, n):
    return numpy.exp(log_law(x, log_a, x0, n))


def slopes(x, log_a, x0, n):
    return law(x, log_a, x0, n)[:, None] * log_slopes(x, log_a, x0, n)


def result(fitted):
    values, covariance = fitted
    return {"lnA": values[0], "x0": values[1], "n": values[2], "covariance": covariance.ravel().tolist()}


random = numpy.random.default_rng(20261201)
x = numpy.geomspace(12, 90, 14)
error = numpy.linspace(0.01, 0.04, x.size)
q = law(x, numpy.log(0.05), 4, 1.25) * numpy.exp(error * random.standard_normal(x.size))
start = [numpy.log(0.05), 4, 1.25]
cases = {
    "log, errors known": curve_fit(
        log_law, x, numpy.log(q), start, sigma=error, absolute_sigma=True, jac=log_slopes, **TIGHT
    ),
    "log, equal weights": curve_fit(log_law, x, numpy.log(q), start, jac=log_slopes, **TIGHT),
    "linear, errors known": curve_fit(
        law, x, q, start, sigma=error * q, absolute_sigma=True, jac=slopes, **TIGHT
    ),
    "linear, equal weights": curve_fit(law, x, q, start, jac=slopes, **TIGHT),
}
with open("decay.json", "w") as out:
    json.dump(
        {
            "scipy": scipy.__version__,
            "x": x.tolist(),
            "q": q.tolist(),
            "error": error.tolist(),
            "fits": {name: result(fitted) for name, fitted in cases.items()},
        },
        out,
        indent=1,
    )
