/** A value with the values before it and those taken back: undo by keeping what is immutable anyway. */
export interface History<T> {
  readonly past: readonly T[];
  readonly present: T;
  readonly future: readonly T[];
}

/** Values kept for undo; a workspace is a few kilobytes, so this is a bound on habit, not on memory. */
export const historyLimit = 200;

export function startHistory<T>(present: T): History<T> {
  return { past: [], present, future: [] };
}

/** A new present. What was taken back is lost; a value that did not change is no step. */
export function advance<T>(history: History<T>, next: T): History<T> {
  if (next === history.present) return history;
  return { past: [...history.past, history.present].slice(-historyLimit), present: next, future: [] };
}

export function undo<T>(history: History<T>): History<T> {
  const previous = history.past.at(-1);
  if (previous === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: previous,
    future: [history.present, ...history.future],
  };
}

export function redo<T>(history: History<T>): History<T> {
  const [next, ...future] = history.future;
  if (next === undefined) return history;
  return { past: [...history.past, history.present], present: next, future };
}
