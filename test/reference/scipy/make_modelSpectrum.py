"""Pope's model spectrum (Turbulent Flows, 2000, eqs. 6.246-6.248) with c_L and c_eta solved for.

Writes modelSpectrum.json beside itself: for each Re_lambda the two constants for which the spectrum holds
exactly its energy and its dissipation, and L11 over L = k^(3/2)/epsilon. Adaptive quadrature and SciPy's root
finder: nothing in common with the program's own way of solving it.
"""

import json
import pathlib

import numpy as np
import scipy
from scipy.integrate import quad
from scipy.optimize import root

C, BETA, P0 = 1.5, 5.2, 2.0


def integral(function, last):
    parts = np.linspace(np.log(1e-5), np.log(last), 9)
    return sum(
        quad(lambda t: function(np.exp(t)) * np.exp(t), a, b, epsabs=0, epsrel=1e-11, limit=200)[0]
        for a, b in zip(parts, parts[1:])
    )


def solved(re_lambda):
    # k = epsilon = L = 1; Re_lambda = (20/3)^(1/2) k/(epsilon nu)^(1/2)
    nu = 20 / 3 / re_lambda**2
    eta = nu**0.75
    last = 15 / eta

    def spectrum(kappa, c_l, c_eta):
        f_l = (kappa / np.sqrt(kappa**2 + c_l)) ** (5 / 3 + P0)
        f_eta = np.exp(-BETA * (((kappa * eta) ** 4 + c_eta**4) ** 0.25 - c_eta))
        return C * kappa ** (-5 / 3) * f_l * f_eta

    def residuals(logs):
        c = np.exp(logs)
        energy = integral(lambda kappa: spectrum(kappa, *c), last)
        dissipation = 2 * nu * integral(lambda kappa: kappa**2 * spectrum(kappa, *c), last)
        return [np.log(energy), np.log(dissipation)]

    answer = root(residuals, np.log([6.78, 0.4]), tol=1e-12)
    c_l, c_eta = np.exp(answer.x)
    # L11 = pi/(2 u'^2) int E/kappa dkappa, u'^2 = 2/3
    l11 = 0.75 * np.pi * integral(lambda kappa: spectrum(kappa, c_l, c_eta) / kappa, last)
    return {"Re_lambda": re_lambda, "c_L": c_l, "c_eta": c_eta, "L11_over_L": l11}


result = {
    "made": f"make_modelSpectrum.py with SciPy {scipy.__version__}, numpy {np.__version__}",
    "rows": [solved(r) for r in (30, 60, 100, 200, 300, 500, 1000, 3000, 10000)],
}
pathlib.Path(__file__).with_name("modelSpectrum.json").write_text(json.dumps(result, indent=1) + "\n")
