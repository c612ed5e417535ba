/**
 * What goes wrong with a file or a sheet, as data: where, what was found, what was expected, what can be done.
 * A failure is thrown where it is seen and caught only by the shells and by engine/tasks.ts.
 */
export const failureCodes = [
  "empty-file",
  "heading-only",
  "no-velocity",
  "not-a-number",
  "too-few-samples",
  "constant-signal",
  "no-time",
  "no-position",
  "not-a-record",
  "unreadable-file",
  "ambiguous-columns",
  "unequal-steps",
  "backward-time",
  "different-points",
  "missing-file",
  "sheet-not-json",
  "sheet-invalid",
  "duplicate-case",
  "duplicate-file",
  "missing-shard",
  "bad-shard",
  "cancelled",
  "crashed",
] as const;
export type FailureCode = (typeof failureCodes)[number];

export interface Place {
  readonly file?: string;
  /** 1-based, as an editor counts. */
  readonly line?: number;
  readonly column?: number;
  /** The key of a sheet, as `fit.window`. */
  readonly key?: string;
}

export interface FailureFacts {
  /** What is wrong, one sentence without the place. */
  readonly message: string;
  readonly found?: string;
  readonly expected?: string;
  /** What the reader can do about it, one sentence. */
  readonly remedy: string;
}

/** A failure as it crosses from worker to page: a cloned Error would lose its class and its code. */
export interface PlainFailure extends FailureFacts {
  readonly code: FailureCode;
  readonly where: Place;
}

export class ReductionFailure extends Error {
  readonly code: FailureCode;
  readonly facts: FailureFacts;
  readonly where: Place;

  constructor(code: FailureCode, facts: FailureFacts, where: Place = {}) {
    super(facts.message);
    this.name = "ReductionFailure";
    this.code = code;
    this.facts = facts;
    this.where = where;
  }

  /** The same failure with more of its place known: a reader knows the line, its caller the file. */
  at(where: Place): ReductionFailure {
    return new ReductionFailure(this.code, this.facts, { ...where, ...this.where });
  }

  plain(): PlainFailure {
    return { code: this.code, ...this.facts, where: this.where };
  }
}

/** A failure that crossed as plain data, once more as what can be thrown. */
export function revivedFailure({ code, where, ...facts }: PlainFailure): ReductionFailure {
  return new ReductionFailure(code, facts, where);
}

/** "run_x0700.csv, line 48213, column 3: `6.1.4` is not a number. Leave the line out or mend it." */
export function failureText({ where, message, found, expected, remedy }: PlainFailure): string {
  const place = [
    where.file,
    where.key === undefined ? undefined : `key ${where.key}`,
    where.line === undefined ? undefined : `line ${where.line}`,
    where.column === undefined ? undefined : `column ${where.column}`,
  ]
    .filter((part) => part !== undefined)
    .join(", ");
  const facts = [
    found === undefined ? undefined : `found ${found}`,
    expected === undefined ? undefined : `expected ${expected}`,
  ]
    .filter((part) => part !== undefined)
    .join(", ");
  return `${place}${place ? ": " : ""}${message}${facts ? ` (${facts})` : ""}. ${remedy}`;
}

/** Our own bug, never bad input. */
export function assert(condition: boolean, message: string): asserts condition {
  if (!condition) throw new Error(`internal: ${message}`);
}

export function assertNever(value: never): never {
  throw new Error(`internal: unexpected ${JSON.stringify(value)}`);
}
