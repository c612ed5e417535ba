import { type Estimate, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { ReduceSettings } from "../stationResult.ts";
import type { ValueName } from "./stationValues.ts";

/** Why a quantity waits for the decay law. */
export const setByDecay = "it follows from the decay law, which is fitted after the stations are reduced";

/**
 * The adopted dissipation, and what follows from it: the gradients' by default, the decay's for a large-eddy
 * simulation, or what the user chose.
 * @param settings   the choice
 * @param values     of the gradients
 * @param inertial   dissipation from the inertial range
 * @param C_epsilon  of the gradients
 * @param uu         variance of u
 */
export function adoptedDissipation(
  settings: ReduceSettings,
  values: Record<ValueName, Quantity>,
  inertial: Quantity,
  C_epsilon: Quantity,
  uu: number,
) {
  const route = adoptedRoute(settings);
  if (route === "decay") {
    const waits = missing(setByDecay);
    return { epsilon: waits, lambda: waits, eta: waits, Re_lambda: waits, C_epsilon: waits };
  }
  if (route === "gradient") {
    const { epsilon_gradient, lambda, eta, Re_lambda } = values;
    return { epsilon: epsilon_gradient, lambda, eta, Re_lambda, C_epsilon };
  }
  const nu = settings.kinematicViscosity;
  if (!isEstimate(inertial) || nu === null) {
    return { epsilon: inertial, lambda: inertial, eta: inertial, Re_lambda: inertial, C_epsilon: inertial };
  }
  const lambda = Math.sqrt((15 * nu * uu) / inertial.value);
  const like = (value: number): Estimate => ({ ...inertial, value });
  const gradient = values.epsilon_gradient;
  const ratio = isEstimate(gradient) ? inertial.value / gradient.value : 0;
  return {
    epsilon: inertial,
    lambda: like(lambda),
    eta: like((nu ** 3 / inertial.value) ** 0.25),
    Re_lambda: like((Math.sqrt(uu) * lambda) / nu),
    C_epsilon: isEstimate(C_epsilon) ? like(C_epsilon.value * ratio) : C_epsilon,
  };
}

function adoptedRoute({ dissipation, kind }: ReduceSettings): "gradient" | "decay" | "inertial" {
  if (dissipation !== "auto") return dissipation;
  return kind === "les" ? "decay" : "gradient";
}

const chosen = {
  gradient: "from the gradients, as chosen",
  decay: "from the decay law, as chosen",
  inertial: "from the inertial range, as chosen",
} as const;
const measured = {
  1: "from the gradient of u alone, as if isotropic: v and w were not measured",
  2: "from two gradients: the third component was not measured and is taken like its lateral neighbour",
  3: "from the gradients of all three components",
} as const;

/** Which route the dissipation takes, and why: a clause to stand beside it. */
export function dissipationReason(settings: ReduceSettings, components: number): string {
  if (settings.dissipation !== "auto") return chosen[settings.dissipation];
  if (settings.kind === "les")
    return "from the decay law: the gradients are those of the resolved motion only";
  return measured[components === 3 ? 3 : components === 2 ? 2 : 1];
}
