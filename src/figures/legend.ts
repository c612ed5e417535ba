import { type Drawing, drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { letterCorner } from "./letterCorner.ts";
import { pageNote } from "./pageNote.ts";
import type { Box, Decor, Panel } from "./panel.ts";
import { pointsOf } from "./pointsOf.ts";
import { caseLine, loneMarker } from "./stationTrace.ts";
import { escapeText } from "./symbolHtml.ts";

const rowMm = 3.4;
const lineMm = 6;
/** About the mean width of a letter at 7.5 pt. */
const letterMm = 1.27;
const letterRoomMm = 2.6;
const longestName = 26;
/** With more cases than this, names are cut short sooner. */
export const fewCases = 4;
const crowdedName = 14;

/** One row: a line with a marker, and a name. */
export interface LegendRow {
  readonly mark: number;
  readonly text: string;
  /** A station's letter before the text, set as a symbol. */
  readonly letter?: string;
  readonly marker: boolean;
  readonly weightPt: number;
}

export function caseRows(cases: readonly FigureCase[]): LegendRow[] {
  const longest = cases.length > fewCases ? crowdedName : longestName;
  return cases.map(({ name, mark }) => ({
    mark,
    text: escapeText(shortened(name, longest)),
    marker: true,
    weightPt: 0.95,
  }));
}

export function shortened(name: string, longest = longestName): string {
  return name.length > longest ? `${name.slice(0, longest - 1)}…` : name;
}

/** The legend in that corner of a panel where it covers fewest of its points, upper right first. */
export function legend(rows: readonly LegendRow[], panel: Panel, options: FigureOptions): Decor {
  const drawing = drawingOf(options);
  const longest = Math.max(...rows.map(({ text }) => text.replace(/<[^>]*>/g, "").length), 0);
  const lettered = rows.some(({ letter }) => letter !== undefined) ? letterRoomMm : 0;
  const size = { width: lineMm + 2 + lettered + longest * letterMm, height: rows.length * rowMm };
  const corner = emptiestCorner(panel, size);
  const traces = rows.flatMap(({ mark, marker, weightPt }, i) => {
    const y = corner.top - (i + 0.5) * rowMm;
    const line = caseLine([corner.left, corner.left + lineMm], [y, y], mark, options, {
      weightPt,
      dashed: true,
    });
    return marker ? [line, loneMarker({ x: corner.left + lineMm / 2, y }, mark, options)] : [line];
  });
  const notes = rows.flatMap(({ text, letter }, i) => {
    const y = corner.top - (i + 0.5) * rowMm;
    const at = (what: string, x: number, font: Drawing["symbol"]) =>
      pageNote(what, corner.left + lineMm + 1.4 + x, y, {
        xanchor: "left",
        yanchor: "middle",
        font: { ...font, color: options.tokens.ink2 },
      });
    return letter === undefined
      ? [at(text, 0, drawing.numeral)]
      : [at(`<i>${letter}</i>`, 0, drawing.symbol), at(text, letterRoomMm, drawing.numeral)];
  });
  return { traces, notes, shapes: [] };
}

/** Corners first, upper right before all; else the first free place down the right side, the middle, the left. */
function emptiestCorner(panel: Panel, size: { width: number; height: number }): Box {
  const { box } = panel;
  const places = pointsOf(panel);
  const letter = panel.letter === "" ? null : letterCorner(panel);
  if (letter !== null) places.push([letter.x, letter.y], [letter.x + 3.4, letter.y]);
  const [left, right] = [box.left + 2.4, box.right - 2.4 - size.width];
  const [upper, lower] = [box.top - 1.8, box.bottom + 2 + size.height];
  const rows = Array.from({ length: 12 }, (_, i) => upper + ((lower - upper) * i) / 11);
  const candidates = [
    ...[
      [right, upper],
      [left, lower],
      [right, lower],
      [left, upper],
    ],
    ...[right, (left + right) / 2, left].flatMap((x) => rows.map((y) => [x, y])),
  ].map(([x, y]): Box => ({ left: x, right: x + size.width, top: y, bottom: y - size.height }));
  const covered = candidates.map(
    (one) =>
      places.filter(
        ([x, y]) => x > one.left - 1.4 && x < one.right + 1.4 && y > one.bottom - 1 && y < one.top + 1,
      ).length,
  );
  return candidates[covered.indexOf(Math.min(...covered))];
}
