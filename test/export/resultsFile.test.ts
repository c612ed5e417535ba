import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { program } from "../../src/core/program.ts";
import { resultsFile, resultsText } from "../../src/export/resultsFile.ts";
import { exampleCase, exampleComparison } from "./exampleResults.ts";

const settings = { case: "a", layout: "series", files: [] };
const sources = [{ name: "x0200.csv", bytes: 4096, x: 0.2, position: "sheet" as const }];
const flags = [{ code: "gap" as const, text: "Three gaps", value: 3 }];
const file = resultsFile(
  [
    { argued: exampleCase("a"), settings, sources, flags },
    { argued: exampleCase("b"), settings, sources: [], flags: [] },
  ],
  [exampleComparison],
);
const written = JSON.parse(resultsText(file));
const [first] = written.cases;
const [station] = first.stations;

describe("the results file", () => {
  it("says which program and version wrote it, the one of package.json", () => {
    const { name, version } = JSON.parse(
      readFileSync(new URL("../../package.json", import.meta.url), "utf8"),
    );
    expect(program).toMatchObject({ name, version });
    expect([written.program, written.version, written.schema]).toEqual([name, version, 1]);
  });

  it("has every key of a case", () => {
    for (const key of [
      "case",
      "settings",
      "sources",
      "stations",
      "decay",
      "scan",
      "development",
      "body",
      "flags",
    ])
      expect(first, key).toHaveProperty(key);
    expect(first.settings).toEqual(settings);
    expect(first.sources).toEqual(sources);
  });

  it("has every quantity of a station under the trade's name", () => {
    const keys =
      "x samples duration U uu vv ww uv uw vw k Tu isotropy_uv isotropy_uw T_int L11 lambda gradient epsilon " +
      "epsilon_gradient epsilon_decay epsilon_inertial eta Re_lambda Re_L C_epsilon S_dudx balance routes flags";
    for (const key of keys.split(" ")) expect(station, key).toHaveProperty(key);
  });

  it("writes a quantity as a value with its ends and nothing that only the program needs", () => {
    expect(station.U).toEqual({ value: 1, low: 0.5, high: 1.5 });
    expect(station.routes.lambda_f).toEqual({ value: 0.004, low: 0.003, high: 0.005 });
  });

  it("writes a missing quantity with its reason, never as zero", () => {
    expect(station.ww).toEqual({ value: null, why: "there is no w column, or none that is known" });
  });

  it("says why an end of an interval is null", () => {
    expect(station.L11).toEqual({ value: 0.024, low: 0.02, high: null, why_high: "no upper limit" });
    expect(first.decay.x0).toEqual({ value: 0.05, low: null, high: 0.1, why_low: "no lower limit" });
    expect(station.T_int).toMatchObject({ low: null, high: null, why_low: expect.stringMatching(/short/) });
  });

  it("has every key of a decay", () => {
    const keys =
      "quantity residuals weights window stations n x0 A correlation_n_x0 chi2_reduced given_window lambda_route growth hypotheses";
    for (const key of keys.split(" ")) expect(first.decay, key).toHaveProperty(key);
    expect(first.decay.given_window.n).toEqual({ value: 1.25, low: 1.22, high: 1.28 });
    expect(first.decay.growth.m.value).toBe(0.37);
    expect(first.decay.hypotheses).toEqual([{ name: "Saffman", n: 1.2, p: 0.41, test: null }]);
  });

  it("lists the doubts about the case and about its decay together", () => {
    expect(first.flags.map((flag: { code: string }) => flag.code)).toEqual(["gap", "half-open"]);
  });

  it("has every key of a comparison", () => {
    const [comparison] = written.comparisons;
    expect(comparison).toMatchObject({ cases: ["a", "b"], align: "x0", tolerance: 0.1, overlap: [10, 60] });
    for (const key of ["Tu", "L11", "lambda", "eta", "Re_lambda", "isotropy_uv"])
      expect(comparison.quantities[key]).toMatchObject({
        ratio: { value: 1.02, low: 0.98, high: 1.06 },
        largest: { value: 1.1 },
        verdict: "equivalent",
      });
    expect(comparison.extra_distance.value).toBe(0.4);
    expect(comparison.matched_distance).toEqual({ value: null, why: "the cases share no intensity" });
    expect(comparison.common_n).toMatchObject({ value: 1.22, p: 0.4 });
  });

  it("gives numbers back bit for bit and holds no number as a text", () => {
    const value = 0.1 + 0.2;
    const argued = { ...exampleCase("a"), stations: [{ ...exampleCase("a").stations[0], x: value }] };
    const again = JSON.parse(resultsText(resultsFile([{ argued, settings, sources, flags }], [])));
    expect(again.cases[0].stations[0].x).toBe(value);
    expect(JSON.stringify(written)).not.toMatch(/NaN|Infinity|"-?\d+(\.\d+)?"/);
  });
});
