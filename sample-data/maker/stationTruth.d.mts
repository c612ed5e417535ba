import type { Flow } from "./scenario.d.mts";
import type { Spectra } from "./synthesise.d.mts";

export function stationTruth(
  flow: Flow,
  x: number,
): { readonly truth: { readonly U: number; readonly S_dudx: number }; readonly spectra: Spectra };
