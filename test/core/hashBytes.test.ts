import { expect, it } from "vitest";
import { hashBytes } from "../../src/core/hashBytes.ts";

// Test vectors of the algorithm's authors (Fowler, Noll, Vo; isthe.com/chongo/tech/comp/fnv), from memory.
it.each([
  ["", "cbf29ce484222325"],
  ["a", "af63dc4c8601ec8c"],
  ["foobar", "85944171f73967e8"],
])("the hash of %j is the published one", (text, hash) => {
  expect(hashBytes(new TextEncoder().encode(text))).toBe(hash);
});

// The same by whole-number arithmetic, which the halves stand in for.
it("the hash in halves equals the hash in one piece", () => {
  const bytes = Uint8Array.from({ length: 500 }, (_, i) => (i * 37 + 11) & 255);
  let hash = 0xcbf29ce484222325n;
  for (const byte of bytes) hash = BigInt.asUintN(64, (hash ^ BigInt(byte)) * 0x100000001b3n);
  expect(hashBytes(bytes)).toBe(hash.toString(16).padStart(16, "0"));
});
