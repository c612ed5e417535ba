import { failureText, type PlainFailure } from "../../core/failure.ts";
import type { Flag } from "../../core/flag.ts";
import { formatBytes } from "../../figures/formatBytes.ts";
import { formatCount } from "../../figures/formatNumber.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, coordinate, position } from "./shownValue.ts";
import { capitalised, reason } from "./words.ts";

export interface ReadingProgress {
  readonly filesDone: number;
  readonly files: number;
  readonly bytesDone: number;
  readonly bytes: number;
}

/** How far reading has come, while it runs. */
export function readingSentence({ filesDone, files, bytesDone, bytes }: ReadingProgress): Sentence {
  const total = { kind: "strong", text: `${files} files` } as const;
  return say`${formatCount(filesDone)} of ${total} are reduced, ${formatBytes(bytesDone)} of ${formatBytes(bytes)}. The law of a case follows when its last station is in.`;
}

/** The words of the button beside it. */
export function cancelWords({ filesDone }: ReadingProgress): string {
  return filesDone === 0 ? "Cancel" : `Cancel, keep the ${filesDone}`;
}

/** "run_x0700.csv line 48 213, column 3: 6.1.4 is not a number. Leave the line out or mend it." */
export function failureSentence(failure: PlainFailure): Sentence {
  const { file, key, line, column } = failure.where;
  if (file === undefined) return say`${failureText(failure)}`;
  const place = [
    key === undefined ? null : `key ${key}`,
    line === undefined ? null : `line ${formatCount(line)}`,
    column === undefined ? null : `column ${formatCount(column)}`,
  ].filter((part) => part !== null);
  const facts = [
    failure.found === undefined ? null : say`found ${{ kind: "verbatim", text: failure.found }}`,
    failure.expected === undefined ? null : say`expected ${failure.expected}`,
  ].filter((part) => part !== null);
  const bracket =
    facts.length === 0 ? [] : say` (${facts.flatMap((fact, i) => (i === 0 ? fact : say`, ${fact}`))})`;
  return say`${{ kind: "verbatim", text: file }}${place.length === 0 ? "" : ` ${place.join(", ")}`}: ${quoted(reason(failure.message))}${bracket}. ${failure.remedy}`;
}

/** Text with its quotations of a file (in backticks) set as such. */
function quoted(text: string): Sentence {
  return text.split("`").flatMap((part, i): Sentence => {
    if (part === "") return [];
    return [{ kind: i % 2 === 1 ? "verbatim" : "text", text: part }];
  });
}

/** A flag with its place: "screen, x = 1.60 m: the record is …". */
export function flagSentence(flag: Flag, of: SentenceCase, x: number | null): Sentence {
  const place = x === null ? [] : say`, ${coordinate(of)} = ${position(x, of)}`;
  return say`${caseOf(of)}${place}: ${reason(flag.text)}.`;
}

/** What opens the table. */
export function tableSentence(cases: readonly SentenceCase[]): Sentence {
  const stations = cases.reduce((sum, of) => sum + of.stations.length, 0);
  return say`${capitalised(stations === 1 ? "the one station" : `the ${formatCount(stations)} stations`)} with their intervals, the figures and the results can be taken along.`;
}
