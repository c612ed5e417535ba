import type { RecordCut } from "../recordCut.ts";

/** A cut as the record that it is in tells it. */
export type OwnCut = Omit<RecordCut, "file" | "y" | "z">;

/** The first cuts, and how many more there were. */
export interface CutList {
  readonly first: readonly OwnCut[];
  readonly more: number;
}

/** Cuts that are listed one by one: more are counted. */
export const mostCuts = 100;

/** Gathers cuts as they come. */
export class CutKeeper {
  private readonly first: OwnCut[] = [];
  private more = 0;

  add(cut: OwnCut): void {
    if (this.first.length < mostCuts) this.first.push(cut);
    else this.more++;
  }

  list(): CutList {
    return { first: this.first, more: this.more };
  }
}

/** Several lists as one, in order of place. */
export function joinCuts(lists: readonly CutList[]): CutList {
  const all = lists.flatMap(({ first }) => first).sort((a, b) => a.at - b.at);
  const more = lists.reduce((sum, list) => sum + list.more, 0);
  return { first: all.slice(0, mostCuts), more: more + Math.max(0, all.length - mostCuts) };
}
