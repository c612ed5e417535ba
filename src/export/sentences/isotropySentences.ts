import type { StationResult } from "../../core/stationResult.ts";
import { isUsed } from "../../figures/windowOf.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, percent, position, symbolOf, valueWithInterval } from "./shownValue.ts";
import { chained, reason } from "./words.ts";

type Ratio = "isotropy_uv" | "isotropy_uw";

/** u′/v′ at the end of the window, and from where on it stays within the tolerance of one. */
export function isotropySentences(cases: readonly SentenceCase[], tolerance: number): readonly Sentence[] {
  const measured = cases.filter((of) => of.stations.some(({ isotropy_uv }) => isotropy_uv.value !== null));
  const parts = measured.map((of, i) => ratioPart(of, "isotropy_uv", tolerance, i === 0));
  const missing = cases
    .filter((of) => !measured.includes(of) && of.stations.length > 0)
    .map((of) => {
      const { isotropy_uv } = of.stations[0];
      const why = isotropy_uv.value === null ? isotropy_uv.why : "";
      return say`${symbolOf("isotropy_uv")} cannot be given for ${caseOf(of)}: ${reason(why)}.`;
    });
  return [...(parts.length === 0 ? [] : [say`${chained(parts)}.`]), ...missing];
}

function ratioPart(of: SentenceCase, key: Ratio, tolerance: number, first: boolean): Sentence {
  const last = lastWith(of, key);
  const where = last === null ? "" : ` at ${position(last.x, of)}`;
  const value = last === null ? [] : say`${symbolOf(key)} is ${valueWithInterval(last[key], key, of.units)}`;
  const from = settledFrom(of.stations, key, tolerance);
  const within = percent(tolerance);
  const settled =
    from === null
      ? say`and is not within ${within} of one there`
      : say`and stays within ${within} of one from ${{ kind: "strong", text: position(from, of) }} on`;
  return say`${first ? "In" : "in"} ${caseOf(of)} ${value}${where} ${settled}`;
}

/** The last station of the window that has the ratio; of all stations where there is no window. */
function lastWith(of: SentenceCase, key: Ratio): StationResult | null {
  const there = of.stations.filter((station) => station[key].value !== null);
  const inside = there.filter(({ x }) => isUsed(of, x));
  const pool = inside.length > 0 ? inside : there;
  return pool[pool.length - 1] ?? null;
}

/** The first x from which every station downstream lies within the tolerance of one; null where the last does not. */
export function settledFrom(
  stations: readonly StationResult[],
  key: Ratio,
  tolerance: number,
): number | null {
  const there = stations.flatMap((station) => {
    const { value } = station[key];
    return value === null ? [] : [{ x: station.x, value }];
  });
  const inside = ({ value }: { value: number }) => value <= 1 + tolerance && value >= 1 / (1 + tolerance);
  const lastOutside = there.findLastIndex((one) => !inside(one));
  return there[lastOutside + 1]?.x ?? null;
}
