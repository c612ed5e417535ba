import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { flagCodes } from "../src/core/flag.ts";

const readme = readFileSync("README.md", "utf8");

describe("the README", () => {
  it("lists every flag code that a result can carry, and no other", () => {
    const section = readme.slice(readme.indexOf("## Flags"), readme.indexOf("## What it does not do"));
    const listed = [...section.matchAll(/^\| `([a-z-]+)` \|/gm)].map((match) => match[1]);
    expect(listed.sort()).toEqual([...flagCodes].sort());
  });

  it("begins with the job and gives the two commands", () => {
    expect(readme).toContain("npm ci && npm start");
    expect(readme).toContain("npm ci && npm test");
  });
});
