import type { DecaySettings } from "../../src/core/decayResult.ts";
import { estimate, missing, type Quantity } from "../../src/core/quantity.ts";
import type { StationResult } from "../../src/core/stationResult.ts";

const absent = missing("not part of this test");

/** A value whose logarithm has a known standard error; without one where `error` is 0. */
export function known(value: number, error: number): Quantity {
  if (error === 0) return { value, low: null, high: null, why_low: "exact", why_high: "exact" };
  const spread = Math.exp(1.959963984540054 * error);
  return estimate(value, value / spread, value * spread, { standard: error, freedom: null, scale: "log" });
}

/** A station at x that carries nothing but what is given. */
export function stationAt(x: number, values: Partial<StationResult>): StationResult {
  return {
    x,
    samples: 0,
    duration: null,
    U: absent,
    uu: absent,
    vv: absent,
    ww: absent,
    uv: absent,
    uw: absent,
    vw: absent,
    k: absent,
    Tu: absent,
    isotropy_uv: absent,
    isotropy_uw: absent,
    T_int: absent,
    L11: absent,
    lambda: absent,
    gradient: absent,
    epsilon: absent,
    epsilon_gradient: absent,
    epsilon_decay: absent,
    epsilon_inertial: absent,
    eta: absent,
    Re_lambda: absent,
    Re_L: absent,
    C_epsilon: absent,
    S_dudx: absent,
    balance: absent,
    q: absent,
    routes: {},
    flags: [],
    sources: [],
    curves: null,
    blocks: null,
    facts: {
      step: null,
      integralTimes: null,
      groups: 0,
      segment: null,
      segments: 0,
      recoveredVariance: null,
      cutoff: null,
      noiseFloor: null,
      shareBeyondCutoff: null,
      taylorFactor: null,
      k1max_eta: null,
      lagLimit: null,
      tauStar: null,
      components: [],
    },
    ...values,
  };
}

/** What a sheet without wishes decides. */
export const plainSettings: DecaySettings = {
  quantity: "auto",
  window: "auto",
  x0: null,
  n: null,
  residuals: "log",
  weights: "sampling",
  along: "x",
  referenceLength: null,
  referenceSpeed: null,
  kinematicViscosity: null,
  dissipation: "auto",
  kind: null,
};

/** Decaying isotropic turbulence on a law, U and nu constant, every scale consistent with it. */
export interface LawOfStations {
  readonly A: number;
  readonly x0: number;
  readonly n: number;
  readonly ell: number;
  readonly U: number;
  readonly nu: number;
  /** L11 = B ((x - x0)/ell)^m. */
  readonly B: number;
  readonly m: number;
}

/**
 * Stations on k/U² = A ((x - x0)/ell)^(-n), with epsilon = n U k/(x - x0), as records would give them.
 * @param error  standard error of ln k at each; 0: exact and without intervals
 * @param moved  factor on k of each station: its scatter
 */
export function lawStations(
  { A, x0, n, ell, U, nu, B, m }: LawOfStations,
  xs: readonly number[],
  error: number,
  moved: (index: number) => number = () => 1,
): StationResult[] {
  return xs.map((x, i) => {
    const k = A * U * U * ((x - x0) / ell) ** -n * moved(i);
    const epsilon = (n * U * A * U * U * ((x - x0) / ell) ** -n) / (x - x0);
    const uu = (2 / 3) * k;
    const lambda = Math.sqrt((15 * nu * uu) / epsilon);
    return stationAt(x, {
      duration: 1,
      samples: 1000,
      U: known(U, 0),
      uu: known(uu, error),
      vv: known(uu, error),
      ww: known(uu, error),
      k: known(k, error),
      Tu: known(Math.sqrt(uu) / U, error / 2),
      isotropy_uv: known(1, error),
      isotropy_uw: known(1, error),
      L11: known(B * ((x - x0) / ell) ** m, error),
      epsilon: known(epsilon, error),
      epsilon_gradient: known(epsilon, error),
      lambda: known(lambda, error),
      eta: known((nu ** 3 / epsilon) ** 0.25, error / 4),
      Re_lambda: known((Math.sqrt(uu) * lambda) / nu, error),
    });
  });
}

/** `count` places from first to last with equal ratios of their distance from x0. */
export function spacedFrom(x0: number, first: number, last: number, count: number): number[] {
  const ratio = (last - x0) / (first - x0);
  return Array.from({ length: count }, (_, i) => x0 + (first - x0) * ratio ** (i / (count - 1)));
}
