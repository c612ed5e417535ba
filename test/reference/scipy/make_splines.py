"""Natural cubic splines for test/core/signal/cubicSpline.test.ts. Run: python3 make_splines.py"""
import json
import pathlib

import numpy
import scipy
from scipy.interpolate import CubicSpline

rng = numpy.random.default_rng(5)
splines = []
for count in (2, 3, 4, 9, 40):
    x = numpy.cumsum(rng.uniform(0.05, 2.0, count)) - 1
    y = rng.normal(size=count)
    spline = CubicSpline(x, y, bc_type="natural")
    places = numpy.concatenate([x, numpy.sort(rng.uniform(x[0], x[-1], 12))])
    second = spline(x, 2)
    second[[0, -1]] = 0.0
    splines.append(
        {
            "x": x.tolist(),
            "y": y.tolist(),
            "second": second.tolist(),
            "places": places.tolist(),
            "values": spline(places).tolist(),
        }
    )
out = {"made_with": f"SciPy {scipy.__version__}, NumPy {numpy.__version__}", "splines": splines}
path = pathlib.Path(__file__).with_name("splines.json")
path.write_text(json.dumps(out, indent=0) + "\n")
