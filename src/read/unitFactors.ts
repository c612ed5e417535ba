import type { Role } from "../core/records.ts";

/** What a unit measures; "other" is known and is never what a column of a record is in. */
export type UnitKind =
  | "time"
  | "length"
  | "speed"
  | "speed squared"
  | "dissipation"
  | "rate"
  | "fraction"
  | "other";
export interface Unit {
  readonly kind: UnitKind;
  /** The SI value of one. */
  readonly factor: number;
}

const spellings: Readonly<Record<UnitKind, Readonly<Record<string, number>>>> = {
  time: { s: 1, sec: 1, second: 1, seconds: 1, ms: 1e-3, us: 1e-6, ns: 1e-9, min: 60, h: 3600 },
  length: { m: 1, mm: 1e-3, cm: 1e-2, um: 1e-6, km: 1e3, in: 0.0254, ft: 0.3048 },
  speed: {
    "m/s": 1,
    "ms-1": 1,
    mps: 1,
    "m/sec": 1,
    "mm/s": 1e-3,
    "mms-1": 1e-3,
    "cm/s": 1e-2,
    "cms-1": 1e-2,
    "km/h": 1 / 3.6,
    "ft/s": 0.3048,
  },
  "speed squared": {
    "m2/s2": 1,
    "m2s-2": 1,
    "(m/s)2": 1,
    "j/kg": 1,
    "cm2/s2": 1e-4,
    "cm2s-2": 1e-4,
    "(cm/s)2": 1e-4,
    "mm2/s2": 1e-6,
    "mm2s-2": 1e-6,
  },
  dissipation: { "m2/s3": 1, "m2s-3": 1, "w/kg": 1, "cm2/s3": 1e-4, "cm2s-3": 1e-4, "mm2/s3": 1e-6 },
  rate: { hz: 1, "1/s": 1, "s-1": 1, khz: 1e3, "samples/s": 1 },
  fraction: { "-": 1, "1": 1, "%": 1e-2 },
  other: {
    v: 1,
    mv: 1,
    volt: 1,
    volts: 1,
    k: 1,
    c: 1,
    "°c": 1,
    degc: 1,
    pa: 1,
    kpa: 1,
    bar: 1,
    deg: 1,
    "°": 1,
  },
};

const units: ReadonlyMap<string, Unit> = new Map(
  Object.entries(spellings).flatMap(([kind, factors]) =>
    Object.entries(factors).map(([text, factor]) => [text, { kind: kind as UnitKind, factor }] as const),
  ),
);

/** The unit a text names, in the trade's spellings (`m s^-1`, `m/s`, `m·s⁻¹`); null where it is not known. */
export function unitOf(text: string): Unit | null {
  const even = text
    .trim()
    .replace(/[\u00b5\u03bc]/g, "u")
    .replace(/\u00b2/g, "2")
    .replace(/\u00b3/g, "3")
    .replace(/[\u207b\u2212]/g, "-")
    .replace(/\u00b9/g, "1")
    .replace(/[\s^*\u00b7{}]|(?<=[a-z])\.(?=[a-z])/g, "");
  if (even === "MHz") return { kind: "rate", factor: 1e6 };
  return units.get(even) ?? units.get(even.toLowerCase()) ?? null;
}

/** What the column of a role is measured in; null: anything (a decaying quantity of the user's own). */
export const roleKind: Readonly<Record<Role, UnitKind | null>> = {
  x: "length",
  y: "length",
  z: "length",
  t: "time",
  u: "speed",
  v: "speed",
  w: "speed",
  U: "speed",
  uu: "speed squared",
  vv: "speed squared",
  ww: "speed squared",
  uv: "speed squared",
  u_rms: "speed",
  v_rms: "speed",
  w_rms: "speed",
  q: null,
  se: null,
  lambda: "length",
  L: "length",
  epsilon: "dissipation",
};

/** What the case itself measures in, for messages. */
export const caseUnit: Readonly<Record<UnitKind, string>> = {
  time: "s",
  length: "m",
  speed: "m/s",
  "speed squared": "m2/s2",
  dissipation: "m2/s3",
  rate: "Hz",
  fraction: "1",
  other: "",
};
