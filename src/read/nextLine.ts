const lineFeed = 10;
const carriageReturn = 13;

/** Behind the end of the line that begins at `from`. */
export function nextLine(bytes: Uint8Array, from: number, length: number): number {
  for (let at = from; at < length; at++) {
    if (bytes[at] === lineFeed) return at + 1;
    if (bytes[at] === carriageReturn) return bytes[at + 1] === lineFeed && at + 1 < length ? at + 2 : at + 1;
  }
  return length;
}
