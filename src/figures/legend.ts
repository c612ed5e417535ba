import { type Drawing, drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { letterCorner } from "./letterCorner.ts";
import { pageNote } from "./pageNote.ts";
import { type Box, type Decor, joinDecor, type Panel } from "./panel.ts";
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
/** Rows that a panel can spare the room for. */
const mostInside = 6;
const columnGap = 4;

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

/**
 * The legend in that corner of a panel where it covers fewest of its points, upper right first; more rows than a panel
 * can spare stand in columns below the figure.
 */
export function legend(rows: readonly LegendRow[], panel: Panel, options: FigureOptions): Decor {
  if (rows.length > mostInside) return legendBelow(rows, options);
  const width = rowWidth(rows);
  const corner = emptiestCorner(panel, { width, height: rows.length * rowMm });
  return joinDecor(
    ...rows.map((row, i) => legendRow(row, corner.left, corner.top - (i + 0.5) * rowMm, options)),
  );
}

/** In as many columns as the figure is wide, top to bottom, then left to right. */
export function legendBelow(rows: readonly LegendRow[], options: FigureOptions): Decor {
  const width = rowWidth(rows);
  const columns = Math.max(Math.floor((options.widthMm - columnGap) / (width + columnGap)), 1);
  const deep = Math.ceil(rows.length / columns);
  const placed = rows.map((row, i) =>
    legendRow(
      row,
      columnGap + Math.floor(i / deep) * (width + columnGap),
      -((i % deep) + 0.5) * rowMm,
      options,
    ),
  );
  return joinDecor(...placed, { belowMm: deep * rowMm + 1 });
}

function rowWidth(rows: readonly LegendRow[]): number {
  const longest = Math.max(...rows.map(({ text }) => text.replace(/<[^>]*>/g, "").length), 0);
  const lettered = rows.some(({ letter }) => letter !== undefined) ? letterRoomMm : 0;
  return lineMm + 2 + lettered + longest * letterMm;
}

function legendRow(row: LegendRow, left: number, y: number, options: FigureOptions): Partial<Decor> {
  const { mark, marker, weightPt, text, letter } = row;
  const drawing = drawingOf(options);
  const line = caseLine([left, left + lineMm], [y, y], mark, options, { weightPt, dashed: true });
  const at = (what: string, x: number, font: Drawing["symbol"]) =>
    pageNote(what, left + lineMm + 1.4 + x, y, {
      xanchor: "left",
      yanchor: "middle",
      font: { ...font, color: options.tokens.ink2 },
    });
  return {
    traces: marker ? [line, loneMarker({ x: left + lineMm / 2, y }, mark, options)] : [line],
    notes:
      letter === undefined
        ? [at(text, 0, drawing.numeral)]
        : [at(`<i>${letter}</i>`, 0, drawing.symbol), at(text, letterRoomMm, drawing.numeral)],
  };
}

/** Corners first, upper right before all; else the first free place down the right side, the middle, the left. */
function emptiestCorner(panel: Panel, size: { width: number; height: number }): Box {
  const { box } = panel;
  const places = [...pointsOf(panel)];
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
