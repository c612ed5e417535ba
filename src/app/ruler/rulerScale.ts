import type { Axis } from "../../sheet/workspace.ts";
import { niceTicks, type ScaleTicks } from "./niceTicks.ts";
import type { RulerCase } from "./rulerProps.ts";

/** px = at + perX · x: the straight line from a case's own x to the ruler. */
export interface LaneMap {
  readonly at: number;
  readonly perX: number;
}

export interface RulerScale {
  /** Ends, in the numbers the scale shows. */
  readonly from: number;
  readonly to: number;
  readonly width: number;
  readonly ticks: ScaleTicks;
  /** One for each case; null where the case has no place on this axis. */
  readonly maps: readonly (LaneMap | null)[];
}

/** What a case's x is shifted by, then divided by, to be shown; null: no place on this axis. */
interface Shown {
  readonly shift: number;
  readonly unit: number;
}

/** Px kept free left of a station (its bracket), of a flag (its label), of a whisker; and right of the last. */
const room = { station: 18, flag: 36, whisker: 8, right: 30 };
/** How far upstream of the stations the scale follows an origin or its whisker, in spans of the stations. */
const upstream = 0.35;

/**
 * The scale of all lanes: it holds every station, each virtual origin and its whisker unless they lie more
 * than a third of the stations' span upstream, and begins on a tenth of a mark, so that small shifts do not move it.
 */
export function rulerScale(cases: readonly RulerCase[], axis: Axis, width: number): RulerScale {
  const shown = cases.map((one) => shownAs(one, axis, cases));
  const [from, to] = extent(cases, shown, width);
  const ticks = niceTicks(from, to, width);
  const perShown = width / (to - from);
  const maps = shown.map((one) =>
    one === null ? null : { at: -(from + one.shift / one.unit) * perShown, perX: perShown / one.unit },
  );
  return { from, to, width, ticks, maps };
}

/** Whether distances are divided by ell on the aligned axis: only if every case has one. */
export function dividesByLength(cases: readonly RulerCase[]): boolean {
  return cases.length > 0 && cases.every((one) => one.length !== null);
}

function shownAs(one: RulerCase, axis: Axis, cases: readonly RulerCase[]): Shown | null {
  if (axis === "x") return { shift: 0, unit: 1 };
  const unit = dividesByLength(cases) ? (one.length ?? 1) : 1;
  if (axis === "x/ell") return { shift: 0, unit };
  return one.x0.value === null ? null : { shift: one.x0.value, unit };
}

/** A mark that the scale has to hold, and the px it needs on its left. */
interface Held {
  readonly at: number;
  readonly left: number;
}

function extent(
  cases: readonly RulerCase[],
  shown: readonly (Shown | null)[],
  width: number,
): readonly [number, number] {
  const on = (x: number, how: Shown) => (x - how.shift) / how.unit;
  const stations = cases.flatMap((one, i) => {
    const how = shown[i];
    return how === null ? [] : one.stations.map(({ x }) => on(x, how));
  });
  if (stations.length === 0) return [-0.1, 2];
  const first = Math.min(...stations);
  const last = Math.max(...stations);
  const span = last - first || Math.abs(last) || 1;
  const furthest = first - upstream * span;
  const origins = cases.flatMap((one, i): Held[] => {
    const how = shown[i];
    if (how === null || one.x0.value === null || one.law === null) return [];
    const low = one.x0.low;
    const flag = { at: on(one.x0.value, how), left: room.flag };
    return low === null ? [flag] : [flag, { at: on(low, how), left: room.whisker }];
  });
  const held = [{ at: first, left: room.station }, ...origins];
  const lowest = Math.max(furthest, Math.min(...held.map(({ at }) => at)));
  const perPx = (last - lowest || span) / Math.max(1, width - room.whisker - room.right);
  const from = Math.min(...held.map(({ at, left }) => Math.max(at, furthest) - left * perPx));
  const to = last + room.right * perPx;
  const grain = niceTicks(from, to, width).step / 10;
  return [Math.floor(from / grain) * grain, to];
}
