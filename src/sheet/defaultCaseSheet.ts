import { compareDefaults } from "../core/comparison.ts";
import type { CaseSheet } from "./caseSheet.ts";

/** Every default of a case sheet; `case` and `files` have none and are empty here, `layout` is the commonest. */
export const defaultCaseSheet: CaseSheet = {
  case: "",
  kinematicViscosity: null,
  units: "SI",
  reference: { length: null, symbol: "ℓ", speed: null },
  layout: "series",
  along: "x",
  columns: null,
  files: [],
  fit: {
    quantity: "auto",
    window: "auto",
    x0: null,
    n: null,
    residuals: "log",
    weights: "sampling",
    coordinate: "auto",
    otherX0: null,
  },
  kind: null,
  read: { separator: null, decimal: null, heading: null, step: null, times: "ask", missing: [] },
  zero: 0,
  simultaneous: "auto",
  periodic: "auto",
  startup: 0,
  extent: null,
  sensorLength: null,
  reduce: {
    integralScale: "zero-crossing",
    correlation: "biased",
    detrend: "mean",
    segment: null,
    taylorCorrection: true,
    dissipation: "auto",
    probes: "agreeing",
  },
  body: null,
  development: { tolerance: 0.1 },
  compare: { align: "x0", tolerance: 0.1, ...compareDefaults },
};
