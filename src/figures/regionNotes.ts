import type { Annotations } from "plotly.js";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions } from "./figureSpec.ts";
import { shownPart } from "./jointRegions.ts";
import { fewCases, shortened } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import { isInside } from "./pageShapes.ts";
import { type Panel, placeX, placeY } from "./panel.ts";
import { pointsOf } from "./pointsOf.ts";
import type { FittedRegion } from "./regionTraces.ts";
import { escapeText } from "./symbolHtml.ts";

/** Names of the exponents over the frame, and of the cases beside their regions. */
export function regionNotes(
  fitted: readonly FittedRegion[],
  panel: Panel,
  named: readonly { readonly n: number; readonly text: string }[],
  options: FigureOptions,
): Partial<Annotations>[] {
  const { numeral } = drawingOf(options);
  const font = { ...numeral, color: options.tokens.ink2 };
  const over = named
    .filter(({ n }) => isInside(panel.x.range, n))
    .map(({ n, text }) =>
      pageNote(text, placeX(panel, n), panel.box.top + 1.8, { xanchor: "center", yanchor: "middle", font }),
    );
  // Many names would hide the regions; the legend of the other panel has them too.
  if (fitted.length > fewCases) return over;
  const drawn = pointsOf(panel);
  const placed: Place[] = [];
  for (const one of fitted) placed.push(freePlace(one, panel, drawn, placed));
  return [
    ...over,
    ...placed.map(({ text, left, y }) =>
      pageNote(text, left, y, { xanchor: "left", yanchor: "middle", font }),
    ),
  ];
}

interface Place {
  readonly text: string;
  readonly left: number;
  readonly y: number;
  readonly width: number;
}

const letterMm = 1.3;
const lineMm = 3;
/** A name over another name, or outside the frame, is worse than one over any number of points. */
const forbidden = 1e4;

/** Of some places beside a region, those in the empty corners of its slant first, the one that covers least. */
function freePlace(
  { of, best, regions }: FittedRegion,
  panel: Panel,
  drawn: readonly (readonly [number, number])[],
  others: readonly Place[],
): Place {
  const { n, x0 } = regions === null ? { n: [best.n], x0: [best.x0] } : shownPart(regions.outer, best.x0);
  const [left, right] = [placeX(panel, Math.min(...n)), placeX(panel, Math.max(...n))];
  const [bottom, top] = [placeY(panel, Math.min(...x0)), placeY(panel, Math.max(...x0))];
  const name = shortened(of.name);
  const width = name.length * letterMm;
  const inwards = (right - left) / 3;
  const candidates = [
    { left: right - inwards + 3, y: top - 0.08 * (top - bottom) },
    { left: left + inwards - 3 - width, y: bottom + 0.38 * (top - bottom) },
    ...[top, (top + bottom) / 2, bottom].map((y) => ({ left: right + 2, y })),
    ...[top, (top + bottom) / 2, bottom].map((y) => ({ left: left - 2 - width, y })),
    ...[top + lineMm, bottom - lineMm].map((y) => ({ left: (left + right - width) / 2, y })),
  ];
  const cost = (at: { left: number; y: number }) => {
    const near = (y: number) => Math.abs(y - at.y);
    const covered = drawn.filter(
      ([x, y]) => x > at.left - 1 && x < at.left + width + 1 && near(y) < lineMm / 2,
    );
    const clash = others.some(
      (other) =>
        near(other.y) < lineMm && at.left < other.left + other.width + 1 && other.left < at.left + width + 1,
    );
    const { box } = panel;
    const outside =
      at.left < box.left + 1 ||
      at.left + width > box.right - 1 ||
      at.y > box.top - 2 ||
      at.y < box.bottom + 2;
    return covered.length + (clash ? forbidden : 0) + (outside ? forbidden : 0);
  };
  const costs = candidates.map(cost);
  return { text: escapeText(name), width, ...candidates[costs.indexOf(Math.min(...costs))] };
}
