import type { StationResult } from "../../core/stationResult.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { isUsed } from "../../figures/windowOf.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, equation, percent, position, symbolOf } from "./shownValue.ts";
import { counted, countWord, reason } from "./words.ts";

/** Whether decay and gradients give the same dissipation, case by case. */
export function balanceSentences(cases: readonly SentenceCase[], tolerance: number): readonly Sentence[] {
  return cases.flatMap((of) => balanceSentence(of, tolerance));
}

function balanceSentence(of: SentenceCase, tolerance: number): Sentence[] {
  const inside = of.stations.filter(({ x }) => isUsed(of, x));
  const there = inside.filter(({ balance }) => balance.value !== null);
  if (there.length === 0) return missingBalance(of, inside[0] ?? of.stations[0]);
  const middle = there[Math.floor(there.length / 2)];
  const known = there.flatMap(({ balance }) =>
    balance.value === null || balance.low === null || balance.high === null
      ? []
      : [balance.low <= 1 && balance.high >= 1],
  );
  const closed = known.filter(Boolean).length;
  const verdict =
    known.length === 0
      ? "no interval can be given"
      : `its interval holds one at ${shareOf(closed, known.length)}`;
  const value = equation(middle.balance, "balance", of.units);
  return [
    say`In ${caseOf(of)} ${value} at ${position(middle.x, of)}, the middle of the window; ${verdict}.`,
    ...shortfall(of, middle, tolerance),
    ...surplus(of, middle, tolerance),
  ];
}

function shareOf(count: number, all: number): string {
  if (count === all) return all === 1 ? "the one station" : `all ${counted(all, "station")}`;
  return `${count === 0 ? "none" : countWord(count)} of ${counted(all, "station")}`;
}

/** What a departure means where the gradients carry clearly less than the decay asks for. */
function shortfall(of: SentenceCase, { balance }: StationResult, tolerance: number): Sentence[] {
  if (balance.value === null || balance.low === null || balance.low <= 1 + tolerance) return [];
  const share = percent(1 / balance.value);
  return [
    say`The resolved gradients of ${caseOf(of)} carry ${{ kind: "strong", text: share }} of the dissipation that the decay asks for: ${symbolOf("lambda")}, ${symbolOf("eta")} and ${symbolOf("Re_lambda")} from gradients are upper bounds. Scales that were not resolved are the usual cause: a coarse grid, a long sensor, a filter.`,
  ];
}

/** What a departure means where the gradients carry clearly more. */
function surplus(of: SentenceCase, { balance }: StationResult, tolerance: number): Sentence[] {
  if (balance.value === null || balance.high === null || balance.high >= 1 / (1 + tolerance)) return [];
  return [
    say`The gradients of ${caseOf(of)} carry ${{ kind: "strong", text: formatNumber(1 / balance.value, 2) }} times the dissipation that the decay asks for: noise taken for gradients, or energy that is still fed by shear or by the wakes upstream, are the usual causes.`,
  ];
}

function missingBalance(of: SentenceCase, station: StationResult | undefined): Sentence[] {
  if (station === undefined || station.balance.value !== null) return [];
  return [say`No balance is given for ${caseOf(of)}: ${reason(station.balance.why)}.`];
}
