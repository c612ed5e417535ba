import { describe, expect, it } from "vitest";
import { crc32, withResolution } from "../../../src/app/plot/pngResolution.ts";

describe("the resolution in a PNG", () => {
  it("is closed by the check sum that the standard asks for", () => {
    // "IEND" without data: AE 42 60 82 stands at the end of every PNG file
    expect(crc32(new Uint8Array([0x49, 0x45, 0x4e, 0x44]))).toBe(0xae426082);
  });
  it("stands after the head, in dots per metre", async () => {
    const bytes = Uint8Array.from({ length: 60 }, (_, i) => i);
    const out = new Uint8Array(await (await withResolution(new Blob([bytes]), 600)).arrayBuffer());
    expect(out.length).toBe(81);
    expect([...out.slice(0, 33)]).toEqual([...bytes.slice(0, 33)]);
    expect(String.fromCharCode(...out.slice(37, 41))).toBe("pHYs");
    // 600 per inch over 0.0254 m
    expect(new DataView(out.buffer).getUint32(41)).toBe(23622);
    expect([...out.slice(54)]).toEqual([...bytes.slice(33)]);
  });
});
