import type { Flag, FlagCode } from "../core/flag.ts";

const gradients = [
  "lambda",
  "gradient",
  "epsilon",
  "epsilon_gradient",
  "eta",
  "Re_lambda",
  "balance",
  "S_dudx",
];
const lengths = ["L11", "Re_L", "C_epsilon"];

/** Quantities that a doubt is about, where its code says so; other doubts are about the station as a whole. */
const byCode: Partial<Record<FlagCode, readonly string[]>> = {
  "noise-floor": gradients,
  resolution: gradients,
  aliasing: gradients,
  "resolved-scales": gradients,
  "sensor-length": gradients,
  "taylor-doubtful": [...gradients, ...lengths],
  "reversed-flow": [...gradients, ...lengths],
  "no-zero-crossing": ["T_int", ...lengths],
  "short-box": ["T_int", ...lengths],
  "record-unsteady-scale": ["T_int", ...lengths],
  "no-viscosity": gradients,
  "circular-route": ["balance", "epsilon"],
};

/** The quantities a doubt is about; null: the station as a whole. */
export function concernOf({ code, concerns }: Flag): readonly string[] | null {
  return concerns ?? byCode[code] ?? null;
}

/** Whether a doubt belongs beside the number of this key. */
export function concernsKey(flag: Flag, key: string): boolean {
  return concernOf(flag)?.includes(key) ?? true;
}
