import type { DecayResult } from "../../core/decayResult.ts";

/**
 * What turns the root of the fitted quantity into a turbulence intensity
 *     Tu(x) = f √q(x),  f = √(2/3) Us/U for q = k/Us²,  f = Us/U for q = uu/Us²
 * @param decay the fit; its `speed` is Us
 * @param U     speed that Tu is formed with, as a mean over the window; null: Us itself
 * @returns     f, 1; null for a quantity that was given as such, which has no intensity
 */
export function lawTuFactor(decay: DecayResult, U: number | null): number | null {
  if (decay.quantity === "q" || decay.speed === null) return null;
  const speeds = U === null || U === 0 ? 1 : decay.speed / Math.abs(U);
  return speeds * (decay.quantity === "k" ? Math.sqrt(2 / 3) : 1);
}
