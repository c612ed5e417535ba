import type { ComparedQuantity, Comparison } from "../core/comparison.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { type ComparedPair, comparedPairs, laidCases } from "./comparedPair.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { overlayPanels } from "./overlayPanels.ts";
import { type Box, joinDecor } from "./panel.ts";
import { kolmogorovCurves, spectralPanels } from "./spectralPanels.ts";

const gapMm = 6;
const [upperMm, lowerMm] = [47, 26];
const [room, titleMm] = [{ left: 13.6, right: 2.2, top: 2.4 }, 10.2];
/** Between two panels of one axis, and between two that each have their own. */
const [joinedMm, apartMm] = [2.4, 12.2];

/**
 * Cases laid over one another: (a) one quantity of all, (b) its ratio to that of the case held against; and where there
 * are spectra, beside them (or below) (c) those of one place, (d) their distance along the stream.
 */
export function overlayFigure(
  comparisons: readonly Comparison[],
  cases: readonly FigureCase[],
  quantity: ComparedQuantity,
  options: FigureOptions,
): FigureSpec {
  const pairs = comparedPairs(comparisons, cases).filter(({ comparison }) => comparison.overlap !== null);
  const curves = kolmogorovCurves(pairs);
  const places = placePanels(curves.length > 0, options);
  if (pairs.length === 0)
    return assembleFigure(
      { ...places, key: "overlay", panels: [], decor: joinDecor(), table: { heading: [], rows: [] } },
      options,
    );
  const over = overlayPanels(pairs, quantity, places.overlay, options);
  const spectra = places.spectra === null ? [] : spectralPanels(pairs, curves, places.spectra, options);
  const all = laidCases(pairs).map(({ of }) => of);
  return assembleFigure(
    {
      key: "overlay",
      widthMm: places.widthMm,
      heightMm: places.heightMm,
      panels: [...over.panels, ...spectra],
      decor: joinDecor(over.decor, legend(caseRows(all), over.panels[0], options)),
      table: overlayTable(pairs, quantity),
    },
    options,
  );
}

interface Places {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly overlay: readonly [Box, Box];
  readonly spectra: readonly [Box, Box] | null;
}

/** Two columns of two panels, or one; stacked, or in a narrow figure, all below one another. */
function placePanels(withSpectra: boolean, { widthMm, stacked }: FigureOptions): Places {
  const beside = withSpectra && !stacked && widthMm >= 120;
  const width = beside ? (widthMm - gapMm) / 2 : widthMm;
  const heightMm = titleMm + lowerMm + joinedMm + upperMm + room.top;
  const column = (left: number, base: number, gap: number): readonly [Box, Box] => {
    const sides = { left: left + room.left, right: left + width - room.right };
    const split = base + titleMm + lowerMm;
    return [
      { ...sides, bottom: split + gap, top: base + heightMm - room.top },
      { ...sides, bottom: base + titleMm, top: split },
    ];
  };
  if (!withSpectra) return { widthMm, heightMm, overlay: column(0, 0, joinedMm), spectra: null };
  if (beside)
    return {
      widthMm,
      heightMm,
      overlay: column(0, 0, joinedMm),
      spectra: column(width + gapMm, 0, apartMm),
    };
  return {
    widthMm,
    heightMm: 2 * heightMm,
    overlay: column(0, heightMm, joinedMm),
    spectra: column(0, 0, apartMm),
  };
}

/** The ratios along the stream, then the distances of the spectra: both by pair. */
function overlayTable(pairs: readonly ComparedPair[], quantity: ComparedQuantity): FigureTable {
  const heading = ["first", "second", "what", "at", "value", "low", "high"];
  return {
    heading,
    rows: pairs.flatMap(({ comparison: { cases, quantities, spectra } }) => {
      const { xi, ratio, low, high } = quantities[quantity].curve;
      return [
        ...xi.map((at, i) => [...cases, `ratio of ${quantity}`, at, ratio[i], low[i], high[i]]),
        ...spectra.pairs.map((pair) => [
          ...cases,
          "distance of spectra, chance and 95 % of chance",
          pair.xi[1],
          pair.distance.value,
          pair.chance,
          pair.chance_95,
        ]),
      ];
    }),
  };
}
