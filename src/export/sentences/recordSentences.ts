import type { StationResult } from "../../core/stationResult.ts";
import { isUsed } from "../../figures/windowOf.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf } from "./shownValue.ts";
import { capitalised, counted, countWord, listed } from "./words.ts";

export interface ReadCounts {
  readonly files: number;
  /** Files that could not be used. */
  readonly failed: number;
}

/** What was read, what is left out, and what lies outside the windows. */
export function recordSentences(cases: readonly SentenceCase[], counts: ReadCounts): readonly Sentence[] {
  const stations = cases.flatMap((of) => of.stations);
  const read = counts.files - counts.failed;
  const opening =
    counts.failed === 0
      ? say`${{ kind: "strong", text: counted(stations.length, "station") }} ${stations.length === 1 ? "was" : "were"} read from ${counted(read, "file")}.`
      : say`${{ kind: "strong", text: `${read} of ${counts.files} files` }} were read, with ${counted(stations.length, "station")}. ${capitalised(countWord(counts.failed))} could not be used.`;
  return [startUpper(opening), ...shortSentence(cases), ...outsideSentence(cases)];
}

const isShort = ({ flags }: StationResult) => flags.some(({ code }) => code === "short-record");

function shortSentence(cases: readonly SentenceCase[]): Sentence[] {
  const short = cases.flatMap((of) => of.stations.filter(isShort).map((station) => ({ of, station })));
  if (short.length === 0) return [];
  const fitted = short.some(({ of, station }) => isUsed(of, station.x));
  const one = short.length === 1;
  const consequence = fitted ? "" : ` and ${one ? "is" : "are"} left out of the fit`;
  return [
    say`${capitalised(counted(short.length, "record"))} ${one ? "is" : "are"} too short for an interval${consequence}.`,
  ];
}

function outsideSentence(cases: readonly SentenceCase[]): Sentence[] {
  const outside = cases.flatMap((of) => {
    const count = of.stations.filter((station) => !isShort(station) && !isUsed(of, station.x)).length;
    return of.decay?.law && count > 0 ? [{ of, count }] : [];
  });
  if (outside.length === 0) return [];
  const parts = outside.map(
    ({ of, count }, i) =>
      say`${i === 0 ? capitalised(counted(count, "station")) : countWord(count)} of ${caseOf(of)}`,
  );
  const single = outside.length === 1 && outside[0].count === 1;
  return [
    say`${listed(parts)} ${single ? "lies" : "lie"} outside the fit window${outside.length === 1 ? "" : "s"}.`,
  ];
}

/** A number in words may open the sentence. */
function startUpper([first, ...rest]: Sentence): Sentence {
  return first.kind === "strong" ? [{ ...first, text: capitalised(first.text) }, ...rest] : [first, ...rest];
}
