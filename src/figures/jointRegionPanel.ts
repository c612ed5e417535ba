import { labelOf } from "../core/catalogue.ts";
import { withReference } from "../core/symbolRuns.ts";
import { unitOf } from "../core/unitText.ts";
import { linearRange, present } from "./axisRange.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { jointRegionsOf, shownPart } from "./jointRegions.ts";
import { uprightLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, type Panel } from "./panel.ts";
import { regionNotes } from "./regionNotes.ts";
import { bestFit, detailTraces, type FittedRegion, intervalBars, regionTraces } from "./regionTraces.ts";
import { isDivided, referenceSymbol, titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";
import { linearTicks } from "./ticks.ts";

/** Exponents that theories name; drawn where they fall inside the panel. */
export const namedExponents = [
  { n: 1, text: "1" },
  { n: 6 / 5, text: "6/5" },
  { n: 10 / 7, text: "10/7" },
  { n: 5 / 2, text: "5/2" },
];

/**
 * Joint 68 % and 95 % regions of n and x0/ℓ, one case each, with the best fits.
 * @param detail with the ellipses of the covariance and the refits beside them
 */
export function jointRegionPanel(
  cases: readonly FigureCase[],
  box: Box,
  letter: string,
  options: FigureOptions,
  detail = false,
): { panel: Panel; decor: Partial<Decor> } {
  const fitted = cases.flatMap((of) => {
    const best = bestFit(of);
    return best === null ? [] : [{ of, best, regions: jointRegionsOf(of) }];
  });
  const reach = (key: "n" | "x0") => fitted.flatMap((one) => shownReach(one, key, detail));
  const x = linearAxis(exponentRange(reach("n")), "<i>n</i>");
  const yRange = linearRange(reach("x0"), { margin: 0.12 });
  const y = linearAxis(yRange, originTitle(cases, options), { ticks: linearTicks(...yRange, 6) });
  const traces = fitted.flatMap((one) =>
    detail
      ? detailTraces(one, options)
      : [...regionTraces(one, options), ...intervalBars(one, ends, options)],
  );
  const panel: Panel = { box, x, y, traces, letter };
  return {
    panel,
    decor: {
      shapes: namedExponents.flatMap(({ n }) => uprightLine(panel, n, options)),
      notes: regionNotes(fitted, panel, namedExponents, options),
    },
  };
}

/** Beyond a region so many times its own width is still shown of the bars of the adopted intervals. */
const barsShown = 1;

/** What the axis has to hold of one case: its regions, and the bars as far as they are near them. */
function shownReach(
  { of, best, regions }: FittedRegion,
  key: "n" | "x0",
  detail: boolean,
): readonly number[] {
  const adopted = ends(of.decay, key);
  if (regions === null) return adopted;
  const outlines = [regions.outer, ...(detail ? regions.ellipses : [])];
  const own = outlines.flatMap((region) => shownPart(region, best.x0)[key]);
  if (detail) return own;
  const [low, high] = [Math.min(...own), Math.max(...own)];
  const room = barsShown * (high - low);
  return [...own, ...adopted.map((end) => Math.min(Math.max(end, low - room), high + room))];
}

/** Holds the regions and, where they are near, the exponents that theories name. */
function exponentRange(values: readonly number[]): [number, number] {
  const [low, high] = linearRange(values, { margin: 0.12 });
  const near = namedExponents.map(({ n }) => n).filter((n) => n > low - 0.15 && n < high + 0.15);
  return linearRange([low, high], { include: near, margin: 0.07 });
}

/** Value, lower and upper end of the adopted n, or of x0/ℓ. */
function ends(decay: FigureCase["decay"], key: "n" | "x0"): number[] {
  if (!decay?.law || decay[key].value === null) return [];
  const { value, low, high } = decay[key];
  const unit = key === "n" ? 1 : decay.law.length;
  return present([value, low, high]).map((end) => end / unit);
}

/** "x0/M", with its unit where the cases have no length in common. */
export function originTitle(cases: readonly FigureCase[], { units, along }: FigureOptions): string {
  const label = labelOf(along === "t" ? "t0" : "x0");
  const divided = isDivided(cases);
  const over = divided ? `/${symbolHtml(withReference([{ text: "ℓ" }], referenceSymbol(cases)))}` : "";
  return titleWithUnit(symbolHtml(label.symbol) + over, divided ? "" : unitOf(label.dimension, units));
}
