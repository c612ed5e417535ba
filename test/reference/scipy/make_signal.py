"""Reference values of one seeded signal for test/core/signal/scipy.test.ts. Run: python3 make_signal.py

The signal is made by both sides from the same few lines of integer arithmetic (a linear congruential generator),
so that only results are stored.
"""
import json
import pathlib

import numpy as np
import scipy
from scipy import signal, stats


def noise(seed, count):
    """Uniform on [0, 1) from x -> (1664525 x + 1013904223) mod 2^32."""
    out = np.empty(count)
    state = seed
    for i in range(count):
        state = (1664525 * state + 1013904223) % 4294967296
        out[i] = state / 4294967296
    return out


def smooth(x):
    """Recursive filter y_i = 0.9 y_(i-1) + x_i - 1/2, plus a cubed part that makes it skewed."""
    y = np.empty_like(x)
    last = 0.0
    for i, value in enumerate(x):
        last = 0.9 * last + value - 0.5
        y[i] = last
    return y + 0.15 * y**2 + 3.0


u = smooth(noise(12345, 3000))
size, rate = 256, 50.0
f, density = signal.welch(u - u.mean(), fs=rate, window="hann", nperseg=size, detrend=False)
full = signal.correlate(u - u.mean(), u - u.mean(), mode="full", method="direct")[len(u) - 1 :]
out = {
    "made_with": f"SciPy {scipy.__version__}, NumPy {np.__version__}",
    "count": len(u),
    "rate": rate,
    "size": size,
    "first": u[:3].tolist(),
    "last": u[-1],
    "mean": u.mean(),
    "variance": u.var(),
    "skew": stats.skew(u),
    "kurtosis": stats.kurtosis(u, fisher=False),
    "welch": density.tolist(),
    "correlate": full[:400].tolist(),
}
pathlib.Path(__file__).with_name("signal.json").write_text(json.dumps(out, indent=0) + "\n")
