import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import { lateralLength, type StationMaterial, scaleQuantity } from "./stationQuantities.ts";
import { lateral, taylorFactors, type ValueName } from "./stationValues.ts";

/** Values that stand among the routes under their own name. */
const kept = [
  "lambda_f",
  "gradient_u",
  "gradient_v",
  "gradient_w",
  "gradient_difference2",
  "gradient_difference4",
  "epsilon_u-gradient",
  "epsilon_second-order",
  "skewness_u",
  "skewness_v",
  "skewness_w",
  "flatness_u",
  "flatness_v",
  "flatness_w",
  "K_v",
  "K_w",
  "rho_uv",
  "rho_uw",
  "rho_vw",
  "anisotropy_xi",
  "anisotropy_eta",
  "barycentric_1",
  "barycentric_2",
  "barycentric_3",
  "L_v_ratio",
  "L_w_ratio",
] as const;

/** Every estimator of a station by its name (see routeNames), whichever is adopted. */
export function stationRoutes(
  material: StationMaterial,
  values: Record<ValueName, Quantity>,
): Record<string, Quantity> {
  const { times, sampling, record } = material;
  const scales = Object.entries(times.routes).map(([name, time]) => [
    `T_int_${name}`,
    scaleQuantity(time, sampling),
  ]);
  return {
    ...Object.fromEntries(scales),
    L_v: lateralLength("v", material),
    L_w: lateralLength("w", material),
    ...Object.fromEntries(kept.map((name) => [name, values[name]])),
    ...expectedDifferences(material),
    lambda_gradient: values.lambda,
    eta_gradient: values.eta,
    Re_lambda_gradient: values.Re_lambda,
    "epsilon_all-gradients":
      record.components.length === 3
        ? values.epsilon_gradient
        : missing("not all three components were measured"),
    "epsilon_third-order": thirdOrder(values["epsilon_third-order"]),
  };
}

/** A bound that is not positive bounds nothing. */
function thirdOrder(bound: Quantity): Quantity {
  if (!isEstimate(bound) || bound.value > 0) return bound;
  return missing("the third-order structure function has nowhere the sign of turbulence that decays");
}

/** What central differences of the spectrum, freed of its noise, would give. */
function expectedDifferences({
  record,
  gradients,
  all,
  settings,
}: StationMaterial): Record<string, Quantity> {
  const found = gradients.find(({ name }) => name === "u");
  const { U, uu, vv, ww } = all.whole;
  if (found === undefined || !(U > 0)) {
    const none = missing(record.untimed ?? "the spectrum shows nothing above its noise floor");
    return { gradient_difference2_expected: none, gradient_difference4_expected: none };
  }
  const [v2, w2] = lateral(uu, vv, ww);
  const [factor] = taylorFactors(uu, v2, w2, record.means[0], settings.taylorCorrection);
  const why = "it is compared with the differences, and has the spectrum's own error";
  const of = (rate: number) => bare(rate / (U * U * factor), why);
  return {
    gradient_difference2_expected: of(found.differences.second),
    gradient_difference4_expected: of(found.differences.fourth),
  };
}
