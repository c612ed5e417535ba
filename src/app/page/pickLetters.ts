import type { PickedStation } from "../../sheet/workspace.ts";
import type { RulerPick } from "../ruler/rulerProps.ts";

/** Letters of the picked stations, a, b, c in the order of picking: the same on the ruler and in the spectra. */
export function pickLetters(picked: readonly PickedStation[]): readonly RulerPick[] {
  return picked.map(({ caseId, x }, i) => ({ caseId, x, letter: letterOf(i) }));
}

/** a to z, then aa, ab. */
function letterOf(index: number): string {
  const letter = String.fromCharCode(97 + (index % 26));
  return index < 26 ? letter : letterOf(Math.floor(index / 26) - 1) + letter;
}
