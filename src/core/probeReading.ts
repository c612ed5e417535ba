import type { Quantity } from "./quantity.ts";

/** What of a probe is held against the others at its x. */
export type ProbedName = "U" | "u_rms";

/** One of several probes at one x, about its own mean. */
export interface ProbeReading {
  readonly file: string;
  readonly y: number | null;
  readonly z: number | null;
  readonly U: Quantity;
  /** u'. */
  readonly u_rms: Quantity;
  /** Whether it differs from the others by no more than sampling errors; null where these are not known. */
  readonly agrees: boolean | null;
  /** In what it differs. */
  readonly departs: readonly ProbedName[];
  /** Its record is no part of the station's values; left out where it is. */
  readonly setAside?: true;
}
