import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { darkTokens, lightTokens, type Tokens } from "../../src/figures/tokens.ts";

const css = readFileSync(join(import.meta.dirname, "../../src/app/styles/tokens.css"), "utf8");
const [light, dark] = css.split(':root[data-theme="dark"]');

const inStyle = (block: string, name: string) => new RegExp(`--${name}: (#[0-9a-f]{6});`).exec(block)?.[1];

describe.each([
  ["light", light, lightTokens],
  ["dark", dark, darkTokens],
])("the %s page", (_, block, tokens: Tokens) => {
  const { cases, ...plain } = tokens;

  it.each(Object.entries(plain))("has the figures' %s", (name, colour) =>
    expect(inStyle(block, name)).toBe(colour),
  );

  it("gives every case the colour it has in the figures", () =>
    expect(cases.map((_colour, i) => inStyle(block, `case-${i + 1}`))).toEqual(cases));
});
