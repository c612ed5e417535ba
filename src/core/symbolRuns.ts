import type { Run } from "./catalogue.ts";

const token = /([_^])\{([^}]*)\}|"([^"]*)"|(\p{L}+)|([^\p{L}_^"{}]+)/gu;

/**
 * A symbol as runs, from one line of plain text. Letters are italic, all else upright; words in double
 * quotes are upright too; `_{…}` is lowered and `^{…}` raised: `T_{"int"}`, `k_{1}η`, `(x − x_{0})/ℓ`.
 */
export function symbolRuns(text: string): readonly Run[] {
  return [...text.matchAll(token)].flatMap(([whole, mark, inner, quoted, letters]) => {
    if (mark !== undefined) {
      const place = mark === "_" ? "sub" : "sup";
      return symbolRuns(inner).map((run): Run => ({ ...run, place }));
    }
    if (quoted !== undefined) return [{ text: quoted, upright: true } as const];
    return letters !== undefined ? [{ text: letters }] : [{ text: whole, upright: true } as const];
  });
}

/** The same symbol with the reference length called by the case's own letter: ℓ becomes M. */
export function withReference(runs: readonly Run[], symbol: string): readonly Run[] {
  return runs.map((run) => (run.text === "ℓ" ? { ...run, text: symbol } : run));
}
