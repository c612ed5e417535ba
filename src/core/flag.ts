/** A doubt that travels with a result and prints beside it. Codes are stable and listed in the README. */
export interface Flag {
  readonly code: FlagCode;
  /** One sentence: the fact and its consequence. */
  readonly text: string;
  /** The figure behind the flag, where there is one. */
  readonly value?: number;
  /** Keys of the quantities that rest on it; left out: the station as a whole. */
  readonly concerns?: readonly string[];
}

export const flagCodes = [
  "short-record",
  "record-unsteady-scale",
  "unequal-steps",
  "backward-time",
  "gap",
  "rounded-times",
  "taylor-doubtful",
  "reversed-flow",
  "noise-floor",
  "resolution",
  "aliasing",
  "no-zero-crossing",
  "isotropy-assumed",
  "axisymmetry-assumed",
  "not-realizable",
  "no-viscosity",
  "inhomogeneous",
  "trend",
  "probes-joined",
  "left-out-lines",
  "damaged-file",
  "resolved-scales",
  "start-up",
  "replayed-inflow",
  "sensor-length",
  "short-box",
  "few-stations",
  "short-span",
  "held-origin",
  "equal-weights",
  "chi-square-fails",
  "half-open",
  "u-varies",
  "flight-unknown",
  "window-without-plateau",
  "near-field",
  "law-refused",
  "circular-route",
] as const;
export type FlagCode = (typeof flagCodes)[number];
