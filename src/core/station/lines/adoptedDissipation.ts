import { isEstimate, missing, type Quantity, scaled } from "../../quantity.ts";
import { setByDecay } from "../adoptedDissipation.ts";
import type { LineMaterial } from "./lineMaterial.ts";
import type { LineValueName } from "./lineValues.ts";

/** The adopted dissipation, and what follows from it: by the same choice as for a record in time. */
export function adoptedDissipation(
  { settings, all, lines }: LineMaterial,
  values: Record<LineValueName, Quantity>,
  inertial: Quantity,
  C_epsilon: Quantity,
) {
  const { dissipation, kind, kinematicViscosity: nu } = settings;
  if (dissipation === "decay" || (dissipation === "auto" && kind === "les")) {
    const waits = missing(setByDecay);
    return { epsilon: waits, lambda: waits, eta: waits, Re_lambda: waits, C_epsilon: waits };
  }
  const gradient = values.epsilon_gradient;
  if (dissipation !== "inertial") {
    const { lambda, eta, Re_lambda } = values;
    return { epsilon: gradient, lambda, eta, Re_lambda, C_epsilon };
  }
  if (!isEstimate(inertial) || nu === null)
    return { epsilon: inertial, lambda: inertial, eta: inertial, Re_lambda: inertial, C_epsilon: inertial };
  const variance = lines.along === "x" ? all.whole.uu : lines.along === "y" ? all.whole.vv : all.whole.ww;
  const lambda = Math.sqrt((15 * nu * variance) / inertial.value);
  const like = (value: number): Quantity => ({ ...inertial, value });
  return {
    epsilon: inertial,
    lambda: like(lambda),
    eta: like((nu ** 3 / inertial.value) ** 0.25),
    Re_lambda: like((Math.sqrt(variance) * lambda) / nu),
    C_epsilon: isEstimate(gradient) ? scaled(C_epsilon, inertial.value / gradient.value) : C_epsilon,
  };
}
