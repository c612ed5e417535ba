import type { Argued } from "./session.ts";

/**
 * A new argument that keeps the cases of the one before whose fits follow from the same ground: equal keys are equal
 * numbers, and what keeps its identity is not drawn again. A body that is moved asks for another comparison, not for
 * other fits.
 */
export function withKnownCases(before: Argued | null, now: Argued): Argued {
  if (before === null) return now;
  const cases = Object.entries(now.cases).map(([id, one]) => {
    const same = before.keys[id] === now.keys[id];
    return [id, same ? (before.cases[id] ?? one) : one] as const;
  });
  return { ...now, cases: Object.fromEntries(cases) };
}
