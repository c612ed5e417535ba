import type { RouteKey } from "../core/decayArgument.ts";

/** Routes to n and the origin in a few words, in the markup of a figure's text. */
const routeNames: Readonly<Record<RouteKey, string>> = {
  joint: "joint fit",
  "origin-scan": "scan of <i>x</i><sub>0</sub>",
  "straight-line": "straight line, <i>n</i> held",
  lambda: "line of <i>Λ</i><sup>2</sup>",
  epsilon: "fall of <i>ε</i>",
  "origin-zero": "<i>x</i><sub>0</sub> held at 0",
  "origin-held": "<i>x</i><sub>0</sub> held as given",
  "origin-other": "<i>x</i><sub>0</sub> held elsewhere",
  flight: "along time of flight",
  "along-x": "along <i>x</i>",
};

/** The name of a route where the origin is a place, or a time. */
export function routeName(key: RouteKey, along: "x" | "t"): string {
  return along === "t" ? routeNames[key].replace("<i>x</i><sub>0", "<i>t</i><sub>0") : routeNames[key];
}
