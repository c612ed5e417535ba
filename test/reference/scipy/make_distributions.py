"""Quantiles and tails for test/core/signal/distributions.test.ts. Run: python3 make_distributions.py"""
import json
import pathlib

import numpy
import scipy
from scipy import special, stats

probabilities = [1e-6, 0.001, 0.025, 0.05, 0.3, 0.5, 0.9, 0.95, 0.975, 0.999, 1 - 1e-6]
freedoms = [1, 2, 3, 4.5, 9, 10, 19, 49, 200, 5000]
many = [1999, 2000, 123456.7, 1e7, 1e12]
out = {
    "made_with": f"SciPy {scipy.__version__}, NumPy {numpy.__version__}",
    "normal": [[p, stats.norm.ppf(p)] for p in probabilities],
    "student": [[p, f, stats.t.ppf(p, f)] for p in probabilities for f in freedoms + many],
    "chi_square": [[p, f, stats.chi2.ppf(p, f)] for p in probabilities for f in freedoms],
    "f": [[p, a, b, stats.f.ppf(p, a, b)] for p in probabilities for a in (1, 2, 3, 10) for b in (2, 7, 30, 400)],
    "normal_cdf": [[x, stats.norm.cdf(x)] for x in (-8.0, -3.0, -1.0, -0.1, 0.0, 0.5, 2.0, 5.0)],
    "chi_square_tail": [[x, f, stats.chi2.sf(x, f)] for x in (0.01, 1, 3.84, 20, 150) for f in freedoms],
    "f_tail": [[x, a, b, stats.f.sf(x, a, b)] for x in (0.1, 1, 4, 30) for a in (1, 2, 10) for b in (3, 20, 400)],
    "log_gamma": [[a, special.gammaln(a)] for a in (1e-8, 0.01, 0.25, 0.49, 0.5, 0.75, 1.5, 2.25, 7.5, 33, 1e4)],
    "incomplete_gamma": [
        [a, x, special.gammainc(a, x), special.gammaincc(a, x)] for a in (0.3, 1, 4, 60) for x in (1e-9, 0.2, 3, 5, 61, 90)
    ],
    "incomplete_beta": [
        [x, a, b, special.betainc(a, b, x)]
        for x in (1e-12, 0.02, 0.3, 0.5, 0.9, 0.999)
        for a in (0.4, 1, 6)
        for b in (0.5, 2, 30)
    ],
}
path = pathlib.Path(__file__).with_name("distributions.json")
path.write_text(json.dumps(out, indent=0) + "\n")
