import type { DecayResult } from "../../src/core/decayResult.ts";
import { bare, estimate, missing, type Quantity } from "../../src/core/quantity.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import type { FigureCase } from "../../src/figures/figureSpec.ts";

export interface MadeCase {
  readonly name: string;
  readonly mark: number;
  readonly n: number;
  /** In multiples of M. */
  readonly x0: number;
  readonly positions: readonly number[];
  readonly window: readonly [number, number];
  /** Relative scatter of k. */
  readonly scatter: number;
  /** u'/v' at the first station; it relaxes to `settled`. */
  readonly anisotropy: number;
  readonly settled: number;
  readonly balance: number;
  /** Stations without an interval. */
  readonly short?: readonly number[];
  /** Without viscosity: no dissipation, no small scales. */
  readonly inviscid?: boolean;
}

const mesh = 0.025;
const speed = 5.98;
const viscosity = 1.51e-5;
const none = (why: string) => missing(why);

/** A repeatable sequence between -1 and 1, without a clock or a seed of the machine. */
function wobble(i: number): number {
  const value = Math.sin((i + 1) * 12.9898) * 43758.5453;
  return 2 * (value - Math.floor(value)) - 1;
}

/** A value with a 95 % interval of so much to each side, in the logarithm. */
function about(value: number, relative: number, open = false): Quantity {
  if (open) return bare(value, "the record is too short");
  return estimate(value, value * Math.exp(-relative), value * Math.exp(relative), {
    standard: relative / 1.96,
    freedom: null,
    scale: "log",
  });
}

/** Stations on a power law with scatter, and the law itself: numbers for pictures and tests, of no flow. */
export function powerLawCase(made: MadeCase): FigureCase {
  const A = 0.23;
  const x0 = made.x0 * mesh;
  const kOf = (x: number) => A * speed ** 2 * ((x - x0) / mesh) ** -made.n;
  const stations = made.positions.map((x, i) => station(made, x, i, kOf(x), x0));
  const used = (x: number) => x >= made.window[0] && x <= made.window[1] && !made.short?.includes(x);
  const covariance = lawCovarianceOf(made, x0, made.positions.filter(used));
  const [sx, sn] = [Math.sqrt(covariance[4]), Math.sqrt(covariance[8])];
  const decay: DecayResult = {
    quantity: "k",
    assumption: "none",
    residuals: "log",
    weights: "sampling",
    window: made.window,
    windowChosen: "auto",
    windowReason: "the longest window whose residuals pass chi-square",
    stations: made.positions.filter(used).length,
    speed,
    n: estimate(made.n, made.n - 2 * sn, made.n + 2.1 * sn),
    x0: estimate(x0, x0 - 2.1 * sx, x0 + 2 * sx),
    A: estimate(A, A * 0.8, A * 1.2),
    correlation_n_x0: covariance[5] / (sn * sx),
    chi2_reduced: 1.1,
    p: 0.4,
    given_window: { n: none("as above"), x0: none("as above") },
    lambda_route: { n: none("not made"), x0: none("not made") },
    epsilon_route: { n: none("not made"), x0: none("not made") },
    growth: { m: estimate(0.4, 0.37, 0.44) },
    hypotheses: [
      { name: "Saffman", n: 1.2, p: 0.06 },
      { name: "Loitsyansky", n: 10 / 7, p: 0.0001 },
    ],
    law: {
      A,
      x0,
      n: made.n,
      length: mesh,
      covariance,
      quantile: 1.96,
    },
    points: stations.map((of) => ({
      x: of.x,
      q: (of.k.value ?? 0) / speed ** 2,
      error: made.short?.includes(of.x) ? null : made.scatter,
      smoothedError: made.scatter,
      used: used(of.x),
    })),
    flags: [],
    iterations: 6,
    converged: true,
  };
  return { name: made.name, mark: made.mark, stations, decay, length: mesh, symbol: "M" };
}

/** Inverse of JᵀJ/scatter² over the fitted stations, in ln A, x0, n: least squares with equal errors of ln q. */
function lawCovarianceOf(made: MadeCase, x0: number, positions: readonly number[]): number[] {
  const rows = positions.map((x) => [1, made.n / (x - x0), -Math.log((x - x0) / mesh)]);
  const m = [0, 1, 2].map((i) => [0, 1, 2].map((j) => rows.reduce((sum, row) => sum + row[i] * row[j], 0)));
  const minor = (i: number, j: number) => {
    const [a, b] = [0, 1, 2].filter((row) => row !== i);
    const [c, d] = [0, 1, 2].filter((column) => column !== j);
    return (m[a][c] * m[b][d] - m[a][d] * m[b][c]) * ((i + j) % 2 === 0 ? 1 : -1);
  };
  const determinant = m[0][0] * minor(0, 0) + m[0][1] * minor(0, 1) + m[0][2] * minor(0, 2);
  return [0, 1, 2].flatMap((i) => [0, 1, 2].map((j) => (made.scatter ** 2 * minor(j, i)) / determinant));
}

function station(made: MadeCase, x: number, i: number, law: number, x0: number): StationResult {
  const short = made.short?.includes(x) ?? false;
  const near = 1 + 0.35 * Math.exp(-(x - made.positions[0]) / 0.04);
  const k = law * near * (1 + made.scatter * wobble(i));
  const ratio = made.settled + (made.anisotropy - made.settled) * Math.exp(-(x - made.positions[0]) / 0.35);
  const uu = (2 * k) / (1 + 2 / ratio ** 2);
  const rms = Math.sqrt(uu);
  const decay = (made.n * speed * law) / (x - x0);
  const epsilon = decay / made.balance;
  const lambda = Math.sqrt((15 * viscosity * uu) / epsilon);
  const eta = (viscosity ** 3 / epsilon) ** 0.25;
  const L11 = 0.0065 * ((x - x0) / (6 * mesh)) ** 0.4;
  const small = <T>(value: T, otherwise: T) => (made.inviscid ? otherwise : value);
  const noViscosity = none("the viscosity is not known");
  const sampled = (value: number, relative: number) => about(value, relative, short);
  return {
    x,
    samples: 131072,
    duration: 8.2,
    U: sampled(speed, 0.001),
    uu: sampled(uu, 0.04),
    vv: sampled(uu / ratio ** 2, 0.04),
    ww: sampled(uu / ratio ** 2, 0.04),
    uv: none("not made"),
    uw: none("not made"),
    vw: none("not made"),
    k: sampled(k, 2.2 * made.scatter),
    Tu: sampled(Math.sqrt((2 * k) / 3) / speed, 1.1 * made.scatter),
    isotropy_uv: sampled(ratio * (1 + 0.01 * wobble(i + 50)), 0.02),
    isotropy_uw: sampled(ratio * (1 + 0.01 * wobble(i + 80)), 0.02),
    T_int: sampled(L11 / speed, 0.06),
    L11: sampled(L11, 0.06),
    lambda: small(sampled(lambda, 0.03), noViscosity),
    gradient: sampled(uu / lambda ** 2, 0.06),
    epsilon: small(sampled(epsilon, 0.05), noViscosity),
    epsilon_gradient: small(sampled(epsilon, 0.05), noViscosity),
    epsilon_decay: about(decay, 0.04),
    epsilon_inertial: none("Re_λ is below 100"),
    eta: small(sampled(eta, 0.015), noViscosity),
    Re_lambda: small(sampled((rms * lambda) / viscosity, 0.035), noViscosity),
    Re_L: small(sampled((rms * L11) / viscosity, 0.07), noViscosity),
    C_epsilon: small(sampled((epsilon * L11) / rms ** 3, 0.1), noViscosity),
    S_dudx: sampled(-0.4, 0.1),
    balance: small(sampled(made.balance * (1 + 0.01 * wobble(i + 9)), 0.05), noViscosity),
    q: none("the records hold velocities"),
    routes: {},
    flags: [],
    sources: [],
    curves: curves(uu, L11, eta, viscosity, epsilon),
    blocks: null,
    facts: {
      step: 1 / 16000,
      integralTimes: short ? 161 : 6000,
      groups: short ? 0 : 50,
      segment: 16384,
      segments: 15,
      recoveredVariance: 0.99,
      cutoff: null,
      noiseFloor: null,
      shareBeyondCutoff: null,
      taylorFactor: 1.01,
      k1max_eta: 1.4,
      lagLimit: 1000,
      tauStar: (3 * L11) / speed,
      components: ["u", "v", "w"],
    },
  };
}

/** A one-sided spectrum of the usual shape and a correlation that falls below zero. */
function curves(uu: number, L11: number, eta: number, nu: number, epsilon: number) {
  const k1 = Float64Array.from({ length: 400 }, (_, i) => 12 * 1.0185 ** i);
  const E11 = k1.map(
    (k, i) =>
      (((2 * uu * L11) / Math.PI / (1 + (1.34 * k * L11) ** 2) ** (5 / 6)) * Math.exp(-4.5 * k * eta) +
        1e-9 * (epsilon * nu ** 5) ** 0.25) *
      (1 + 0.06 * wobble(i) * Math.exp(-i / 150)),
  );
  const lag = Float64Array.from({ length: 400 }, (_, i) => (i * 8 * L11) / speed / 400);
  const rho = lag.map((tau) => {
    const r = (tau * speed) / L11;
    return Math.exp(-r) * (1 - r / 12) - 0.012 * Math.sin(r * 1.4) * (1 - Math.exp(-r));
  });
  return { k1, E11, E22: null, E33: null, freedom: 28, lag, rho_u: rho, rho_v: null, rho_w: null };
}

const range = (text: string) => text.split(" ").map(Number);

/** Two cases as a duct and its simulation would give them. */
export const madePair: readonly FigureCase[] = [
  powerLawCase({
    name: "screen",
    mark: 0,
    n: 1.25,
    x0: 3.2,
    positions: range("0.15 0.2 0.25 0.3 0.35 0.4 0.5 0.6 0.7 0.8 0.9 1 1.2 1.4 1.6 1.8"),
    window: [0.3, 1.8],
    scatter: 0.018,
    anisotropy: 1.14,
    settled: 1.03,
    balance: 1.01,
    short: [1.6],
  }),
  powerLawCase({
    name: "simulation",
    mark: 1,
    n: 1.27,
    x0: -2.9,
    positions: range("0.05 0.1 0.15 0.2 0.25 0.3 0.4 0.5 0.6 0.7 0.8 0.9 1 1.2 1.4 1.6 1.8"),
    window: [0.25, 1.6],
    scatter: 0.03,
    anisotropy: 0.87,
    settled: 0.985,
    balance: 1.43,
  }),
];
