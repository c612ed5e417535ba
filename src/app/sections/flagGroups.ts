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
}

/** The flags of some cases: those of a case first, then its stations', alike ones together. */
export function flagGroups(cases: readonly CaseView[]): FlagGroup[] {
  return cases.flatMap(({ id, mark, name, stations, decay, reduced }) => {
    const group = (flag: Flag, xs: readonly number[]): FlagGroup => ({
      key: `${id} ${flag.code} ${xs[0] ?? ""}`,
      mark,
      name,
      xs,
      text: flag.text,
    });
    const whole = [...(reduced?.flags ?? []), ...(decay?.flags ?? [])].map((flag) => group(flag, []));
    const byCode = new Map<string, { flag: Flag; xs: number[] }>();
    for (const { x, flags } of stations)
      for (const flag of flags) {
        const known = byCode.get(flag.code);
        if (known) known.xs.push(x);
        else byCode.set(flag.code, { flag, xs: [x] });
      }
    return [...whole, ...[...byCode.values()].map(({ flag, xs }) => group(flag, xs))];
  });
}
