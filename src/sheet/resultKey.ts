import { hashBytes } from "../core/hashBytes.ts";
import type { ReadSettings } from "../core/records.ts";
import type { ReduceSettings } from "../core/stationResult.ts";

/**
 * The key a file's reduction is kept under: it changes when the file, its reading or its reducing does, and not
 * with the order in which settings were written.
 */
export function resultKey(fingerprint: string, read: ReadSettings, reduce: ReduceSettings): string {
  return hashBytes(new TextEncoder().encode(JSON.stringify([fingerprint, sorted(read), sorted(reduce)])));
}

function sorted(value: unknown): unknown {
  if (value === null || typeof value !== "object" || Array.isArray(value)) return value;
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return entries.map(([key, inner]) => [key, sorted(inner)]);
}
