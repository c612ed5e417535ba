import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { sources } from "../bibliography.ts";
import type { MethodsPart } from "../methodsText.ts";
import type { MethodsCase } from "./methodsCase.ts";

const assumptions = {
  none: "",
  axisymmetric: ", w taken like v",
  isotropic: ", isotropy assumed",
} as const;

/** How the law was fitted: what, where, with which weights and intervals. */
export function decayMethods({ settings, decay }: MethodsCase): MethodsPart {
  if (decay === null || decay.law === null) return { text: "", sources: [] };
  const { along, units, fit } = settings;
  const unit = unitOf(along === "t" ? "T" : "L", units);
  const place = (x: number) => withUnit(formatPosition(x), unit);
  const origin = along === "t" ? "t0" : "x0";
  const what =
    decay.quantity === "q" ? "the quantity given" : `${decay.quantity}/Us²${assumptions[decay.assumption]}`;
  const held = [
    ...(fit.x0 === null ? [] : [`${origin} held at ${place(fit.x0)}`]),
    ...(fit.n === null ? [] : [`n held at ${formatDigits(fit.n, 3)}`]),
  ];
  const sentences = [
    `The law q = A ((${along} − ${origin})/ℓ)^(−n) was fitted to ${what} by least squares of ${decay.residuals === "log" ? "ln q" : "q"}, ${decay.weights === "sampling" ? "weighted with the sampling errors of the stations" : "with equal weights"}${held.length > 0 ? `, ${held.join(" and ")}` : ""}.`,
    decay.coordinate === "flight" ? "Since the mean velocity varies, the time of flight stands for x." : "",
    `The window is ${along} = ${formatPosition(decay.window[0])} to ${place(decay.window[1])} with ${decay.stations} stations, ${decay.windowChosen === "auto" ? `chosen automatically: ${decay.windowReason.replace(/\.$/, "")}.` : "given."}`,
    `Intervals of n and ${origin} are from the profile of the residuals${decay.windowChosen === "auto" ? ", and are the union over later starts of the window" : ""}${decay.together == null ? "" : "; the records were sampled together, and the profile was widened by a jackknife over their common blocks"}.`,
  ];
  return {
    text: sentences.filter((sentence) => sentence !== "").join(" "),
    sources: [sources.pope, sources.saffman],
  };
}
