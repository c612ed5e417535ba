"""The script one would write instead: the same quantities with numpy and SciPy, one process, one file after another.

    python3 peer.py FOLDER [read|all]

Prints one line of JSON: seconds of reading and of reducing, peak memory in MB, versions, and the means over the
files of a few results, so that a reader can see that both programs reduced the same data.
"""

import json
import pathlib
import resource
import sys
import time

import numpy as np
import scipy
from scipy import signal, stats

NU = 1.51e-5
BLOCKS = 40

try:
    import pandas
except ImportError:
    pandas = None


def read(path):
    if pandas is not None:
        return pandas.read_csv(path).to_numpy().T
    return np.loadtxt(path, delimiter=",", skiprows=1).T


def correlation(a):
    """Biased, all lags, zero-padded."""
    n = len(a)
    size = 1 << (2 * n - 1).bit_length()
    spectrum = np.fft.rfft(a, size)
    product = np.fft.irfft(spectrum.real**2 + spectrum.imag**2, size)[:n]
    return product / product[0]


def jackknife(value_of, rows):
    """Estimate and its standard error, leaving out one block at a time."""
    total = rows.sum(axis=0)
    left_out = np.array([value_of(total - row) for row in rows])
    spread = left_out - left_out.mean(axis=0)
    return value_of(total), np.sqrt((len(rows) - 1) / len(rows) * (spread**2).sum(axis=0))


def reduce(t, u, v, w):
    dt = (t[-1] - t[0]) / (len(t) - 1)
    mean = [a.mean() for a in (u, v, w)]
    f = [a - m for a, m in zip((u, v, w), mean)]
    speed = mean[0]
    moments = [[(a**2).mean(), stats.skew(a), stats.kurtosis(a, fisher=False)] for a in f]
    stresses = [(f[0] * f[1]).mean(), (f[0] * f[2]).mean(), (f[1] * f[2]).mean()]

    rho = [correlation(a) for a in f]
    first = int(np.argmax(rho[0] <= 0))
    t_int, *lateral = [np.trapezoid(r[: first + 1], dx=dt) for r in rho]
    length = speed * t_int

    segment = 1 << int(np.ceil(np.log2(50 * t_int / dt)))
    k1, spectra = None, []
    for a in f:
        frequency, density = signal.welch(a, 1 / dt, nperseg=segment, detrend=False)
        k1 = 2 * np.pi * frequency / speed
        spectra.append(density * speed / (2 * np.pi))
    gradients = [np.trapezoid(k1**2 * e, k1) for e in spectra]
    epsilon = 3 * NU * sum(gradients)
    du = (u[2:] - u[:-2]) / (2 * dt)
    du4 = (8 * (u[3:-1] - u[1:-3]) - (u[4:] - u[:-4])) / (12 * dt)
    d_ll = ((u[1:] - u[:-1]) ** 2).mean()
    d_lll = ((u[1:] - u[:-1]) ** 3).mean()

    # block sums for the intervals: 1, u, v, w, products, squared and cubed differences
    n = len(u) // BLOCKS * BLOCKS
    columns = [np.ones(n), *(a[:n] for a in (u, v, w))]
    columns += [(a * b)[:n] for a, b in ((u, u), (v, v), (w, w), (u, v), (u, w), (v, w))]
    squares = [np.gradient(a, dt) ** 2 for a in (u, v, w)]
    columns += [a[:n] for a in squares] + [np.gradient(u, dt)[:n] ** 3]
    rows = np.array([c.reshape(BLOCKS, -1).sum(axis=1) for c in columns]).T

    def values(s):
        m = s / s[0]
        uu, vv, ww = m[4] - m[1] ** 2, m[5] - m[2] ** 2, m[6] - m[3] ** 2
        k = (uu + vv + ww) / 2
        gradient = m[10] / m[1] ** 2
        eps = 3 * NU * (m[10] + m[11] + m[12]) / m[1] ** 2
        lam = np.sqrt(uu / gradient)
        return np.array(
            [
                m[1], uu, vv, ww, k, np.sqrt(2 * k / 3) / m[1], np.sqrt(uu / vv), np.sqrt(uu / ww),
                m[7] - m[1] * m[2], m[8] - m[1] * m[3], m[9] - m[2] * m[3],
                lam, eps, (NU**3 / eps) ** 0.25, np.sqrt(uu) * lam / NU, -m[13] / m[10] ** 1.5,
            ]
        )  # fmt: skip

    value, error = jackknife(values, rows)
    return {
        "uu": moments[0][0],
        "L11": length,
        "lambda": np.sqrt(moments[0][0] / gradients[0]),
        "epsilon": epsilon,
        "beside": [stresses, moments, lateral, (du**2).mean(), (du4**2).mean(), d_ll, d_lll, value, error],
    }


def main():
    folder, what = pathlib.Path(sys.argv[1]), sys.argv[2] if len(sys.argv) > 2 else "all"
    reading = reducing = 0.0
    results = []
    for path in sorted(folder.glob("*.csv")):
        start = time.perf_counter()
        t, u, v, w = read(path)
        read_at = time.perf_counter()
        reading += read_at - start
        if what == "all":
            results.append(reduce(t, u, v, w))
            reducing += time.perf_counter() - read_at
    means = {key: float(np.mean([r[key] for r in results])) for key in ("uu", "L11", "lambda", "epsilon") if results}
    reader = f"pandas {pandas.__version__} read_csv" if pandas is not None else "numpy.loadtxt"
    peak = resource.getrusage(resource.RUSAGE_SELF).ru_maxrss / 1024
    tools = f"Python {sys.version.split()[0]}, numpy {np.__version__}, SciPy {scipy.__version__}, {reader}"
    print(json.dumps({"reading": reading, "reducing": reducing, "peakMB": peak, "tools": tools, "means": means}))


main()
