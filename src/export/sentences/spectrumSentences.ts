import type { PickedCurve } from "../../figures/figureSpec.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, equation, position, symbolOf } from "./shownValue.ts";
import { listed, reason } from "./words.ts";

export interface PickedStation extends PickedCurve {
  readonly of: SentenceCase;
}

/** What the picked spectra are, and whether an inertial range is claimed at any of them. */
export function spectrumSentences(picked: readonly PickedStation[]): readonly Sentence[] {
  const drawn = picked.filter(({ station }) => station.curves !== null);
  if (drawn.length === 0)
    return [say`No spectrum is shown: a profile holds none, and no other station is picked on the ruler.`];
  const names = drawn.map(({ of, station, letter }) => {
    const sign: Piece = { kind: "symbol", runs: [{ text: letter }] };
    const reynolds =
      station.Re_lambda.value === null ? [] : say`, ${equation(station.Re_lambda, "Re_lambda", of.units)}`;
    return say`${sign}, ${caseOf(of)} at ${position(station.x, of)}${reynolds}`;
  });
  return [
    say`The spectra are those of ${names.length === 1 ? names[0] : names.flatMap((name, i) => (i === 0 ? name : say`; ${name}`))}.`,
    ...inertialSentences(drawn),
  ];
}

function inertialSentences(drawn: readonly PickedStation[]): Sentence[] {
  const claimed = drawn.filter(({ station }) => station.epsilon_inertial.value !== null);
  const letters = (some: readonly PickedStation[]) =>
    listed(some.map(({ letter }): Piece => ({ kind: "symbol", runs: [{ text: letter }] })));
  const without = drawn.filter((one) => !claimed.includes(one));
  const reasons = new Map<string, PickedStation[]>();
  for (const one of without) {
    const { epsilon_inertial } = one.station;
    const why = epsilon_inertial.value === null ? reason(epsilon_inertial.why) : "";
    reasons.set(why, [...(reasons.get(why) ?? []), one]);
  }
  const claims =
    claimed.length === 0
      ? []
      : [
          say`An inertial range is claimed at ${letters(claimed)}; its dissipation stands in the table of routes.`,
        ];
  const [only] = reasons.keys();
  if (reasons.size === 1 && claimed.length === 0) return [say`No inertial range is claimed: ${only}.`];
  const clause = sharedClause([...reasons.keys()]);
  if (clause !== null && claimed.length === 0)
    return [say`No inertial range is claimed at any of them; in ${symbolOf("Re_lambda")} ${clause}.`];
  return [
    ...claims,
    ...[...reasons].map(([why, some]) => say`No inertial range is claimed at ${letters(some)}: ${why}.`),
  ];
}

/** What follows the number in reasons that differ by their Reynolds number alone; null where they differ otherwise. */
function sharedClause(whys: readonly string[]): string | null {
  const clauses = new Set(whys.map((why) => /^Re_\S+ is [\d.]+: (.*)$/.exec(why)?.[1] ?? why));
  const [first] = clauses;
  return clauses.size === 1 && first !== whys[0] ? first : null;
}

/** Where the spectra have no unit of dissipation. */
export function unscaledSentence(): Sentence {
  return say`Without ${symbolOf("epsilon")} at every picked station the spectra are drawn in their own units.`;
}
