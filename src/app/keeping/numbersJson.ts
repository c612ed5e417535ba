/**
 * JSON that keeps every bit of the numbers: arrays of doubles as base64 of their little-endian bytes under the key
 * `float64`, and numbers that JSON has no sign for by their names under `number`.
 */
export function numbersToJson(value: unknown): string {
  return JSON.stringify(value, (_, inner: unknown) => {
    if (inner instanceof Float64Array) return { float64: toBase64(inner) };
    if (typeof inner === "number" && (!Number.isFinite(inner) || Object.is(inner, -0)))
      return { number: Object.is(inner, -0) ? "-0" : String(inner) };
    return inner;
  });
}

/** @throws SyntaxError where the text is no JSON */
export function numbersFromJson(text: string): unknown {
  return JSON.parse(text, (_, inner: unknown) => {
    if (inner === null || typeof inner !== "object") return inner;
    const [[key, held] = ["", null], ...more] = Object.entries(inner);
    if (more.length > 0 || typeof held !== "string") return inner;
    if (key === "float64") return fromBase64(held);
    return key === "number" ? Number(held) : inner;
  });
}

/** Characters that are joined at once: the call takes them as arguments, and a stack holds only so many. */
const chunk = 8192;

function toBase64(values: Float64Array): string {
  const bytes = new Uint8Array(values.buffer, values.byteOffset, values.byteLength);
  let text = "";
  for (let at = 0; at < bytes.length; at += chunk)
    text += String.fromCharCode(...bytes.subarray(at, at + chunk));
  return btoa(text);
}

function fromBase64(text: string): Float64Array {
  const bytes = Uint8Array.from(atob(text), (character) => character.charCodeAt(0));
  return new Float64Array(bytes.buffer, 0, bytes.length >> 3);
}
