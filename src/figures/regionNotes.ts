import type { Annotations } from "plotly.js";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions } from "./figureSpec.ts";
import { shownPart } from "./jointRegions.ts";
import { fewCases, shortened } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import { isInside } from "./pageShapes.ts";
import { type Panel, placeX, placeY } from "./panel.ts";
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
  return [
    ...over,
    ...fitted.map((one) => {
      const { text, ...place } = nameNote(one, panel);
      return pageNote(text, place.x, place.y, {
        xanchor: place.xanchor,
        yanchor: "middle",
        bgcolor: options.tokens.paper,
        font,
      });
    }),
  ];
}

/** To the right of a region where there is room, else to its left. */
function nameNote({ of, best, regions }: FittedRegion, panel: Panel) {
  const { n, x0 } = regions === null ? { n: [best.n], x0: [best.x0] } : shownPart(regions.outer, best.x0);
  const [low, high] = [Math.min(...n), Math.max(...n)];
  const text = escapeText(shortened(of.name));
  const right = placeX(panel, (low + 2 * high) / 3) + 3;
  const top = placeY(panel, Math.max(...x0));
  const bottom = placeY(panel, Math.min(...x0));
  return right + text.length * 1.3 < panel.box.right
    ? { text, x: right, y: top + (bottom - top) * 0.08, xanchor: "left" as const }
    : {
        text,
        x: placeX(panel, (2 * low + high) / 3) - 3,
        y: top + (bottom - top) * 0.62,
        xanchor: "right" as const,
      };
}
