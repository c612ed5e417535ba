import { describe, expect, it } from "vitest";
import { catalogue, labelOf } from "../../src/core/catalogue.ts";
import { comparedQuantities } from "../../src/core/comparison.ts";
import { sourcedKeys } from "../../src/core/labelSources.ts";
import { missing } from "../../src/core/quantity.ts";
import { routeNames } from "../../src/core/stationResult.ts";
import { symbolRuns, withReference } from "../../src/core/symbolRuns.ts";
import { displayOf, unitOf } from "../../src/core/unitText.ts";
import { powerLawCase } from "../figures/powerLawCase.ts";

describe("the catalogue of labels", () => {
  it("names every quantity of a station", () => {
    const [station] = powerLawCase({
      ...{ name: "a", mark: 0, n: 1.25, x0: 0, positions: [0.5], window: [0, 1], scatter: 0.01 },
      ...{ anisotropy: 1, settled: 1, balance: 1 },
    }).stations;
    const quantities = Object.entries(station).filter(
      ([, value]) => typeof value === "object" && value !== null && "value" in value,
    );
    expect(quantities.length).toBeGreaterThan(25);
    for (const [key] of quantities) expect(labelOf(key).name, key).not.toBe("");
    expect(missing("x").value).toBeNull();
  });
  it("names every estimator and every compared quantity", () => {
    for (const key of [...routeNames, ...comparedQuantities, "n", "x0", "A", "m"])
      expect(labelOf(key).key).toBe(key);
  });
  it("gives each a definition, a source and a symbol without stray marks", () => {
    for (const { key, definition, source, symbol, digits } of Object.values(catalogue)) {
      expect(definition.length, key).toBeGreaterThan(4);
      expect(source, key).not.toBe("");
      expect(digits, key).toBeGreaterThan(1);
      expect(symbol.map(({ text }) => text).join(""), key).not.toMatch(/[{}^_"]/);
    }
  });
  it("has a label for each key that a source is given for, and no key under two sources", () => {
    for (const key of sourcedKeys) expect(labelOf(key).key).toBe(key);
    expect(new Set(sourcedKeys).size).toBe(sourcedKeys.length);
  });
  it("names who defined what Pope did not", () => {
    expect(labelOf("barycentric_1").source).toContain("Banerjee");
    expect(labelOf("samples").source).toBe("common practice, no source");
    expect(labelOf("lambda").source).toContain("Pope");
  });
  it("lists no key twice", () => {
    const keys = Object.values(catalogue).map(({ key }) => key);
    expect(Object.keys(catalogue)).toEqual(keys);
  });
});

describe("a symbol", () => {
  it("sets letters italic, numbers and words upright, indices lowered", () => {
    expect(symbolRuns('T_{"int"}/L_{11}')).toEqual([
      { text: "T" },
      { text: "int", upright: true, place: "sub" },
      { text: "/", upright: true },
      { text: "L" },
      { text: "11", upright: true, place: "sub" },
    ]);
  });
  it("takes the case's own letter for its reference length", () => {
    expect(withReference(symbolRuns("x/ℓ"), "M").map(({ text }) => text)).toEqual(["x", "/", "M"]);
  });
});

describe("units", () => {
  it("follow the dimension, and a non-dimensional case has none", () => {
    expect(unitOf("L²/T³", "SI")).toBe("m²/s³");
    expect(unitOf("L²/T³", "nondimensional")).toBe("");
    expect(displayOf(labelOf("eta"), "SI")).toEqual({ factor: 1000, unit: "mm" });
    expect(displayOf(labelOf("eta"), "nondimensional")).toEqual({ factor: 1, unit: "" });
    expect(displayOf(labelOf("Tu"), "nondimensional")).toEqual({ factor: 100, unit: "%" });
  });
});
