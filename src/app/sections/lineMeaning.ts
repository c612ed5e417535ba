import { lineComponents } from "../../core/station/lines/lineFields.ts";
import type { LineFacts, StationFacts } from "../../core/stationResult.ts";

const alongTheLine =
  /^(T_int|L11|lambda|gradient$|gradient_u|gradient_diff|epsilon_u-|Re_|C_epsilon|S_dudx|E11|local_slope)/;
const across = [/^(L_v|K_v|gradient_v|E22)/, /^(L_w|K_w|gradient_w|E33)/];

/** What a label's component is on lateral lines, in words; null where the station has none, or the label no component. */
export function lineMeaning(key: string, { lines }: Pick<StationFacts, "lines">): string | null {
  if (lines === undefined || lines.along === "x") return null;
  if (/^(step|tauStar|lagLimit)$/.test(key)) return "a separation along the line over U";
  const [own, ...others] = lineComponents(lines.along);
  if (alongTheLine.test(key)) return `formed with ${own}, the component along ${lines.along}, in place of u`;
  const i = across.findIndex((pattern) => pattern.test(key));
  if (i < 0) return null;
  return `formed with ${others[i]}, a component across the line, against ${own} along ${lines.along}`;
}

/** The same for all labels of a table at once. */
export function lineMeanings(along: LineFacts["along"]): string | null {
  if (along === "x") return null;
  const [own, first, second] = lineComponents(along);
  return `lines along ${along}: ${own} is the component along the line and stands for u in L11, λ_g, gradients and E₁₁; L_v, K_v and E₂₂ are those of ${first}, L_w, K_w and E₃₃ those of ${second}, both across it`;
}
