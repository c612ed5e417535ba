import { anisotropy } from "./anisotropy.ts";
import { commonScales } from "./commonScales.ts";
import type { Component } from "./stationPart.ts";
import { dissipationFromStructure } from "./structureDissipation.ts";

/** What a station's sums are turned into numbers with. */
export interface ValueContext {
  readonly components: readonly Component[];
  readonly column: Readonly<Record<string, number>>;
  /** Mean of each component in the whole record: the sums are about it. */
  readonly means: readonly number[];
  /** Time between samples, s; null where it is not known. */
  readonly step: number | null;
  readonly viscosity: number | null;
  readonly referenceSpeed: number | null;
  readonly taylorCorrection: boolean;
  /** Lags of the structure functions, s; null where there are none. */
  readonly structure: { readonly second: number; readonly third: number } | null;
}

/**
 * The scale of every value's error.
 * The values are those of one station as functions of its sums; a name is a key of the result or of its routes.
 */
export const valueScales = {
  ...commonScales,
  rho_uv: "linear",
  rho_uw: "linear",
  rho_vw: "linear",
  anisotropy_xi: "linear",
  anisotropy_eta: "linear",
  barycentric_1: "linear",
  barycentric_2: "linear",
  barycentric_3: "linear",
  L_v_ratio: "linear",
  L_w_ratio: "linear",
  "epsilon_second-order": "log",
  "epsilon_third-order": "linear",
  /** C_epsilon/T_int and Re_L/T_int: the integral time's own error is added to theirs. */
  C_epsilon_over_T: "log",
  Re_L_over_T: "log",
} as const;
export type ValueName = keyof typeof valueScales;
/** NaN: not to be had from these sums. It does not leave this room. */
export type StationValues = Record<ValueName, number>;

/**
 * All values of a station from its sums. Components that were not measured are taken like the measured lateral
 * one, and like u where there is none:
 *     k = (uu + vv + ww)/2,  Tu = √(2k/3)/Uref,  gradient = <(du/dt)²>/U² over Taylor's factor,
 *     epsilon = 3ν (g_u + g_v + g_w), 15ν g_u with u alone,  lambda = u'/√g_u,  eta = (ν³/epsilon)^¼
 * @param sums  of any of the station's blocks, plain sums about the record's means
 * @see   Pope (2000) §§5.4, 6.3, 6.5; Lumley (1965), Phys. Fluids 8, 1056, and Wyngaard & Clifford (1977),
 *        J. Atmos. Sci. 34, 922, for the correction of Taylor's hypothesis
 */
export function stationValues(sums: Float64Array, context: ValueContext): StationValues {
  const { column, components, viscosity, means } = context;
  const sum = (name: string) => (column[name] === undefined ? Number.NaN : sums[column[name]] / sums[0]);
  const shift = (name: Component) => sum(name);
  const co = (a: Component, b: Component) => sum(a + b) - shift(a) * shift(b);
  const U = means[0] + shift("u");
  const [uu, vv, ww] = [co("u", "u"), co("v", "v"), co("w", "w")];
  const [v2, w2] = lateral(uu, vv, ww);
  const factor = taylorFactors(uu, v2, w2, U, context.taylorCorrection);
  // without a stream to carry it past there is no distance
  const speed = U > 0 ? U : Number.NaN;
  const [gu, gv, gw] = (["u", "v", "w"] as const).map(
    (name, i) => sum(`rate_${name}`) / speed ** 2 / factor[i],
  );
  const nu = viscosity ?? Number.NaN;
  const epsilon = components.length === 1 ? 15 * nu * gu : 3 * nu * (gu + sumOf(lateral(2 * gu, gv, gw)));
  const k = (uu + v2 + w2) / 2;
  const [rms, lambda] = [Math.sqrt(uu), Math.sqrt(uu / gu)];
  return {
    ...{ U, uu, vv, ww, k },
    ...stresses(co),
    Tu: Math.sqrt((2 * k) / 3) / (context.referenceSpeed ?? speed),
    isotropy_uv: Math.sqrt(uu / vv),
    isotropy_uw: Math.sqrt(uu / ww),
    ...{ gradient_u: gu, gradient_v: gv, gradient_w: gw },
    ...differences(sums, context, speed ** 2 * factor[0]),
    "epsilon_u-gradient": 15 * nu * gu,
    ...{ epsilon_gradient: epsilon, lambda },
    lambda_f: Math.SQRT2 * lambda,
    eta: (nu ** 3 / epsilon) ** 0.25,
    Re_lambda: (rms * lambda) / nu,
    ...shapes(sum, { u: uu, v: vv, w: ww }),
    ...{ K_v: (2 * gu) / gv, K_w: (2 * gu) / gw },
    L_v_ratio: (2 * sum("area_v") * uu) / (sum("area_u") * vv),
    L_w_ratio: (2 * sum("area_w") * uu) / (sum("area_u") * ww),
    ...dissipationFromStructure(sums, context, speed),
    C_epsilon_over_T: (epsilon * speed) / rms ** 3,
    Re_L_over_T: (rms * speed) / nu,
  };
}

function sumOf([a, b]: readonly [number, number]): number {
  return a + b;
}

/** Shear stresses, their coefficients, and where the tensor stands between its limits. */
function stresses(co: (a: Component, b: Component) => number) {
  const [uu, vv, ww] = [co("u", "u"), co("v", "v"), co("w", "w")];
  const [uv, uw, vw] = [co("u", "v"), co("u", "w"), co("v", "w")];
  const { xi, eta, weights } = anisotropy(uu, vv, ww, uv, uw, vw);
  return {
    ...{ uv, uw, vw },
    rho_uv: uv / Math.sqrt(uu * vv),
    rho_uw: uw / Math.sqrt(uu * ww),
    rho_vw: vw / Math.sqrt(vv * ww),
    anisotropy_xi: xi,
    anisotropy_eta: eta,
    barycentric_1: weights[0],
    barycentric_2: weights[1],
    barycentric_3: weights[2],
  };
}

/** Lateral values: each as measured, else like the other, else like the one given. */
export function lateral(like: number, v: number, w: number): [number, number] {
  if (Number.isNaN(v)) return Number.isNaN(w) ? [like, like] : [w, w];
  return [v, Number.isNaN(w) ? v : w];
}

/** What Taylor's hypothesis makes the mean squares of du/dx, dv/dx, dw/dx too large by. */
export function taylorFactors(
  uu: number,
  vv: number,
  ww: number,
  U: number,
  corrected: boolean,
): [number, number, number] {
  if (!corrected) return [1, 1, 1];
  const square = U * U;
  return [
    1 + (uu + 2 * vv + 2 * ww) / square,
    1 + (uu + vv / 2 + ww) / square,
    1 + (uu + vv + ww / 2) / square,
  ];
}

/** Mean squares by differences, not corrected for what a difference loses, and the derivative skewness. */
function differences(sums: Float64Array, { column, step }: ValueContext, speedSquared: number) {
  const unknown = Number.NaN;
  if (step === null) return { gradient_difference2: unknown, gradient_difference4: unknown, S_dudx: unknown };
  const at = (name: string) => sums[column[name]];
  const square = at("derivative_squared") / at("derivatives");
  return {
    gradient_difference2: at("difference2") / at("differences") / (step * step * speedSquared),
    gradient_difference4: at("difference4") / at("differences") / (step * step * speedSquared),
    // d/dx runs against d/dt
    S_dudx: -(at("derivative_cubed") / at("derivatives")) / square ** 1.5,
  };
}

/** Skewness and flatness about the mean of these sums. */
function shapes(sum: (name: string) => number, variance: Record<Component, number>) {
  const skewness = (name: Component) => {
    const d = sum(name);
    return (sum(name.repeat(3)) - 3 * d * sum(name.repeat(2)) + 2 * d ** 3) / variance[name] ** 1.5;
  };
  const flatness = (name: Component) => {
    const d = sum(name);
    const fourth =
      sum(name.repeat(4)) - 4 * d * sum(name.repeat(3)) + 6 * d * d * sum(name.repeat(2)) - 3 * d ** 4;
    return fourth / variance[name] ** 2;
  };
  return {
    skewness_u: skewness("u"),
    skewness_v: skewness("v"),
    skewness_w: skewness("w"),
    flatness_u: flatness("u"),
    flatness_v: flatness("v"),
    flatness_w: flatness("w"),
  };
}
