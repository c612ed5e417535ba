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
  readonly scale: Scale;
}
/** value times / per: one of the two is 1, so that it is rounded once: 602 cm/s is 602 / 100, 6.02 m/s. */
export interface Scale {
  readonly times: number;
  readonly per: number;
}

export function inCaseUnit(value: number, { times, per }: Scale): number {
  return (value * times) / per;
}

export const unscaled: Scale = { times: 1, per: 1 };
const times = (factor: number): Scale => ({ times: factor, per: 1 });
const per = (divisor: number): Scale => ({ times: 1, per: divisor });
const one = unscaled;

/** The SI value of one of each. */
const spellings: Readonly<Record<UnitKind, Readonly<Record<string, Scale>>>> = {
  time: {
    s: one,
    sec: one,
    second: one,
    seconds: one,
    ms: per(1e3),
    us: per(1e6),
    ns: per(1e9),
    min: times(60),
    h: times(3600),
  },
  length: {
    m: one,
    mm: per(1e3),
    cm: per(1e2),
    um: per(1e6),
    km: times(1e3),
    in: times(0.0254),
    ft: times(0.3048),
  },
  speed: {
    "m/s": one,
    "ms-1": one,
    mps: one,
    "m/sec": one,
    "mm/s": per(1e3),
    "mms-1": per(1e3),
    "cm/s": per(1e2),
    "cms-1": per(1e2),
    "km/h": per(3.6),
    "ft/s": times(0.3048),
  },
  "speed squared": {
    "m2/s2": one,
    "m2s-2": one,
    "(m/s)2": one,
    "j/kg": one,
    "cm2/s2": per(1e4),
    "cm2s-2": per(1e4),
    "(cm/s)2": per(1e4),
    "mm2/s2": per(1e6),
    "mm2s-2": per(1e6),
  },
  dissipation: {
    "m2/s3": one,
    "m2s-3": one,
    "w/kg": one,
    "cm2/s3": per(1e4),
    "cm2s-3": per(1e4),
    "mm2/s3": per(1e6),
  },
  rate: { hz: one, "1/s": one, "s-1": one, khz: times(1e3), "samples/s": one },
  fraction: { "-": one, "1": one, "%": per(1e2) },
  other: {
    v: one,
    mv: one,
    volt: one,
    volts: one,
    k: one,
    c: one,
    "°c": one,
    degc: one,
    pa: one,
    kpa: one,
    bar: one,
    deg: one,
    "°": one,
  },
};

const units: ReadonlyMap<string, Unit> = new Map(
  Object.entries(spellings).flatMap(([kind, factors]) =>
    Object.entries(factors).map(([text, scale]) => [text, { kind: kind as UnitKind, scale }] as const),
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
  if (even === "MHz") return { kind: "rate", scale: times(1e6) };
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
