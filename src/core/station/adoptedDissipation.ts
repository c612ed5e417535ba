import { missing, type Quantity } from "../quantity.ts";
import type { ReduceSettings } from "../stationResult.ts";
import type { InertialDissipation } from "./inertialDissipation.ts";
import { inertialScales } from "./inertialScales.ts";
import type { LeftOut } from "./stationErrors.ts";
import type { ValueName } from "./stationValues.ts";

/** Why a quantity waits for the decay law. */
export const setByDecay = "it follows from the decay law, which is fitted after the stations are reduced";

/** What the adopted dissipation is chosen from. */
export interface DissipationChoice {
  /** Of the gradients. */
  readonly gradient: Pick<Record<ValueName, Quantity>, "epsilon_gradient" | "lambda" | "eta" | "Re_lambda">;
  readonly inertial: InertialDissipation;
  /** Of the gradients. */
  readonly C_epsilon: Quantity;
  /** Variance of the longitudinal component, of all blocks and less each group. */
  readonly variance: LeftOut;
  /** A value that is known without each group, with its interval. */
  readonly quantity: (own: LeftOut) => Quantity;
  /** The same over a length, times the integral length. */
  readonly timesLength: (own: LeftOut) => Quantity;
}

/**
 * The adopted dissipation, and what follows from it: the gradients' by default, the decay's for a large-eddy
 * simulation, or what the user chose.
 */
export function adoptedDissipation(settings: ReduceSettings, choice: DissipationChoice) {
  const route = adoptedRoute(settings);
  if (route === "decay") {
    const waits = missing(setByDecay);
    return { epsilon: waits, lambda: waits, eta: waits, Re_lambda: waits, C_epsilon: waits };
  }
  if (route === "gradient") {
    const { gradient, C_epsilon } = choice;
    const { epsilon_gradient, lambda, eta, Re_lambda } = gradient;
    return { epsilon: epsilon_gradient, lambda, eta, Re_lambda, C_epsilon };
  }
  const { quantity: epsilon, leaves } = choice.inertial;
  const nu = settings.kinematicViscosity;
  if (leaves === null || nu === null)
    return { epsilon, lambda: epsilon, eta: epsilon, Re_lambda: epsilon, C_epsilon: epsilon };
  const scales = inertialScales(leaves, choice.variance, nu);
  return {
    epsilon,
    lambda: choice.quantity(scales.lambda),
    eta: choice.quantity(scales.eta),
    Re_lambda: choice.quantity(scales.Re_lambda),
    C_epsilon: choice.timesLength(scales.C_over_L),
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
