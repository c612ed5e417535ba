import type { Flag } from "../flag.ts";
import { bare, missing, type Quantity } from "../quantity.ts";
import { anisotropy } from "./anisotropy.ts";

const noError = "the profile gives no standard error";
const names = ["anisotropy_xi", "anisotropy_eta", "barycentric_1", "barycentric_2", "barycentric_3"] as const;

/**
 * Anisotropy of a row of a profile, from uu, vv, ww and uv; the other two shear stresses, which a profile does not
 * hold, are zero where the mean flow is a plane one.
 * @param stresses  uu, vv, ww; NaN where not given
 * @param uv        NaN where not given: then the axes are taken for principal ones, and there is no coefficient
 * @returns         routes, and the flag of stresses that no velocities can have
 */
export function profileTensor(
  [uu, vv, ww]: readonly number[],
  uv: number,
): { routes: Record<string, Quantity>; flags: Flag[] } {
  const rho = uv / Math.sqrt(uu * vv);
  const coefficient = Number.isFinite(rho)
    ? bare(rho, noError)
    : missing("the profile has no columns uu, vv and uv");
  if (![uu, vv, ww].every(Number.isFinite)) {
    const none = missing("uu, vv and ww are not all given");
    return {
      routes: { rho_uv: coefficient, ...Object.fromEntries(names.map((name) => [name, none])) },
      flags: [],
    };
  }
  const { xi, eta, weights } = anisotropy(uu, vv, ww, Number.isFinite(uv) ? uv : 0, 0, 0);
  const values = [xi, eta, ...weights];
  const found = Object.fromEntries(names.map((name, i) => [name, bare(values[i], noError)]));
  return { routes: { rho_uv: coefficient, ...found }, flags: realizability(weights[2]) };
}

function realizability(three: number): Flag[] {
  if (three >= -1e-9) return [];
  const text =
    "No velocities can have these stresses: uv is larger than uu and vv allow (a negative eigenvalue of the tensor).";
  return [{ code: "not-realizable", text, value: three }];
}
