import type { Flag } from "../../core/flag.ts";
import type { CaseView } from "../session/caseView.ts";

/** One doubt of one case, with the stations that share it. */
export interface FlagGroup {
  readonly key: string;
  readonly mark: number;
  readonly name: string;
  /** Positions of the stations; empty for a doubt about the case as a whole. */
  readonly xs: readonly number[];
  /** The text at the first of them. */
  readonly text: string;
  /** False where the text of another station differs, in its figure. */
  readonly alike: boolean;
}

/** The flags of some cases: those of a case first, then its stations', alike ones together. */
export function flagGroups(cases: readonly CaseView[]): FlagGroup[] {
  return cases.flatMap(({ id, mark, name, stations, decay, reduced }) => {
    const group = (flag: Flag, xs: readonly number[], alike = true): FlagGroup => ({
      key: `${id} ${flag.code} ${xs[0] ?? ""}`,
      mark,
      name,
      xs,
      text: flag.text,
      alike,
    });
    const whole = [...(reduced?.flags ?? []), ...(decay?.flags ?? [])].map((flag) => group(flag, []));
    const byCode = new Map<string, { flag: Flag; xs: number[]; alike: boolean }>();
    for (const { x, flags } of stations)
      for (const flag of flags) {
        const known = byCode.get(flag.code);
        if (known) {
          known.xs.push(x);
          known.alike = known.alike && known.flag.text === flag.text;
        } else byCode.set(flag.code, { flag, xs: [x], alike: true });
      }
    return [...whole, ...[...byCode.values()].map(({ flag, xs, alike }) => group(flag, xs, alike))];
  });
}
