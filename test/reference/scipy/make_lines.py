"""Weighted straight lines for test/core/decay/straightLine.test.ts. Run: python3 make_lines.py"""
import json
import pathlib

import numpy

rng = numpy.random.default_rng(11)
lines = []
for count in (2, 3, 8, 25):
    x = numpy.sort(rng.uniform(-1.0, 4.0, count))
    y = 2.0 - 0.7 * x + rng.normal(scale=0.3, size=count)
    error = rng.uniform(0.1, 0.6, count)
    for weights in (error, None):
        w = numpy.ones(count) if weights is None else 1 / weights
        # the covariance of known errors, or of residuals of variance one, by the normal equations
        design = numpy.stack([numpy.ones(count), x], axis=1) * w[:, None]
        (intercept, slope), *_ = numpy.linalg.lstsq(design, y * w, rcond=None)
        covariance = numpy.linalg.inv(design.T @ design)
        lines.append(
            {
                "x": x.tolist(),
                "y": y.tolist(),
                "error": None if weights is None else weights.tolist(),
                "intercept": intercept,
                "slope": slope,
                "covariance": covariance.ravel().tolist(),
                "sum": float(numpy.sum(((y - intercept - slope * x) * w) ** 2)),
            }
        )
out = {"made_with": f"NumPy {numpy.__version__}", "lines": lines}
path = pathlib.Path(__file__).with_name("lines.json")
path.write_text(json.dumps(out, indent=0) + "\n")
