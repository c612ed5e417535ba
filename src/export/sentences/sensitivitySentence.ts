import { originSensitivity } from "../../core/decay/originSensitivity.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import { bare, missing, type Quantity } from "../../core/quantity.ts";
import { withReference } from "../../core/symbolRuns.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits } from "../../figures/formatNumber.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, symbolOf } from "./shownValue.ts";
import { counted, listed } from "./words.ts";

/** How far n moves when x0 is moved downstream by one reference length (one unit of x without one). */
export function sensitivityOf({ law, window, n }: DecayResult): Quantity {
  if (law === null) return missing("there is no law");
  if (n.value !== null && n.why_low === "held, not fitted") return missing("n is held: x0 cannot move it");
  const slope = originSensitivity(law, window);
  return slope === null
    ? missing("the origin lies at the first station")
    : bare(slope * law.length, "it follows from the law as found");
}

/** Where the span is short, the stations are few or the origin is held: what that does to n, in figures. */
export function sensitivitySentence(of: SentenceCase): Sentence[] {
  const { decay } = of;
  if (!decay?.law) return [];
  const reasons = decay.flags.flatMap(({ code, value = null }) => {
    if (code === "short-span" && value !== null)
      return [
        say`the last station lies only ${formatDigits(value, 2)} times as far from the origin as the first`,
      ];
    if (code === "few-stations") return [say`the law rests on ${counted(decay.stations, "station")} only`];
    return code === "held-origin" ? [say`the origin is held`] : [];
  });
  const moved = sensitivityOf(decay);
  if (reasons.length === 0 || moved.value === null) return [];
  const value: Piece = {
    kind: "strong",
    text: formatDigits(moved.value, 2),
    about: { key: "dn/dx0", quantity: moved },
  };
  const origin = symbolOf(of.along === "t" ? "t0" : "x0");
  return [
    say`In ${caseOf(of)} ${listed(reasons)}: ${symbolOf("n")} moves by ${value} for each ${step(of)} that ${origin} lies ${of.along === "t" ? "later" : "farther downstream"}.`,
  ];
}

function step({ length, symbol, units, along }: SentenceCase): Piece | string {
  if (length !== null) return { kind: "symbol", runs: withReference([{ text: "ℓ" }], symbol) };
  const unit = unitOf(along === "t" ? "T" : "L", units);
  return unit === "" ? "unit" : unit;
}
