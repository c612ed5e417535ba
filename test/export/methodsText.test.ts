import { describe, expect, it } from "vitest";
import { program } from "../../src/core/program.ts";
import { methodsText } from "../../src/export/methodsText.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { decayOf, stationAt } from "../app/fixtures.ts";
import { madeComparison } from "../figures/madeComparison.ts";

const stations = [0.2, 0.4, 0.8].map((x) => stationAt(x));
const screen = {
  name: "screen",
  settings: { ...defaultCaseSheet, case: "screen", kinematicViscosity: 1.5e-5 },
  stations,
  decay: decayOf(stations),
};
const textOf = (change: object) => methodsText([{ ...screen, ...change }], []).text;
const reduced = (reduce: object) => ({
  settings: { ...screen.settings, reduce: { ...screen.settings.reduce, ...reduce } },
});

describe("the methods text", () => {
  it("says what was done, with numbers and the program's version, and without NaN or undefined", () => {
    const { text } = methodsText([screen], []);
    expect(text).toContain("3 stations from x = 0.20 to 0.80");
    expect(text).toContain("Welch");
    expect(text).toContain(`Waneline ${program.version}`);
    expect(text).not.toMatch(/NaN|undefined|null|\.\.|[a-z)] [A-Z][a-z]+ (is|are|of n)/);
  });

  it("follows the settings: another route, another correlation, no correction, a start-up left out", () => {
    expect(textOf({})).toContain("first zero");
    expect(textOf(reduced({ integralScale: "model" }))).toContain("von Kármán");
    expect(textOf(reduced({ correlation: "unbiased" }))).toContain("number of pairs");
    expect(textOf(reduced({ taylorCorrection: false }))).toContain("without a correction");
    expect(textOf({ settings: { ...screen.settings, startup: 2 } })).toContain("were left out");
    expect(textOf({ settings: { ...screen.settings, fit: { ...screen.settings.fit, n: 1.2 } } })).toContain(
      "n held at 1.20",
    );
  });

  it("says with which exponent the origins were found that cases are held against each other by", () => {
    const compared = (change: object) =>
      methodsText([screen], [{ ...madeComparison, align: "x0" as const, ...change }]).text;
    expect(compared({ aligned_with: "common n" })).toContain("with one common exponent");
    expect(compared({ aligned_with: "own n" })).toContain("each law has with its own exponent");
    expect(compared({ align: "x", aligned_with: "own n" })).not.toContain("exponent,");
  });

  it("names as sources what it used and nothing else", () => {
    const { bibTeX } = methodsText([screen], []);
    expect(bibTeX).toContain("@article{welch1967");
    expect(bibTeX).toContain("@article{lumley1965");
    expect(bibTeX).not.toContain("karman1948");
    expect(methodsText([{ ...screen, ...reduced({ taylorCorrection: false }) }], []).bibTeX).not.toContain(
      "lumley1965",
    );
    const keys = [...bibTeX.matchAll(/^@\w+\{(\w+),/gm)].map(([, key]) => key);
    expect(new Set(keys).size).toBe(keys.length);
    expect(bibTeX.split("{").length).toBe(bibTeX.split("}").length);
  });

  it("says what was not tested where u alone was recorded", () => {
    const alone = stations.map((station) => ({
      ...station,
      facts: { ...station.facts, components: ["u" as const] },
    }));
    expect(textOf({ stations: alone })).toContain("Isotropy was assumed and not tested in screen");
    expect(textOf({})).not.toContain("Isotropy was assumed");
  });

  it("names the cases where they were treated differently, and not where they were treated alike", () => {
    const other = { ...screen, name: "inflow" };
    expect(methodsText([screen, other], []).text).not.toContain("For screen:");
    const differs = { ...other, ...reduced({ correlation: "unbiased" }) };
    const { text } = methodsText([screen, differs], []);
    expect(text).toContain("For screen: ");
    expect(text).toContain("For inflow: ");
  });
});
