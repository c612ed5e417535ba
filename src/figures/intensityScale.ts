import { drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { formatNumber } from "./formatNumber.ts";
import { pageNote } from "./pageNote.ts";
import { pageLine } from "./pageShapes.ts";
import { type Decor, type Panel, placeY } from "./panel.ts";

const labelled = [0.1, 0.2, 0.3, 0.5, 1, 2, 3, 5, 10, 20, 30, 50];
const marked = [...Array(9).keys()].flatMap((i) => [0.1, 1, 10].map((ten) => (i + 1) * ten));

/** What the fitted quantity is, where the cases agree on it. */
export function commonQuantity(cases: readonly FigureCase[]): "k" | "uu" | "q" | "mixed" {
  const kinds = new Set(cases.map(({ decay }) => decay?.quantity ?? "q"));
  return kinds.size === 1 ? [...kinds][0] : "mixed";
}

/**
 * A second scale at the right of a panel of k/U² (or ⟨u²⟩/U²): Tu in per cent, Tu = √(2k/3)/U (or u′/U).
 * None where the quantity is not an energy.
 */
export function intensityScale(
  panel: Panel,
  quantity: ReturnType<typeof commonQuantity>,
  options: FigureOptions,
): Partial<Decor> {
  if (quantity !== "k" && quantity !== "uu") return {};
  const factor = quantity === "k" ? 1.5 : 1;
  const { box, y } = panel;
  const energy = (percent: number) => factor * (percent / 100) ** 2;
  const inside = (percent: number) => energy(percent) >= y.range[0] && energy(percent) <= y.range[1];
  const { pt, numeral, symbol } = drawingOf(options);
  const line = { color: options.tokens.ink, width: pt(0.5) };
  const majors = labelled.filter(inside);
  const tick = (percent: number, lengthMm: number) => {
    const at = placeY(panel, energy(percent));
    return { ...pageLine([box.right - lengthMm, at], [box.right, at], line), layer: "above" as const };
  };
  return {
    shapes: [
      ...majors.map((percent) => tick(percent, 1.2)),
      ...marked.filter(inside).map((percent) => tick(percent, 0.7)),
    ],
    notes: [
      ...majors.map((percent) =>
        pageNote(formatNumber(percent, percent < 1 ? 1 : 0), box.right + 1, placeY(panel, energy(percent)), {
          xanchor: "left",
          yanchor: "middle",
          font: numeral,
        }),
      ),
      pageNote(
        quantity === "k" ? "<i>Tu</i> (%)" : "<i>u</i>′/<i>U</i> (%)",
        box.right + 7.4,
        (box.top + box.bottom) / 2,
        {
          xanchor: "center",
          yanchor: "middle",
          textangle: "-90",
          font: symbol,
        },
      ),
    ],
  };
}
