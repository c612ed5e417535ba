import type { CaseView } from "../../src/app/session/caseView.ts";
import { compareDefaults } from "../../src/core/comparison.ts";
import type { DecayResult } from "../../src/core/decayResult.ts";
import { estimate, missing, type Quantity } from "../../src/core/quantity.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import type { CaseSheet } from "../../src/sheet/caseSheet.ts";
import type { WorkspaceCase } from "../../src/sheet/workspace.ts";

/** Within `share` of the value on either side. */
const around = (value: number, share: number): Quantity =>
  estimate(value, value * (1 - share), value * (1 + share), {
    standard: share / 1.96,
    freedom: null,
    scale: "log",
  });

const none = missing("not in this fixture");

/** A station on k/U² = 0.05 (x/0.025 - 3)^-1.25 at U = 6 m/s, with intervals of a few per cent. */
export function stationAt(x: number, change: Partial<StationResult> = {}): StationResult {
  const k = 36 * 0.05 * (x / 0.025 - 3) ** -1.25;
  const Tu = Math.sqrt((2 * k) / 3) / 6;
  return {
    x,
    samples: 65536,
    duration: 8.192,
    U: around(6, 0.001),
    uu: around((2 * k) / 3, 0.02),
    vv: around((2 * k) / 3, 0.02),
    ww: around((2 * k) / 3, 0.02),
    uv: none,
    uw: none,
    vw: none,
    k: around(k, 0.02),
    Tu: around(Tu, 0.01),
    isotropy_uv: around(1.05, 0.02),
    isotropy_uw: around(1.04, 0.02),
    T_int: around(0.0015, 0.05),
    L11: around(0.009, 0.05),
    lambda: around(0.003, 0.02),
    gradient: around(900, 0.02),
    epsilon: around(1.2, 0.03),
    epsilon_gradient: around(1.2, 0.03),
    epsilon_decay: around(1.2, 0.03),
    epsilon_inertial: missing("Re_lambda is below 100"),
    eta: around(0.0002, 0.01),
    Re_lambda: around(60, 0.02),
    Re_L: none,
    C_epsilon: none,
    S_dudx: none,
    balance: around(1.01, 0.04),
    q: none,
    routes: {},
    flags: [],
    sources: [{ name: `x${x}.csv`, bytes: 1000, x, position: "name" }],
    curves: null,
    blocks: null,
    facts: {
      step: 1.25e-4,
      integralTimes: 5461,
      groups: 50,
      segment: 1024,
      segments: 127,
      recoveredVariance: 0.99,
      cutoff: null,
      noiseFloor: null,
      shareBeyondCutoff: null,
      taylorFactor: 1.01,
      k1max_eta: 1.4,
      lagLimit: 0.1,
      tauStar: 0.01,
      components: ["u", "v", "w"],
    },
    ...change,
  };
}

export function decayOf(stations: readonly StationResult[], change: Partial<DecayResult> = {}): DecayResult {
  const pair = { n: estimate(1.25, 1.2, 1.31), x0: estimate(0.08, 0.0525, 0.1025) };
  return {
    quantity: "k",
    assumption: "none",
    residuals: "log",
    weights: "sampling",
    window: [0.3, 1.8],
    windowChosen: "auto",
    windowReason: "The longest window whose residuals pass the chi-square test.",
    stations: stations.length,
    speed: 6,
    ...pair,
    A: estimate(0.05, 0.04, 0.06),
    correlation_n_x0: -0.97,
    chi2_reduced: 1.1,
    p: 0.4,
    given_window: pair,
    lambda_route: pair,
    epsilon_route: pair,
    growth: { m: estimate(0.4, 0.37, 0.44) },
    hypotheses: [{ name: "Saffman", n: 1.2, p: 0.06 }],
    law: { A: 0.05, x0: 0.08, n: 1.25, length: 0.025, covariance: Array(9).fill(0), quantile: 1.96 },
    points: stations.map(({ x, k }) => ({
      x,
      q: (k.value ?? 0) / 36,
      error: 0.01,
      smoothedError: 0.01,
      used: x >= 0.3,
    })),
    flags: [],
    iterations: 4,
    converged: true,
    ...change,
  };
}

export const sheet: CaseSheet = {
  case: "screen",
  kinematicViscosity: 1.5e-5,
  units: "SI",
  reference: { length: 0.025, symbol: "M", speed: null },
  layout: "series",
  along: "x",
  columns: null,
  files: [{ path: "x0.3.csv", x: 0.3 }],
  fit: {
    quantity: "auto",
    window: "auto",
    x0: null,
    n: null,
    residuals: "log",
    weights: "sampling",
    coordinate: "auto",
    otherX0: null,
  },
  kind: null,
  read: { separator: null, decimal: null, heading: null, step: null, times: "ask", missing: [] },
  zero: 0,
  simultaneous: "auto",
  periodic: "auto",
  startup: 0,
  extent: null,
  sensorLength: null,
  reduce: {
    integralScale: "zero-crossing",
    correlation: "biased",
    detrend: "mean",
    segment: null,
    taylorCorrection: true,
    dissipation: "auto",
    probes: "agreeing",
  },
  body: null,
  development: { tolerance: 0.1 },
  compare: { align: "x0", tolerance: 0.1, ...compareDefaults },
};

export const workspaceCase: WorkspaceCase = {
  id: "case-1",
  mark: 0,
  sheet,
  fromSheet: false,
  sources: [{ name: "x0.3.csv", bytes: 1000, fingerprint: "a" }],
};

export function viewOf(stations: readonly StationResult[], change: Partial<CaseView> = {}): CaseView {
  return {
    id: "case-1",
    name: "screen",
    mark: 0,
    length: 0.025,
    symbol: "M",
    units: "SI",
    along: "x",
    of: workspaceCase,
    reduced: { key: "k", stations, sources: [], flags: [], failures: [], complete: true },
    stations,
    decay: decayOf(stations),
    stale: false,
    work: null,
    ...change,
  };
}
