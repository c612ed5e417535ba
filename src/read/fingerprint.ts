import { hashBytes } from "../core/hashBytes.ts";

/**
 * Tells two contents of one name apart without reading the whole file: size, time of change, first bytes.
 * @param bytes    size of the file
 * @param modified time of its last change, ms since 1970; 0 where it is not known
 * @param head     its first bytes, as many as the caller cares to read
 */
export function fingerprint(bytes: number, modified: number, head: Uint8Array): string {
  return `${bytes.toString(36)}-${Math.round(modified).toString(36)}-${hashBytes(head)}`;
}
