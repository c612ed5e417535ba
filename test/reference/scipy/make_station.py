"""The whole reduction of one station, written once more with NumPy and SciPy. Run: python3 make_station.py

Two seeded records of u, v, w, one of them with white noise added, are reduced from the published definitions; only
results are stored in station.json, for test/core/station/reduceStation.scipy.test.ts, which makes the same records
from the same integer arithmetic. Nothing is shared with the program but the definitions.
"""
import json
import pathlib

import numpy as np
import scipy
from scipy import optimize, signal, stats

N, STEP, NU = 6000, 1e-3, 3e-2


def uniform(seed, count):
    """x -> (1664525 x + 1013904223) mod 2^32, divided by 2^32, less 1/2."""
    out = np.empty(count)
    state = seed
    for i in range(count):
        state = (1664525 * state + 1013904223) % 4294967296
        out[i] = state / 4294967296 - 0.5
    return out


def smooth(x):
    """y_i = 0.95 y_(i-1) + x_i + 2 x_i^2 - 1/6, so that it rises faster than it falls, then four means of neighbours:

    the spectrum falls to nothing at Nyquist.
    """
    y = signal.lfilter([1.0], [1.0, -0.95], x + 2 * x**2 - 1 / 6)
    for _ in range(4):
        y = np.concatenate([[y[0]], (y[1:] + y[:-1]) / 2])
    return y


def record(noise):
    a, b, c = (smooth(uniform(seed, N)) for seed in (11, 22, 33))
    u, v, w = 10 + a + 0.1 * a**2, 0.8 * b - 0.3 * a, 0.7 * c + 0.1 * b
    n = [noise * uniform(seed, N) for seed in (44, 55, 66)]
    return u + n[0], v + n[1], w + n[2]


def bands(size):
    """First bins of bands of a twentieth of a decade, from Nyquist down to bin 1."""
    borders = []
    while True:
        border = int(np.ceil(size / 2 * 10 ** (-(len(borders) + 1) / 20) - 1e-9))
        if border <= 1:
            return borders + [1]
        borders.append(border)


def flatness_of(E, first):
    f = np.arange(first, len(E))
    return np.polynomial.polynomial.polyfit(np.log(f), np.log(E[first:]), 1, w=1 / np.sqrt(f))[1]


def cut_spectrum(E, size, lowest):
    """Noise floor, cut and exponential tail; returns the clean spectrum, the first bin cut, and the tail's moment."""
    half = size // 2
    top = next((s for s in (1 / 3, 1 / 6, 1 / 12) if flatness_of(E, int(np.ceil(half * (1 - s)))) > -1), None)
    if top is None:
        return E.copy(), None, 0.0, 0.0
    floor = E[int(np.ceil(half * (1 - top))) :].mean()
    starts = bands(size)
    ends = [half + 1] + starts[:-1]
    below = [
        b
        for b in range(len(starts))
        if ends[b] > starts[b] >= lowest and E[starts[b] : ends[b]].mean() < 2 * floor
    ]
    cut = max(below)
    at = starts[cut]
    x, y, weight = [], [], []
    for b in range(cut + 1, min(cut + 7, len(starts))):
        mean = E[starts[b] : ends[b]].mean()
        if mean > floor:
            x.append((starts[b] + ends[b] - 1) / 2 - at)
            y.append(np.log(mean - floor))
            weight.append((ends[b] - starts[b]) * ((mean - floor) / mean) ** 2)
    level, slope = np.polynomial.polynomial.polyfit(x, y, 1, w=np.sqrt(weight))
    clean = E - floor
    beyond = np.arange(at, half + 1)
    clean[at:] = np.exp(level + slope * (beyond - at))
    tail = scipy.integrate.quad(
        lambda f: f**2 * np.exp(level + slope * (f - at)), at - 0.5, at - 0.5 - 60 / slope, epsabs=0, epsrel=1e-12
    )[0]
    return clean, at, tail, floor


def crossing(R):
    after = np.argmax(R <= 0)
    return after - 1 + R[after - 1] / (R[after - 1] - R[after])


def area(R, end):
    whole = int(np.floor(end))
    lags = np.append(np.arange(whole + 1), end)
    values = np.append(R[: whole + 1], np.interp(end, np.arange(len(R)), R))
    return np.trapezoid(values, lags)


def errors(parts, U, scale):
    """Standard errors and ends by leaving out one of B = N/(20 T) groups of neighbouring blocks at a time.

    Blocks are the smallest of 64 2^m samples of which 127 hold the record. The variance is that of Busing, Meijer & van
    der Leeden (1999) for groups of unequal weight; what is positive has it in the logarithm.
    """
    block = 64
    while block * 127 < N:
        block *= 2
    index = np.arange(N)
    middle = (index // block) * block + np.minimum(block, N - (index // block) * block) / 2
    count = int(np.clip(round(N / scale / 20), 10, 50))
    group = np.minimum(count - 1, np.floor(count * middle / N)).astype(int)

    def values(kept):
        x = np.array([part[kept] for part in parts])
        tensor = np.cov(x, bias=True)
        uu, vv, ww = np.diag(tensor)
        mean = U + x[0].mean()
        k = (uu + vv + ww) / 2
        return {
            "U": mean,
            "uu": np.log(uu),
            "vv": np.log(vv),
            "uv": tensor[0, 1],
            "k": np.log(k),
            "Tu": np.log(np.sqrt(2 * k / 3) / mean),
            "isotropy_uw": np.log(np.sqrt(uu / ww)),
            "skewness_v": stats.skew(x[1]),
            "flatness_w": np.log(stats.kurtosis(x[2], fisher=False)),
            "rho_vw": tensor[1, 2] / np.sqrt(vv * ww),
        }

    whole = values(np.ones(N, bool))
    without = [values(group != g) for g in range(count)]
    h = N / np.bincount(group)
    out = {}
    for name, value in whole.items():
        rest = np.array([one[name] for one in without])
        pseudo = h * value - (h - 1) * rest
        centre = count * value - ((1 - 1 / h) * rest).sum()
        standard = np.sqrt(((pseudo - centre) ** 2 / (h - 1)).mean())
        reach = stats.t.ppf(0.975, count - 1) * standard
        ends = np.array([value - reach, value + reach])
        log = name not in ("U", "uv", "skewness_v", "rho_vw")
        out[name] = [standard, *(np.exp(ends) if log else ends)]
    return out


def reduce(u, v, w, segment):
    out = {}
    U = u.mean()
    parts = [x - x.mean() for x in (u, v, w)]
    a, b, c = parts
    tensor = np.cov(np.array(parts), bias=True)
    uu, vv, ww = np.diag(tensor)
    k = np.trace(tensor) / 2
    out |= {"U": U, "uu": uu, "vv": vv, "ww": ww, "uv": tensor[0, 1], "uw": tensor[0, 2], "vw": tensor[1, 2], "k": k}
    out |= {"Tu": np.sqrt(2 * k / 3) / U, "isotropy_uv": np.sqrt(uu / vv), "isotropy_uw": np.sqrt(uu / ww)}
    for name, x in zip("uvw", (u, v, w)):
        out[f"skewness_{name}"] = stats.skew(x)
        out[f"flatness_{name}"] = stats.kurtosis(x, fisher=False)
    rho = np.corrcoef(np.array(parts))
    out |= {"rho_uv": rho[0, 1], "rho_uw": rho[0, 2], "rho_vw": rho[1, 2]}
    bij = tensor / (2 * k) - np.eye(3) / 3
    l3, l2, l1 = np.linalg.eigvalsh(bij)
    out |= {"anisotropy_eta": np.sqrt(np.trace(bij @ bij) / 6), "anisotropy_xi": np.cbrt(np.trace(bij @ bij @ bij) / 6)}
    out |= {"barycentric_1": l1 - l2, "barycentric_2": 2 * (l2 - l3), "barycentric_3": 3 * l3 + 1}

    R = [signal.correlate(x, x, mode="full", method="direct")[N - 1 : N - 1 + 600] / N for x in parts]
    star = crossing(R[0])
    T = area(R[0], star) / R[0][0] * STEP
    out |= {"T_int": T, "L11": U * T, "tauStar": star * STEP}
    out |= {f"L_{n}": U * STEP * area(R[i], star) / R[i][0] for i, n in ((1, "v"), (2, "w"))}
    out |= {f"L_{n}_ratio": 2 * out[f"L_{n}"] / (U * T) for n in "vw"}
    r = R[0] / R[0][0]
    first = np.argmax(r <= 1 / np.e)
    out["T_int_one-over-e"] = (first - 1 + (r[first - 1] - 1 / np.e) / (r[first - 1] - r[first])) * STEP
    high = np.arange(1, np.argmax(r <= 0.2))
    out["T_int_exponential"] = STEP * (high**2).sum() / -(high * np.log(r[high])).sum()

    f, _ = signal.welch(a, 1 / STEP, "hann", segment, detrend=False)
    E = [signal.welch(x, 1 / STEP, "hann", segment, detrend=False)[1] for x in parts]
    df = f[1]
    K = (N - segment) // (segment // 2) + 1
    out["recoveredVariance"] = E[0].sum() * df / uu
    cross = signal.csd(a, b, 1 / STEP, "hann", segment, detrend=False)[1].real
    out["cospectrum_first"] = cross[1:9] * U / (2 * np.pi)
    low = np.arange(1, int(np.ceil(0.12 / T / df)))
    slope = np.polynomial.polynomial.polyfit(low.astype(float) ** 2, np.log(E[0][low]) + 19 / (36 * K), 1)
    out["T_int_low-frequency"] = np.exp(slope[0]) / (4 * uu) if len(low) > 2 else None

    borders = [1]
    while borders[-1] < segment // 2 + 1:
        borders.append(min(max(borders[-1] + 1, int(np.floor(borders[-1] * 10**0.05 + 0.5))), segment // 2 + 1))
    means = [
        ((p + q - 1) / 2 * df, np.log(E[0][p:q].mean()) + 19 / (36 * K * (q - p)), q - p)
        for p, q in zip(borders, borders[1:])
    ]

    def misfit(log, used):
        rest = [y + 5 / 6 * np.log1p((2 * np.pi * 1.33896 * g * np.exp(log)) ** 2) for g, y, _ in used]
        return np.average((rest - np.average(rest, weights=[q[2] for q in used])) ** 2, weights=[q[2] for q in used])

    scale = T
    for _ in range(8):
        used = [q for q in means if q[0] * scale < 0.5]
        ends = (np.log(T / 10), np.log(T * 10))
        new = optimize.minimize_scalar(misfit, args=(used,), bounds=ends, method="bounded", options={"xatol": 1e-10}).x
        done = abs(new - np.log(scale)) < 1e-3
        scale = np.exp(new)
        if done:
            break
    out["T_int_model"] = scale

    omega = 2 * np.pi * f
    factor = [uu + 2 * vv + 2 * ww, uu + vv / 2 + ww, uu + vv + ww / 2]
    factor = [1 + value / U**2 for value in factor]
    lowest = 3 * segment / (2 * np.pi * T / STEP)
    window = 4 / 3 * (np.pi / (segment * STEP)) ** 2 if segment < 50 * T / STEP else 0
    rates = []
    for i, name in enumerate("uvw"):
        clean, at, tail, floor = cut_spectrum(E[i], segment, lowest)
        inside = slice(1, at)
        rate = (omega[inside] ** 2 * clean[inside]).sum() * df + (2 * np.pi * df) ** 2 * df * tail
        rate -= window * np.diag(tensor)[i]
        rates.append(rate)
        out[f"gradient_{name}"] = rate / U**2 / factor[i]
        if i == 0:
            h = np.sin(omega * STEP) / STEP
            h4 = (8 * np.sin(omega * STEP) - np.sin(2 * omega * STEP)) / (6 * STEP)
            out["gradient_difference2_expected"] = (h**2 * clean)[1:].sum() * df / U**2 / factor[0]
            out["gradient_difference4_expected"] = (h4**2 * clean)[1:].sum() * df / U**2 / factor[0]
            out["cutoff"] = None if at is None else 2 * np.pi / U * at * df
            out["noiseFloor"] = None if at is None else floor * U / (2 * np.pi)
    gu, gv, gw = (out[f"gradient_{name}"] for name in "uvw")
    second = (u[3:-1] - u[1:-3]) / (2 * STEP)
    fourth = (8 * (u[3:-1] - u[1:-3]) - (u[4:] - u[:-4])) / (12 * STEP)
    out["gradient_difference2"] = (second**2).mean() / U**2 / factor[0]
    out["gradient_difference4"] = (fourth**2).mean() / U**2 / factor[0]
    epsilon = 3 * NU * (gu + gv + gw)
    lam = np.sqrt(uu / gu)
    out |= {"epsilon": epsilon, "epsilon_u-gradient": 15 * NU * gu, "lambda": lam, "lambda_f": np.sqrt(2) * lam}
    out |= {"eta": (NU**3 / epsilon) ** 0.25, "Re_lambda": np.sqrt(uu) * lam / NU, "Re_L": np.sqrt(uu) * U * T / NU}
    out |= {"C_epsilon": epsilon * U * T / uu**1.5, "K_v": 2 * gu / gv, "K_w": 2 * gu / gw}

    out["errors"] = errors(parts, U, T / STEP)

    # the derivative's base: nearest eta, by u alone and without Taylor's correction
    m = max(1, round((NU**2 * U**2 / (15 * (rates[0] + window * uu - 4 / 3 * (np.pi / (segment * STEP)) ** 2 * uu))) ** 0.25 / (U * STEP)))
    d = (u[2 * m :] - u[: -2 * m]) / (2 * m * STEP)
    out |= {"S_dudx": -(d**3).mean() / (d**2).mean() ** 1.5, "derivativeStep": m}

    lags = np.unique(np.round(10 ** (np.arange(60) / 10))).astype(int)
    lags = lags[(lags >= max(1, T / STEP / 40)) & (lags * STEP >= np.sqrt(uu / rates[0])) & (lags * STEP <= T)]
    two, three = [], []
    for lag in lags:
        later = np.arange(lag, N)
        later = later[later % max(1, lag // 2) == 0]
        jump = u[later] - u[later - lag]
        two.append(((jump**2).mean() / 2) ** 1.5 / (U * lag * STEP))
        three.append(1.25 * (jump**3).mean() / (U * lag * STEP))
    out |= {"epsilon_second-order": max(two), "epsilon_third-order": max(three) if max(three) > 0 else None}
    return {name: value.tolist() if isinstance(value, np.ndarray) else value for name, value in out.items()}


clean, noisy = record(0.0), record(0.15)
result = {
    "made_with": f"SciPy {scipy.__version__}, NumPy {np.__version__}",
    "settings": {"samples": N, "step": STEP, "viscosity": NU, "segments": [1024, 512], "noise": 0.15},
    "check": [clean[0][-1], clean[1][-1], clean[2][-1]],
    "clean": reduce(*clean, 1024),
    "noisy": reduce(*noisy, 512),
}
text = json.dumps(result, indent=1, default=float)
pathlib.Path(__file__).with_name("station.json").write_text(text + "\n")
