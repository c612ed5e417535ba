/** Where a text stops being JSON, 1-based as an editor counts, and what stands there. */
export interface JsonFault {
  readonly line: number;
  readonly column: number;
  readonly found: string;
}

const blanks = /[\t\n\r ]*/y;
const token =
  /([{}[\]:,])|("(?:[^"\\\p{Cc}]|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*")|(-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?(?![\w.])|(?:true|false|null)\b)/uy;

/** What may come next; "first" may also close what was just opened. */
type Want = "value" | "first-value" | "key" | "first-key" | "colon" | "end" | "nothing";

/**
 * Finds the first place where a text is not JSON. Engines word this differently and some give no place at all.
 * @param text a text that JSON.parse refuses
 */
export function jsonFault(text: string): JsonFault {
  const open: string[] = [];
  let want: Want = "value";
  let at = 0;
  for (;;) {
    blanks.lastIndex = at;
    token.lastIndex = at + (blanks.exec(text)?.[0].length ?? 0);
    const from = token.lastIndex;
    const match = token.exec(text);
    const next: Want | null = match === null ? null : after(want, match, open);
    if (match === null || next === null) return placeOf(text, from);
    want = next;
    at = from + match[0].length;
  }
}

/** What must follow a token; null where it may not stand here. Keeps count of what is open. */
function after(want: Want, [, sign, string]: RegExpExecArray, open: string[]): Want | null {
  const done = (): Want => (open.length > 0 ? "end" : "nothing");
  const opening = open.at(-1);
  if ((sign === "}" || sign === "]") && opening === (sign === "}" ? "{" : "[")) {
    if (want !== "end" && want !== (sign === "}" ? "first-key" : "first-value")) return null;
    open.pop();
    return done();
  }
  switch (want) {
    case "value":
    case "first-value":
      if (sign === undefined) return done();
      if (sign !== "{" && sign !== "[") return null;
      open.push(sign);
      return sign === "{" ? "first-key" : "first-value";
    case "key":
    case "first-key":
      return string === undefined ? null : "colon";
    case "colon":
      return sign === ":" ? "value" : null;
    case "end":
      if (sign !== ",") return null;
      return opening === "{" ? "key" : "value";
    case "nothing":
      return null;
  }
}

function placeOf(text: string, at: number): JsonFault {
  const before = text.slice(0, at).split("\n");
  const rest = text.slice(at).split("\n", 1)[0].slice(0, 20);
  return {
    line: before.length,
    column: before[before.length - 1].length + 1,
    found: rest === "" ? "the end of the text" : rest,
  };
}
