import type { Flag } from "../core/flag.ts";
import type { RowTally } from "./readRows.ts";

/** What was left out of a file, as flags. */
export function tallyFlags({ leftOut, leftOutCount, cutLine }: RowTally): Flag[] {
  const flags: Flag[] = [];
  if (leftOutCount > 0) {
    const lines = leftOutCount === 1 ? "1 line" : `${leftOutCount} lines`;
    const text = `${lines} between the rows held no numbers and ${leftOutCount === 1 ? "was" : "were"} passed over, the first at line ${leftOut[0]}.`;
    flags.push({ code: "left-out-lines", text, value: leftOutCount });
  }
  if (cutLine !== null) {
    const text = `The file ends within a row, at line ${cutLine}; that row was left out.`;
    flags.push({ code: "damaged-file", text, value: cutLine });
  }
  return flags;
}
