/** Names that some systems keep for devices; with any ending they are not files there. */
const reserved = /^(con|prn|aux|nul|com\d|lpt\d)$/i;

/**
 * File names for case names: one plain name each, never a path, never one name for two cases.
 * Letters and digits of any script, dot, hyphen, underscore and blank are kept; anything else becomes a hyphen.
 * @param names as the user wrote them, in order
 * @returns     in the same order; differing also where a system does not tell capitals from small letters
 */
export function safeFileNames(names: readonly string[]): string[] {
  const taken = new Set<string>();
  return names.map((name) => {
    const plain = plainName(name);
    let free = plain;
    for (let copy = 2; taken.has(free.toLowerCase()); copy++) free = `${plain}-${copy}`;
    taken.add(free.toLowerCase());
    return free;
  });
}

function plainName(name: string): string {
  const kept = [...name.normalize("NFC").replace(/[^\p{L}\p{M}\p{N}._ -]/gu, "-")]
    .slice(0, 60) // a file name holds 255 bytes, a character up to four of them
    .join("")
    .replace(/^[. -]+|[. ]+$/g, "");
  if (kept === "") return "case";
  return reserved.test(kept) ? `case-${kept}` : kept;
}
