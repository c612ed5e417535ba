import { missing, type Quantity } from "../quantity.ts";
import { powerProduct } from "./powerProduct.ts";

/** Scales that a dissipation and the variance of u fix. */
export interface DissipationScales {
  /** lambda_g, m. */
  readonly lambda: Quantity;
  /** m. */
  readonly eta: Quantity;
  readonly Re_lambda: Quantity;
  readonly C_epsilon: Quantity;
}

/**
 * Small scales from a dissipation that was not measured by gradients, with the isotropic relation:
 *     lambda = (15 nu uu/epsilon)^(1/2),   eta = (nu³/epsilon)^(1/4),
 *     Re_lambda = u' lambda/nu,   C_epsilon = epsilon L11/u'³
 * @param uu      m²/s²
 * @param epsilon m²/s³
 * @param L11     m
 * @param nu      kinematic viscosity, m²/s; null where none is given
 * @returns       each missing where a part of it is
 * @see           Pope (2000) §6.3; Comte-Bellot & Corrsin (1971), J. Fluid Mech. 48, 273, eq. (49) to (52)
 */
export function scalesFromDissipation(
  uu: Quantity,
  epsilon: Quantity,
  L11: Quantity,
  nu: number | null,
): DissipationScales {
  const C_epsilon = powerProduct(1, [
    [epsilon, 1],
    [L11, 1],
    [uu, -1.5],
  ]);
  if (nu === null) {
    const without = missing("no kinematic viscosity is given");
    return { lambda: without, eta: without, Re_lambda: without, C_epsilon };
  }
  return {
    lambda: powerProduct(Math.sqrt(15 * nu), [
      [uu, 1 / 2],
      [epsilon, -1 / 2],
    ]),
    eta: powerProduct(nu ** (3 / 4), [[epsilon, -1 / 4]]),
    Re_lambda: powerProduct(Math.sqrt(15 / nu), [
      [uu, 1],
      [epsilon, -1 / 2],
    ]),
    C_epsilon,
  };
}
