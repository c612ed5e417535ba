import { describe, expect, it } from "vitest";
import { argueCases } from "../../src/core/compare/argueCases.ts";
import { resultsFile, resultsText } from "../../src/export/resultsFile.ts";
import { lawStations, plainSettings, spacedFrom } from "../support/lawStations.ts";

const law = { A: 0.06, x0: 0.075, n: 1.25, ell: 0.025, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };
const settings = {
  ...plainSettings,
  referenceLength: law.ell,
  kinematicViscosity: law.nu,
  extent: 0.1,
  body: { x: 0.9, chord: 0.1, Tu: 0.03, L11: 0.2 },
};
const stations = lawStations(law, spacedFrom(law.x0, 0.2, 2, 12), 0.01);
const { cases, comparisons } = argueCases(
  ["a", "b", "c"].map((name) => ({ name, stations, settings })),
  { align: "x0", tolerance: 0.1 },
);
const file = resultsFile(
  cases.map((argued) => ({ argued, settings: {}, sources: [], flags: [] })),
  comparisons,
);
const written = JSON.parse(resultsText(file));
const [first] = written.cases;

/** Every object under a key that holds a `value`, with its path. */
function quantities(found: unknown, path = ""): [string, Record<string, unknown>][] {
  if (found === null || typeof found !== "object") return [];
  const own =
    "value" in found && !path.includes("flags")
      ? [[path, { ...found }] as [string, Record<string, unknown>]]
      : [];
  return [...own, ...Object.entries(found).flatMap(([key, inner]) => quantities(inner, `${path}.${key}`))];
}

describe("the argument in the results file", () => {
  it("stands under scan, development and body, and beside the fit", () => {
    expect(first.scan.first).toHaveLength(12);
    expect(first.scan.last.at(-1).adopted).toBe(true);
    expect(first.scan.end[0].key).toBe("L11");
    expect(first.development.criteria.map(({ key }: { key: string }) => key)).toEqual(
      expect.arrayContaining(["isotropy_uv", "S_dudx", "balance", "window"]),
    );
    expect(first.body.at.Tu.value).toBeGreaterThan(0);
    expect(first.body.targets.L11_chord.target).toBe(0.2);
    for (const key of ["routes", "region", "bootstrap", "growths", "narrowing", "local", "together"])
      expect(first.decay, key).toHaveProperty(key);
    expect(written.comparisons[1].common_n_of_all.cases).toEqual(["a", "b", "c"]);
  });
  it("gives every quantity a value with two ends, or a reason, and nothing that only the program needs", () => {
    const all = [first.scan, first.development, first.body, first.decay].flatMap((part) => quantities(part));
    expect(all.length).toBeGreaterThan(100);
    for (const [path, quantity] of all) {
      if (quantity.value === null) expect(quantity.why, path).toBeTypeOf("string");
      else
        for (const end of ["low", "high"])
          expect(quantity[end] === null || Number.isFinite(quantity[end]), path).toBe(true);
      expect(quantity, path).not.toHaveProperty("error");
    }
  });
  it("leaves the keys empty where nothing was argued", () => {
    const [one] = cases;
    const { argument: _, ...decay } = one.decay;
    const bare = resultsFile([{ argued: { ...one, decay }, settings: {}, sources: [], flags: [] }], []);
    expect([bare.cases[0].scan, bare.cases[0].development, bare.cases[0].body]).toEqual([{}, {}, {}]);
  });
});
