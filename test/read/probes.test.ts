import { describe, expect, it } from "vitest";
import { collect, sourceOf } from "./support.ts";

const places = [
  [0.1, 0, 0],
  [0.1, 0.02, 0],
  [0.2, 0, 0],
];
const row = ([x, y, z]: number[], t: number) => `${x},${y},${z},${t},${6 + x + y + t},${t},${-t}\n`;
const times = Array.from({ length: 500 }, (_, i) => i * 0.25);
const heading = "x,y,z,t,u,v,w\n";
const byProbe = heading + places.map((place) => times.map((t) => row(place, t)).join("")).join("");
const byTime = heading + times.map((t) => places.map((place) => row(place, t)).join("")).join("");
const shuffledPlaces =
  heading + times.map((t, i) => places.map((_, k) => row(places[(i + k) % 3], t)).join("")).join("");

describe("a long table of several probes", () => {
  it("gives the same records probe by probe, time by time, or in any order of probes", async () => {
    const expected = (await collect(sourceOf("all.csv", byProbe))).records;
    expect(expected.map(({ origin: { x, y, z } }) => [x, y, z])).toEqual(places);
    expect(expected[2].u).toEqual(times.map((t) => 6 + 0.2 + t));
    for (const text of [byTime, shuffledPlaces]) {
      expect((await collect(sourceOf("all.csv", text))).records).toEqual(expected);
    }
  });
  it("names every position once, and that it came from the column", async () => {
    const { summary } = await collect(sourceOf("all.csv", byTime));
    expect(summary.sources.map(({ x, position }) => [x, position])).toEqual([
      [0.1, "column"],
      [0.2, "column"],
    ]);
  });
  it("with very many probes loses none of their samples", async () => {
    const count = 3000;
    const text = `x,t,u\n${[0, 1].map((t) => Array.from({ length: count }, (_, i) => `${i},${t},${i + t}\n`).join("")).join("")}`;
    const { records, summary } = await collect(sourceOf("all.csv", text));
    expect(records.length).toBe(count);
    expect(records.every(({ u, origin }) => u[0] === origin.x && u[1] === origin.x + 1)).toBe(true);
    expect(summary.rows).toBe(2 * count);
  });
  it("has its positions turned into metres and counted from the grid", async () => {
    const text = "x [mm],t,u\n350,0,6\n350,1,6.1\n";
    const [{ origin }] = (await collect(sourceOf("all.csv", text), { zero: 0.1 })).records;
    expect(origin.x).toBe(0.25);
  });
});

describe("the time left out at the start", () => {
  it("is counted from each record's first sample", async () => {
    const text = `t,u\n${Array.from({ length: 20 }, (_, i) => `${(5 + i * 0.1).toFixed(1)},${i}\n`).join("")}`;
    const [{ t, u }] = (await collect(sourceOf("x0.2.csv", text), { startup: 1 })).records;
    expect([t[0], u[0], u.length]).toEqual([6, 10, 10]);
  });
  it("is counted by the step where there is no time column", async () => {
    const text = `u\n${Array.from({ length: 20 }, (_, i) => `${i}\n`).join("")}`;
    const [{ u }] = (await collect(sourceOf("x0.2.csv", text), { startup: 0.3, step: 0.1 })).records;
    expect(u[0]).toBe(3);
  });
});

describe("the time between samples", () => {
  it.each([
    ["# dt = 5e-5", 5e-5],
    ["# dt = 0.05 ms", 5e-5],
    ["% time step: 5e-05 s", 5e-5],
    ["# sampling rate = 20 kHz", 5e-5],
    ["# sampling rate (kHz): 20", 5e-5],
    ["# fs [kHz] = 20", 5e-5],
    ["Sampling rate;20 kHz", 5e-5],
    ["# dt = 0,05 ms", 5e-5],
    ["# dt = 5,0e-5", 5e-5],
    ["# fs = 20000", 5e-5],
    ["# Sampling frequency [Hz]", null],
    ["! f_s: 20 kHz, filter 8 kHz", 5e-5],
  ])("is taken from the comment %s", async (comment, step) => {
    const work = collect(sourceOf("x0.2.csv", `${comment}\nu,v\n6,0\n6,1\n`));
    if (step === null) await expect(work).rejects.toMatchObject({ code: "no-time" });
    else expect((await work).records[0].origin.step).toBe(step);
  });
  it("given by the sheet goes before the comment", async () => {
    const { records } = await collect(sourceOf("x0.2.csv", "# dt = 1\nu\n6\n7\n8\n"), { step: 0.5 });
    expect(records[0].origin.step).toBe(0.5);
  });
});
