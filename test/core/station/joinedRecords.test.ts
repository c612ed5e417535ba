import { describe, expect, it } from "vitest";
import { joinCorrelations } from "../../../src/core/station/joinCorrelations.ts";
import { joinParts } from "../../../src/core/station/joinParts.ts";
import { joinSpectra } from "../../../src/core/station/joinSpectra.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { expectClose } from "../../support/expectClose.ts";
import { centred, close, count, flagOf, mean, productAt, quick, step, u, v, w } from "./quickStation.ts";
import { partOf, type Signal, settings } from "./records.ts";

describe("records of one x put together", () => {
  const short: Signal = { u: quick(1000, 11).map((value) => 10.1 + value), v: quick(1000, 12) };
  const parts = [
    partOf({ u, v, w }, { origin: { file: "b.csv", y: 0.1 }, settings: { segment: 128 } }),
    partOf(short, { origin: { file: "a.csv", y: 0.2 }, settings: { segment: 64 } }),
  ];
  const record = joinParts(parts, settings);
  const [x, y] = [centred(u), centred(short.u)];

  it("that were not taken together are each about its own mean, and count by length", () => {
    expect(record.together).toBe(false);
    expect(record.parts.map(({ origin }) => origin.file)).toEqual(["a.csv", "b.csv"]);
    expect(record.components).toEqual(["u", "v"]);
    expectClose(record.means[0], (3000 * mean(u) + 1000 * mean(short.u)) / 4000, close);
    expect([record.samples, record.repeats]).toEqual([4000, 1]);
    expectClose(record.duration, 4, close);
    expectClose(record.span, 4, close);
    const sum = (name: string) =>
      record.rows.reduce((total, row) => total + row[record.fields.indexOf(name)], 0);
    expectClose(sum("uu"), productAt(x, 0) + productAt(y, 0), close);
    expectClose(sum("uv"), productAt(x, 0, centred(v)) + productAt(y, 0, centred(short.v ?? v)), close);
    expectClose(sum("u"), 0, { absolute: 1e-9, because: "sums about means" });
    expect(record.rows.length).toBe(record.blocks.length);
  });
  it("have one correlation: sums of products over sums of samples, or of pairs", () => {
    const [biased, unbiased] = [false, true].map((way) => joinCorrelations(record, way));
    [0, 1, 7].forEach((l) => {
      const products = productAt(x, l) + productAt(y, l);
      expectClose(biased?.covariance[0][l], products / 4000, close);
      expectClose(unbiased?.covariance[0][l], products / (4000 - 2 * l), close);
    });
    expect([biased?.step, biased?.stride]).toEqual([step, 1]);
  });
  it("have one spectrum, on the bins of the shortest segment, by length", () => {
    const spectra = joinSpectra(record);
    const of = (one: StationPart) => joinSpectra(joinParts([one], settings));
    const [long, brief] = [of(parts[0]), of(parts[1])];
    expect([spectra?.size, spectra?.segments]).toEqual([64, (long?.segments ?? 0) + (brief?.segments ?? 0)]);
    const fine = long?.density[0] ?? new Float64Array(0);
    // a bin of the coarser spectrum takes a finer one, and half of each neighbour
    const coarse = (fine[9] / 2 + fine[10] + fine[11] / 2) / 2;
    expectClose(spectra?.density[0][5], (3000 * coarse + 1000 * (brief?.density[0][5] ?? 0)) / 4000, close);
    expect(spectra?.cross).not.toBeNull();
  });
  it("that were taken together are averaged row by row, and last as long as one", () => {
    const rake = [0, 1, 2].map((i) =>
      partOf({ u: quick(count, 20 + i).map((value) => 10 + value) }, { origin: { y: 0.1 * i } }),
    );
    const joined = joinParts(rake, settings);
    expect(joined.together).toBe(true);
    expectClose(joined.span, 3, close);
    expectClose(joined.duration, 9, close);
    expect(joined.rows.length).toBe(rake[0].blocks.rows);
    const sum = joined.rows.reduce((total, row) => total + row[joined.fields.indexOf("uu")], 0);
    const each = [0, 1, 2].map((i) => productAt(centred(quick(count, 20 + i)), 0));
    expectClose(sum, (each[0] + each[1] + each[2]) / 3, close);
    expect(joined.blocks[2].map(({ block }) => block)).toEqual([2, 2, 2]);
    expect(joinParts(rake, { ...settings, simultaneous: false }).together).toBe(false);
    const late = { ...rake[2], start: 0.6 * step };
    expect(joinParts([rake[0], rake[1], late], settings).together).toBe(false);
    expect(joinParts([rake[0], rake[1], late], { ...settings, simultaneous: true }).together).toBe(true);
    const same = rake.map((one) => ({ ...one, origin: { ...one.origin, y: 1 } }));
    expect(joinParts(same, settings).together).toBe(false);
  });
  it("of another time step count for the moments only, and that is said", () => {
    const other = partOf(short, { origin: { file: "c.csv", y: 0.3, step: 2e-3 } });
    const found = reduceStation([partOf({ u, v }, { origin: { y: 0.1, file: "b.csv" } }), other], settings);
    expect(flagOf(found, "probes-joined")?.value).toBe(1);
    expect(flagOf(found, "probes-joined")?.text).toMatch(/^1 of 2 records has another time step/);
    expectClose(found.uu.value, (productAt(x, 0) + productAt(y, 0)) / 4000, close);
    expect(found.sources.map(({ name }) => name)).toEqual(["b.csv", "c.csv"]);
  });
});
