import type { ReduceSettings } from "../../stationResult.ts";
import type { JoinedLines } from "./joinLines.ts";

/** Mean-square step between neighbours below which, as a share of 2 uu, ends can be told from strangers. */
const resolvedShare = 0.25;

/**
 * Whether a line closes on itself. Told by the sheet, or found: the step from the last point to the first is then
 * like one between neighbours, and else like one between strangers, whose mean square is 2 uu. The border is the
 * geometric mean of the two. Lines too coarse to tell neighbours from strangers count as not periodic.
 */
export function isPeriodic(lines: JoinedLines, settings: ReduceSettings): boolean {
  if (settings.periodic !== "auto") return settings.periodic;
  if (lines.spacing === null || lines.along === "x") return false;
  const sum = (name: string) => {
    const at = lines.fields.indexOf(name);
    return lines.rows.reduce((total, row) => total + row[at], 0);
  };
  const steps = sum("lines") * (lines.points.length - 1);
  const weight = sum("weight");
  let near = 0;
  let ends = 0;
  for (const name of lines.components) {
    // each component measured by its own variance, so that none outweighs the others
    const variance = sum(name + name) / weight;
    if (!(variance > 0)) continue;
    near += sum(`near_${name}`) / steps / variance / 2 / lines.components.length;
    ends += sum(`ends_${name}`) / sum("lines") / variance / 2 / lines.components.length;
  }
  return near < resolvedShare && ends < Math.sqrt(near);
}
