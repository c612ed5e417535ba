import { ReductionFailure } from "../../failure.ts";
import { jointLayout } from "../../signal/jointMoments.ts";
import { mergeJoint } from "../../signal/mergeJoint.ts";
import { shiftJoint } from "../../signal/shiftJoint.ts";
import { blockFields, differenceFields } from "../blockFields.ts";
import type { Component } from "../stationPart.ts";
import { equalSpacing, type LineDirection, type LinePart } from "./linePart.ts";

/** All lines of one station put together, about their common mean. */
export interface JoinedLines {
  /** By time, then place across; in an order that does not depend on that of arrival. */
  readonly parts: readonly LinePart[];
  readonly along: LineDirection;
  readonly components: readonly Component[];
  readonly points: Float64Array;
  readonly spacing: number | null;
  /** Lines of one snapshot. */
  readonly across: LinePart["across"];
  readonly snapshots: number;
  readonly start: number;
  readonly end: number;
  /** Values of all components, each counted once. */
  readonly samples: number;
  readonly means: readonly number[];
  readonly fields: readonly string[];
  /** A row a block: sums about the common mean and the parts' own; rows and sums add up plainly. */
  readonly rows: readonly Float64Array[];
  readonly blockSnapshots: number;
}

/**
 * @throws different-points  files whose lines have other points or components
 * @throws backward-time     the same line at overlapping times in two files
 */
export function joinLines(given: readonly LinePart[]): JoinedLines {
  const parts = [...given].sort(byTime);
  for (const part of parts.slice(1)) sameLines(parts[0], part);
  const sheets = together(parts);
  refuseOverlap(parts);
  const { along, components, points } = parts[0];
  const layout = jointLayout(components.length);
  const whole = new Float64Array(layout.length);
  for (const { blocks } of parts) {
    for (let row = 0; row < blocks.rows; row++) {
      mergeJoint(whole, blocks.moments.subarray(row * layout.length, (row + 1) * layout.length), layout);
    }
  }
  const means = components.map((_, c) => whole[layout.mean + c]);
  return {
    ...{ parts, along, components, points, means },
    spacing: equalSpacing(points),
    across: sheets[0].flatMap((part) => part.across),
    snapshots: sheets.reduce((sum, [first]) => sum + first.snapshots, 0),
    start: parts[0].start,
    end: Math.max(...parts.map((part) => part.end)),
    samples: whole[0],
    fields: [...blockFields(components).slice(0, -differenceFields.length), ...parts[0].blocks.fields],
    rows: sheets.flatMap((sheet) => addedRows(sheet, means)),
    blockSnapshots: parts[0].blocks.size,
  };
}

function byTime(a: LinePart, b: LinePart): number {
  return (
    a.start - b.start ||
    a.end - b.end ||
    (a.across[0].y ?? 0) - (b.across[0].y ?? 0) ||
    (a.across[0].z ?? 0) - (b.across[0].z ?? 0) ||
    (a.origin.file < b.origin.file ? -1 : 1)
  );
}

/** Parts of the same snapshots: parallel lines that came in files of their own. */
function together(parts: readonly LinePart[]): LinePart[][] {
  const sheets: LinePart[][] = [];
  for (const part of parts) {
    const open = sheets.at(-1);
    const same = (other: LinePart) =>
      other.start === part.start && other.end === part.end && other.snapshots === part.snapshots;
    if (open && same(open[0])) open.push(part);
    else sheets.push([part]);
  }
  return sheets;
}

const placeOf = ({ across }: LinePart) => across.map(({ y, z }) => `${y} ${z}`).join();

/** One line cannot have two values at one time. */
function refuseOverlap(parts: readonly LinePart[]): void {
  const last = new Map<string, LinePart>();
  for (const part of parts) {
    const before = last.get(placeOf(part));
    if (before && part.start <= before.end) {
      throw new ReductionFailure(
        "backward-time",
        {
          message: `The same line is there twice at x = ${part.origin.x}: its times overlap with those in ${before.origin.file}`,
          found: `snapshots from t = ${part.start}`,
          expected: `later ones than t = ${before.end}`,
          remedy: "Cut the older run where the newer begins, or leave one of the two out.",
        },
        { file: part.origin.file },
      );
    }
    last.set(placeOf(part), part);
  }
}

function sameLines(first: LinePart, other: LinePart): void {
  const span = Math.abs(first.points[first.points.length - 1] - first.points[0]) || 1;
  const alike =
    first.along === other.along &&
    first.components.join() === other.components.join() &&
    first.points.length === other.points.length &&
    first.points.every((point, i) => Math.abs(point - other.points[i]) <= 1e-6 * span);
  if (alike) return;
  const told = (part: LinePart) =>
    `${part.points.length} points along ${part.along} with ${part.components.join(", ")}`;
  throw new ReductionFailure(
    "different-points",
    {
      message: `The lines at x = ${first.origin.x} do not have the same points as those in ${first.origin.file}`,
      found: told(other),
      expected: told(first),
      remedy: "Sample every snapshot at the same points, or leave the file out.",
    },
    { file: other.origin.file },
  );
}

/** Rows of parallel lines added up block by block: they are left out together. */
function addedRows(sheet: readonly LinePart[], means: readonly number[]): Float64Array[] {
  const [first, ...others] = sheet.map((part) => plainRows(part, means));
  for (const rows of others) {
    rows.forEach((row, block) => {
      for (let i = 0; i < row.length; i++) first[block][i] += row[i];
    });
  }
  return first;
}

function plainRows({ blocks, components }: LinePart, means: readonly number[]): Float64Array[] {
  const layout = jointLayout(components.length);
  const width = blocks.fields.length;
  return Array.from({ length: blocks.rows }, (_, block) => {
    const row = new Float64Array(layout.length + width);
    const moments = blocks.moments.subarray(block * layout.length, (block + 1) * layout.length);
    shiftJoint(moments, layout, means, row.subarray(0, layout.length));
    row.set(blocks.sums.subarray(block * width, (block + 1) * width), layout.length);
    return row;
  });
}
