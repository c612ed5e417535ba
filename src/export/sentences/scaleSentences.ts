import type { StationResult } from "../../core/stationResult.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { isUsed } from "../../figures/windowOf.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, equation, position, symbolOf, valueWithInterval } from "./shownValue.ts";
import { chained, reason } from "./words.ts";

/** Scales at the last station of each window, the growth of L11, and what cannot be had. */
export function scaleSentences(cases: readonly SentenceCase[]): readonly Sentence[] {
  const parts = cases.flatMap((of) => {
    const station = lastUsed(of);
    return station === null ? [] : [{ of, station }];
  });
  const lengths = parts.map(({ of, station }, i) => lengthPart(of, station, i === 0));
  return [
    ...(lengths.length === 0 ? [] : [say`${chained(lengths)}.`]),
    ...growthSentence(cases),
    ...parts.flatMap(({ of, station }) => missingScales(of, station)),
  ];
}

/** The last station of the window that has an integral scale; of all stations where no window is set. */
export function lastUsed(of: SentenceCase): StationResult | null {
  const there = of.stations.filter(({ L11 }) => L11.value !== null);
  const inside = there.filter(({ x }) => isUsed(of, x));
  const pool = inside.length > 0 ? inside : there;
  return pool[pool.length - 1] ?? null;
}

function lengthPart(of: SentenceCase, station: StationResult, first: boolean): Sentence {
  const keys = (["lambda", "Re_lambda"] as const).filter((key) => station[key].value !== null);
  const others = keys.flatMap(
    (key, i) => say`${i === keys.length - 1 ? " and " : ", "}${equation(station[key], key, of.units)}`,
  );
  const at = position(station.x, of);
  return say`${first ? "In" : "in"} ${caseOf(of)} ${first ? "the integral scale is " : ""}${equation(station.L11, "L11", of.units)}${others} at ${at}`;
}

function growthSentence(cases: readonly SentenceCase[]): Sentence[] {
  const parts = cases.flatMap((of) => {
    const { decay } = of;
    if (!decay?.law || decay.growth.m.value === null) return [];
    const implied = formatNumber(1 - decay.law.n / 2, 2);
    const asked: Piece = { kind: "together", pieces: say`1 − ${symbolOf("n")}/2 = ${implied}` };
    return [
      say`${valueWithInterval(decay.growth.m, "m", of.units)} in ${caseOf(of)}, where constant ${symbolOf("C_epsilon")} asks for ${asked}`,
    ];
  });
  return parts.length === 0 ? [] : [say`${symbolOf("L11")} grows with exponent ${chained(parts)}.`];
}

function missingScales(of: SentenceCase, { lambda }: StationResult): Sentence[] {
  if (lambda.value !== null) return [];
  return [
    say`${symbolOf("lambda")}, ${symbolOf("eta")} and ${symbolOf("Re_lambda")} cannot be given for ${caseOf(of)}: ${reason(lambda.why)}.`,
  ];
}
