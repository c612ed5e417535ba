/**
 * The invented scenario. An air duct, a perforated screen of mesh M = 25 mm, air at 6 m/s; a heated tube of 10 mm is
 * to stand 0.90 m behind the screen. The turbulence was measured in the empty duct, and computed by a large-eddy
 * simulation with a synthetic inflow; of a second inflow only reduced statistics are there. All in SI.
 */
export const mesh = 0.025;
export const viscosity = 1.51e-5;
/** A tube of 10 mm; it should see Tu = 2.5 % and an integral scale of 1.2 diameters (L11 of a sheet counts chords). */
export const body = { x: 0.9, chord: 0.01, Tu: 0.025, L11: 1.2 };

/** A law k = U² A ((x - x0)/M)^-n from the intensity it gives at the body. */
function lawThrough(tuAtBody, { U, n, x0 }) {
  const A = 1.5 * tuAtBody ** 2 * ((body.x - x0) / mesh) ** n;
  return { U, n, x0, A };
}

/** 1 at x = 0, 0 from `end` on; the higher the power, the gentler the last of it. */
const fading = (x, end, power) => (x < end ? (1 - x / end) ** power : 0);

export const screen = {
  name: "screen",
  kind: "measurement",
  law: lawThrough(0.0334, { U: 6.02, n: 1.25, x0: 3.2 * mesh }),
  windowStart: 0.3,
  x: [0.15, 0.2, 0.25, 0.3, 0.35, 0.42, 0.5, 0.6, 0.75, 0.9, 1.1, 1.4, 1.8],
  /** The jets of the holes still mix: energy above the law before the window. */
  departure: (x) => 1.8 * fading(x, 0.3, 1.25),
  /** u'/v' and w'/v'. */
  isotropy: (x) => [1.04 + 0.09 * Math.exp(-(x - 0.15) / 0.25), 1.01],
  skewness: () => -0.4,
  filterWidth: 0,
  /** Noise of the sensor, rms, m/s. */
  noise: 5e-4,
  step: (x) => (x < 0.3 ? 1 / 40000 : x < 0.7 ? 1 / 20000 : 1 / 10000),
  samples: 68000,
  seed: 4900,
};

export const simulation = {
  name: "simulation",
  kind: "les",
  law: lawThrough(0.0289, { U: 6, n: 1.27, x0: -2.9 * mesh }),
  windowStart: 0.2,
  x: [0.05, 0.1, 0.15, 0.2, 0.27, 0.35, 0.45, 0.57, 0.72, 0.9, 1.15, 1.45, 1.8],
  /** The inflow has no cascade yet: it loses less than the law asks for until it has adjusted. */
  departure: (x) => -0.4 * fading(x, 0.2, 2),
  isotropy: (x) => [1 - 0.13 * Math.exp(-(x - 0.05) / 0.12), 1],
  skewness: (x) => -0.4 * (1 - Math.exp(-((x / 0.16) ** 2))),
  /** Spacing of the grid, m: what is smaller is not there. */
  filterWidth: 1.2e-3,
  noise: 0,
  step: () => 2e-4,
  samples: 32600,
  seed: 5200,
};

export const secondInflow = {
  name: "simulation-2",
  kind: "les",
  law: lawThrough(0.0302, { U: 6, n: 1.22, x0: -6 * mesh }),
  windowStart: 0.25,
  x: [0.05, 0.1, 0.15, 0.2, 0.25, 0.32, 0.4, 0.5, 0.62, 0.76, 0.9, 1.1, 1.35, 1.65, 2],
  departure: (x) => -0.2 * fading(x, 0.25, 2),
  isotropy: (x) => [1 - 0.06 * Math.exp(-(x - 0.05) / 0.2), 1],
  skewness: (x) => -0.4 * (1 - Math.exp(-((x / 0.2) ** 2))),
  filterWidth: 1.2e-3,
  /** Relative scatter of the statistics, as of a run of some thousand integral times. */
  scatter: { U: 0.0005, stress: 0.012, L11: 0.02, lambda: 0.006, epsilon: 0.012 },
  seed: 6300,
};
