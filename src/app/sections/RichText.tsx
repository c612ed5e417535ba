import { labelOf } from "../../core/catalogue.ts";
import { SymbolText } from "./SymbolText.tsx";

/** Quantities that reasons and flags name in plain letters, the longer names first. */
const keys = [
  "C_epsilon",
  "Re_lambda",
  "S_dudx",
  "T_int",
  "Re_L",
  "epsilon",
  "lambda",
  "L11",
  "eta",
  "x0",
] as const;
const named = new RegExp(`(?<![\\w/])(${keys.join("|")})(?!\\w)`, "g");

/** Plain text of the core, with the quantities that it names set as their symbols. */
export function RichText({ text }: { text: string }) {
  const parts = text.split(named);
  if (parts.length === 1) return text;
  return parts.map((part, i) =>
    // every second part is a name: what the pattern caught
    // biome-ignore lint/suspicious/noArrayIndexKey: parts have no identity but their place
    i % 2 === 1 ? <SymbolText runs={labelOf(part).symbol} key={i} /> : part,
  );
}
