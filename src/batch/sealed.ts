import { createHash } from "node:crypto";
import { deserialize, serialize } from "node:v8";

/** Bytes before the value: a mark, then the digest of what follows. */
const mark = Buffer.from("waneline1\n");
const digestBytes = 32;

/** A value with typed arrays as bytes that tell whether they came through whole. Numbers keep every bit. */
export function sealed(value: object): Buffer {
  const bytes = serialize(value);
  return Buffer.concat([mark, digestOf(bytes), bytes]);
}

/** The value again; null where the bytes are not what was sealed. */
export function unsealed(bytes: Uint8Array): unknown {
  const start = mark.length + digestBytes;
  if (bytes.length <= start || !mark.equals(bytes.subarray(0, mark.length))) return null;
  const held = bytes.subarray(start);
  if (!digestOf(held).equals(bytes.subarray(mark.length, start))) return null;
  return owned(deserialize(held));
}

function digestOf(bytes: Uint8Array): Buffer {
  return createHash("sha256").update(bytes).digest();
}

/** Arrays with buffers of their own: as read they are views of the whole file, and to post one would copy all of it. */
function owned(value: unknown): unknown {
  if (value instanceof Float64Array) return value.slice();
  if (Array.isArray(value)) return value.map(owned);
  if (value === null || typeof value !== "object") return value;
  return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, owned(inner)]));
}
