import { body, mesh, viscosity } from "./scenario.mjs";

/**
 * The case sheet of one flow. The records are frozen turbulence carried past the probe, so nothing is to be
 * corrected for Taylor's hypothesis.
 * @param {{ name: string, kind: string }} flow
 * @param {"series" | "profile"} layout
 * @param {string} path its files, relative to the sheet; the files themselves tell their position
 */
export function caseSheet(flow, layout, path) {
  return {
    case: flow.name,
    kind: flow.kind,
    kinematicViscosity: viscosity,
    units: "SI",
    reference: { length: mesh, symbol: "M", speed: null },
    layout,
    files: [{ path }],
    ...(layout === "series" ? { reduce: { taylorCorrection: false } } : {}),
    body,
  };
}
