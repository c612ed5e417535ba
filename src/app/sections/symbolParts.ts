import { labelOf, type Run } from "../../core/catalogue.ts";

/** A stretch of a text as the page sets it: plain, a symbol, or raised. */
export type TextPart =
  | { readonly kind: "text"; readonly text: string }
  | { readonly kind: "symbol"; readonly runs: readonly Run[] }
  | { readonly kind: "raised"; readonly text: string };

/** Quantities that texts of the core name by their keys, the longer names first. */
const keys =
  "C_epsilon|Re_lambda|S_dudx|T_int|Re_L|epsilon_decay|epsilon_gradient|epsilon|lambda|L11|eta|x0|k1";
/** Letters that stand for a quantity when they stand alone. The units m and s and the article a are none. */
const single = "[uvwxyzkqnprtfUTNEKLFS]|Tu|uu|vv|ww|uv|uw|vw|[AB](?= \\(\\()|[α-ορ-ωΛ]";
/** A letter before it, a folder or the rest of a file's name makes it another word; a factor does not. */
const before = "(?<![\\p{L}_'’]|[\\p{L}_][0-9]+|[\\p{L}0-9_][.-]|[\\p{L}0-9.]{4}/)";
const after = "(?![\\p{L}0-9_]|[.-][\\p{L}0-9_])";
const primed = `(?:′|'(?!\\p{L})|${after})`;

const symbols = new RegExp(
  [
    `${before}(?<key>${keys})${after}`,
    `${before}(?<base>[A-Za-z]{1,2}|[α-ωΛ])_(?<index>[A-Za-zα-ω0-9]{1,3})${after}`,
    "(?<![\\p{L}_])(?<lowered>d?[A-Za-zα-ωΛ])(?<digits>[₀-₉]+)",
    `(?:${before}|(?<=[′₀-₉]))d?(?:${single})${primed}`,
    "\\^\\((?<power>[^)]+)\\)|\\^(?<exponent>[a-z0-9]+)",
  ].join("|"),
  "gu",
);
/** A minus of plain text: before a number, or between blanks; the hyphen of a word or of a file's name is none. */
const minusSigns = /(?<=^|[ (])-(?=\d| )/g;
/** Of an index: components, orders and the letters of other symbols are italic, words and numbers upright. */
const running = /^[a-z]$|^L+$|^[ijk]{2}$|^[uvw]{2}$|^[α-ω]$/;

/**
 * A plain text with the symbols in it told apart: keys such as lambda or x0, letters with an index as in D_LL or E₁₁,
 * and letters that stand alone. Words, numbers, units and names of files stay as they are.
 */
export function symbolParts(text: string): readonly TextPart[] {
  const before = known.get(text);
  if (before !== undefined) return before;
  const parts = partsOf(text);
  if (known.size >= mostKnown) known.clear();
  known.set(text, parts);
  return parts;
}

/** A page sets the same texts again and again while a bracket moves. */
const known = new Map<string, readonly TextPart[]>();
const mostKnown = 2000;

function partsOf(text: string): TextPart[] {
  const parts: TextPart[] = [];
  const plain = (piece: string) => parts.push({ kind: "text", text: piece.replace(minusSigns, "\u2212") });
  let from = 0;
  for (const match of text.matchAll(symbols)) {
    if (match.index > from) plain(text.slice(from, match.index));
    parts.push(partOf(match[0], match.groups ?? {}));
    from = match.index + match[0].length;
  }
  if (from < text.length || parts.length === 0) plain(text.slice(from));
  return parts;
}

function partOf(whole: string, groups: Readonly<Record<string, string | undefined>>): TextPart {
  const { key, base, index, lowered, digits, power, exponent } = groups;
  if (key !== undefined) return { kind: "symbol", runs: labelOf(key).symbol };
  if (power !== undefined || exponent !== undefined) return { kind: "raised", text: power ?? exponent ?? "" };
  if (base !== undefined && index !== undefined) return symbol({ text: base }, lowRun(index));
  if (lowered !== undefined && digits !== undefined)
    return symbol({ text: lowered }, lowRun(plainDigits(digits)));
  return symbol({ text: whole.replace("'", "′") });
}

const symbol = (...runs: readonly Run[]): TextPart => ({ kind: "symbol", runs });

function lowRun(text: string): Run {
  return running.test(text) ? { text, place: "sub" } : { text, place: "sub", upright: true };
}

const plainDigits = (digits: string) => [...digits].map((one) => "₀₁₂₃₄₅₆₇₈₉".indexOf(one)).join("");
