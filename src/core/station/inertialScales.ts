import type { LeftOut } from "./stationErrors.ts";

/** The small scales that an inertial-range dissipation fixes, and C_epsilon over the integral length. */
export interface InertialScales {
  readonly lambda: LeftOut;
  readonly eta: LeftOut;
  readonly Re_lambda: LeftOut;
  /** C_epsilon/L11, 1/m. */
  readonly C_over_L: LeftOut;
}

/**
 * Scales from a dissipation that the gradients did not give, each also without every group of blocks, so that what
 * dissipation and variance have in common counts once,
 *     lambda = √(15 ν uu/epsilon),  eta = (ν³/epsilon)^¼,  Re_lambda = u' lambda/ν,  C_epsilon/L11 = epsilon/u'³
 * @param epsilon  m²/s³
 * @param variance of the longitudinal component, m²/s², without the same groups
 * @param nu       m²/s
 * @see   Pope (2000) §6.3
 */
export function inertialScales(epsilon: LeftOut, variance: LeftOut, nu: number): InertialScales {
  const each = (power: number, of: (epsilon: number, uu: number) => number): LeftOut => ({
    value: of(epsilon.value, variance.value),
    without: epsilon.without.map((value, group) => of(value, variance.without[group])),
    further: Math.abs(power) * (epsilon.further ?? 0),
  });
  return {
    lambda: each(-1 / 2, (rate, uu) => Math.sqrt((15 * nu * uu) / rate)),
    eta: each(-1 / 4, (rate) => (nu ** 3 / rate) ** 0.25),
    Re_lambda: each(-1 / 2, (rate, uu) => uu * Math.sqrt(15 / (nu * rate))),
    C_over_L: each(1, (rate, uu) => rate / uu ** 1.5),
  };
}
