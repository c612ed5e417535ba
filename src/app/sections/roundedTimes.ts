import type { CaseView } from "../session/caseView.ts";

/** Records whose time stamps have too few digits, while nobody has said what holds; null where nothing is open. */
export function roundedTimes({
  stations,
  of,
}: CaseView): { steps: readonly number[]; stations: number } | null {
  if (of.sheet.read.times !== "ask") return null;
  const flagged = stations.filter(({ flags }) => flags.some(({ code }) => code === "rounded-times"));
  if (flagged.length === 0) return null;
  const steps = flagged.flatMap(({ flags }) =>
    flags.flatMap(({ code, value }) => (code === "rounded-times" && value !== undefined ? [value] : [])),
  );
  return { steps: [...new Set(steps)].sort((a, b) => a - b), stations: flagged.length };
}
