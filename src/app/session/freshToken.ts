/** A text that no drop and no file opened before has had, in this page or an earlier one. */
export function freshToken(): string {
  // 48 random bits, which a page from disk has too
  const parts = crypto.getRandomValues(new Uint32Array(2));
  return parts[0].toString(36) + (parts[1] & 0xffff).toString(36);
}
