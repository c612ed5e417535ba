import { labelOf } from "../core/catalogue.ts";
import { withReference } from "../core/symbolRuns.ts";
import { unitOf } from "../core/unitText.ts";
import { linearRange, present } from "./axisRange.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { jointRegionsOf, type Regions, shownPart } from "./jointRegions.ts";
import { uprightLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, type Panel } from "./panel.ts";
import { regionNotes } from "./regionNotes.ts";
import { type Best, bestFit, regionTraces } from "./regionTraces.ts";
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
  const reach = (key: "n" | "x0") =>
    fitted.flatMap(({ of, best, regions }) => [
      ...ends(of.decay, key),
      ...outlines(regions, best, key, detail),
    ]);
  const x = linearAxis(exponentRange(reach("n")), "<i>n</i>");
  const yRange = linearRange(reach("x0"), { margin: 0.12 });
  const y = linearAxis(yRange, originTitle(cases, options), { ticks: linearTicks(...yRange, 6) });
  const traces = fitted.flatMap((one) => regionTraces(one, ends, options, detail));
  const panel: Panel = { box, x, y, traces, letter };
  return {
    panel,
    decor: {
      shapes: namedExponents.flatMap(({ n }) => uprightLine(panel, n, options)),
      notes: regionNotes(fitted, panel, namedExponents, options),
    },
  };
}

function outlines(regions: Regions | null, best: Best, key: "n" | "x0", detail: boolean): readonly number[] {
  if (regions === null) return [];
  const shown = [regions.outer, ...(detail ? regions.ellipses : [])];
  return shown.flatMap((region) => shownPart(region, best.x0)[key]);
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
