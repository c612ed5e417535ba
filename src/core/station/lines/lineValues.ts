import { commonScales } from "../commonScales.ts";
import type { Component } from "../stationPart.ts";
import { lateral } from "../stationValues.ts";
import { lineComponents } from "./lineFields.ts";
import type { LineDirection } from "./linePart.ts";

/** What a station's sums are turned into numbers with. */
export interface LineContext {
  readonly along: LineDirection;
  readonly components: readonly Component[];
  readonly column: Readonly<Record<string, number>>;
  /** Common mean of each component: the sums are about it. */
  readonly means: readonly number[];
  /** Between points. */
  readonly spacing: number;
  /** Separation, in steps, whose increments give the derivative skewness. */
  readonly derivativeLag: number;
  readonly viscosity: number | null;
  readonly referenceSpeed: number | null;
}

/**
 * The scale of every value's error.
 * gradient_u, _v, _w are those of the component along the line and of the two across, in the places of u, v and w.
 */
export const lineScales = {
  ...commonScales,
  /** C_epsilon/L11 and Re_L/L11: the error of L11 is added to theirs. */
  C_epsilon_over_L: "log",
  Re_L_over_L: "log",
} as const;
export type LineValueName = keyof typeof lineScales;
/** NaN: not to be had from these sums. It does not leave this room. */
export type LineValues = Record<LineValueName, number>;

/**
 * All values of a station from its sums. With ℓ the component along the line, g its mean-square gradient,
 *     lambda = ℓ'/√g,  epsilon = 3ν (g + g_2 + g_3), 15ν g with ℓ alone,  Re_lambda = ℓ' lambda/ν
 * Distances are read off the line: no hypothesis turns time into space.
 * @param sums  of any of the station's blocks
 * @see   Pope (2000) §§5.4, 6.3, 6.5
 */
export function lineValues(sums: Float64Array, context: LineContext): LineValues {
  const { components, column, means, viscosity } = context;
  const mean = (name: string) => (column[name] === undefined ? Number.NaN : sums[column[name]] / sums[0]);
  const co = (a: Component, b: Component) => mean(a + b) - mean(a) * mean(b);
  const order = lineComponents(context.along);
  const U = (means[components.indexOf("u")] ?? Number.NaN) + mean("u");
  const [uu, vv, ww] = [co("u", "u"), co("v", "v"), co("w", "w")];
  const [v2, w2] = lateral(uu, vv, ww);
  const k = (uu + v2 + w2) / 2;
  const [g, g2, g3] = order.map((name) => mean(`rate_${name}`));
  const [t2, t3] = lateral(2 * g, g2, g3);
  const nu = viscosity ?? Number.NaN;
  const epsilon = 3 * nu * (g + t2 + t3);
  const rms = Math.sqrt(co(order[0], order[0]));
  const lambda = rms / Math.sqrt(g);
  return {
    ...{ U, uu, vv, ww, k },
    ...{ uv: co("u", "v"), uw: co("u", "w"), vw: co("v", "w") },
    Tu: Math.sqrt((2 * k) / 3) / (context.referenceSpeed ?? (U > 0 ? U : Number.NaN)),
    isotropy_uv: Math.sqrt(uu / vv),
    isotropy_uw: Math.sqrt(uu / ww),
    ...{ gradient_u: g, gradient_v: g2, gradient_w: g3 },
    ...(context.along === "x" ? pointDifferences(sums, column) : lineDifferences(sums, context)),
    "epsilon_u-gradient": 15 * nu * g,
    epsilon_gradient: epsilon,
    ...{ lambda, lambda_f: Math.SQRT2 * lambda },
    eta: (nu ** 3 / epsilon) ** 0.25,
    Re_lambda: (rms * lambda) / nu,
    K_v: (2 * g) / g2,
    K_w: (2 * g) / g3,
    ...shapes(mean, { u: uu, v: vv, w: ww }),
    C_epsilon_over_L: epsilon / rms ** 3,
    Re_L_over_L: rms / nu,
  };
}

/** Along a lateral line: increments over two steps are central differences. */
function lineDifferences(sums: Float64Array, { column, spacing, derivativeLag: lag }: LineContext) {
  const at = (name: string) => (column[name] === undefined ? Number.NaN : sums[column[name]]);
  const square = at(`square_${lag}`) / at(`n_${lag}`);
  return {
    gradient_difference2: at("square_2") / at("n_2") / (2 * spacing) ** 2,
    gradient_difference4: at("fourth_square") / at("fourths") / spacing ** 2,
    S_dudx: at(`cube_${lag}`) / at(`n_${lag}`) / square ** 1.5,
  };
}

/** At a point of a line along x: the derivative about its own mean, as the mean flow may change along x. */
function pointDifferences(sums: Float64Array, column: Readonly<Record<string, number>>) {
  const moments = (order: string) => {
    const n = sums[column[`n_${order}`]];
    const mean = sums[column[`${order}_u`]] / n;
    const square = sums[column[`${order}_uu`]] / n;
    const cube = sums[column[`${order}_cube`]] / n;
    return { variance: square - mean ** 2, third: cube - 3 * mean * square + 2 * mean ** 3 };
  };
  const [second, fourth] = [moments("second"), moments("fourth")];
  return {
    gradient_difference2: second.variance,
    gradient_difference4: fourth.variance,
    S_dudx: second.third / second.variance ** 1.5,
  };
}

/** Skewness and flatness about the mean of these sums. */
function shapes(mean: (name: string) => number, variance: Record<Component, number>) {
  const skewness = (name: Component) => {
    const d = mean(name);
    return (mean(name.repeat(3)) - 3 * d * mean(name.repeat(2)) + 2 * d ** 3) / variance[name] ** 1.5;
  };
  const flatness = (name: Component) => {
    const d = mean(name);
    const [second, third, fourth] = [2, 3, 4].map((power) => mean(name.repeat(power)));
    return (fourth - 4 * d * third + 6 * d * d * second - 3 * d ** 4) / variance[name] ** 2;
  };
  return {
    ...{ skewness_u: skewness("u"), skewness_v: skewness("v"), skewness_w: skewness("w") },
    ...{ flatness_u: flatness("u"), flatness_v: flatness("v"), flatness_w: flatness("w") },
  };
}
