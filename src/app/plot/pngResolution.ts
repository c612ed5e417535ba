const inchesPerMetre = 1 / 0.0254;
/** Signature and IHDR of a PNG: the resolution stands after them. */
const headBytes = 33;

/**
 * The same picture with a pHYs chunk that states its dots per inch.
 * @see W3C, Portable Network Graphics, §11.3.5.3 and annex D (CRC)
 */
export async function withResolution(png: Blob, dpi: number): Promise<Blob> {
  const bytes = new Uint8Array(await png.arrayBuffer());
  const chunk = new Uint8Array(21);
  const view = new DataView(chunk.buffer);
  view.setUint32(0, 9);
  chunk.set(
    [..."pHYs"].map((letter) => letter.charCodeAt(0)),
    4,
  );
  const perMetre = Math.round(dpi * inchesPerMetre);
  view.setUint32(8, perMetre);
  view.setUint32(12, perMetre);
  chunk[16] = 1;
  view.setUint32(17, crc32(chunk.subarray(4, 17)));
  return new Blob([bytes.slice(0, headBytes), chunk, bytes.slice(headBytes)], { type: "image/png" });
}

/** Cyclic redundancy check of PNG: polynomial 0xEDB88320, all bits turned over. */
export function crc32(bytes: Uint8Array): number {
  let crc = 0xffffffff;
  for (const byte of bytes) {
    crc ^= byte;
    for (let bit = 0; bit < 8; bit++) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0);
  }
  return (crc ^ 0xffffffff) >>> 0;
}
