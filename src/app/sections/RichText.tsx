import { SymbolText } from "./SymbolText.tsx";
import { symbolParts } from "./symbolParts.ts";

/** Plain text of the core with its symbols set as such: italic, indices lowered, powers raised. */
export function RichText({ text }: { text: string }) {
  const parts = symbolParts(text);
  if (parts.length === 1 && parts[0].kind === "text") return text;
  return parts.map((part, i) => {
    if (part.kind === "text") return part.text;
    return part.kind === "symbol" ? (
      // biome-ignore lint/suspicious/noArrayIndexKey: parts have no identity but their place
      <SymbolText runs={part.runs} key={i} />
    ) : (
      // biome-ignore lint/suspicious/noArrayIndexKey: parts have no identity but their place
      <sup key={i}>{part.text}</sup>
    );
  });
}
