import { body, mesh, viscosity } from "./scenario.mjs";

/** A profile has no errors by which to find where the law begins: its sheet says so. */
const fitWindow = (flow) => [flow.windowStart, flow.x[flow.x.length - 1]];

/**
 * The case sheet of one flow. The records are frozen turbulence carried past the probe, so nothing is to be
 * corrected for Taylor's hypothesis.
 * @param {{ name: string, kind: string, windowStart: number, x: number[] }} flow
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
    ...(layout === "series" ? { reduce: { taylorCorrection: false } } : { fit: { window: fitWindow(flow) } }),
    body,
  };
}
