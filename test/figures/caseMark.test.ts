import { describe, expect, it } from "vitest";
import { caseMark } from "../../src/figures/caseMark.ts";
import { darkTokens, lightTokens, printTokens, type Tokens } from "../../src/figures/tokens.ts";

/** Relative luminance and contrast: W3C, Web Content Accessibility Guidelines 2.2, from memory. */
function luminance(colour: string): number {
  const [r, g, b] = [1, 3, 5]
    .map((at) => Number.parseInt(colour.slice(at, at + 2), 16) / 255)
    .map((part) => (part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (light + 0.05) / (dark + 0.05);
}

describe.each([
  ["light", lightTokens],
  ["dark", darkTokens],
  ["print", printTokens],
] as [string, Tokens][])("colours of the %s page", (_, tokens) => {
  it("keep every case at 3 : 1 or more on paper and ground", () => {
    for (const colour of tokens.cases)
      for (const behind of [tokens.paper, tokens.ground])
        expect(contrast(colour, behind)).toBeGreaterThanOrEqual(3);
  });
  it("keep text at 4.5 : 1 or more", () => {
    for (const ink of [tokens.ink, tokens.ink2, tokens.ink3, tokens.fault])
      for (const behind of [tokens.paper, tokens.ground])
        expect(contrast(ink, behind)).toBeGreaterThanOrEqual(4.5);
  });
});

describe("marks of the cases", () => {
  it("differ by marker and by dash alone, for grey print", () => {
    const marks = [0, 1, 2, 3, 4, 5].map((i) => caseMark(lightTokens, i));
    expect(new Set(marks.map(({ marker }) => marker)).size).toBe(6);
    expect(new Set(marks.map(({ dash }) => dash.join())).size).toBe(6);
  });
  it("repeat in open form from the seventh case on", () => {
    expect(caseMark(lightTokens, 6)).toEqual({ ...caseMark(lightTokens, 0), open: true });
  });
});
