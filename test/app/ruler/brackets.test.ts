import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bodyKeys } from "../../../src/app/ruler/bodyKeys.ts";
import { bracketKeys } from "../../../src/app/ruler/bracketKeys.ts";
import { gestureWindows } from "../../../src/app/ruler/gestureWindows.ts";
import { originAt, originKeys } from "../../../src/app/ruler/originKeys.ts";
import { edgeStation, moveEdge, nearestStation, onStations } from "../../../src/app/ruler/snapWindow.ts";

const stations = [0.15, 0.2, 0.25, 0.3, 0.35, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.2, 1.4, 1.6, 1.8];
const moved = (key: string, shift = false, window = [0.3, 1.8] as const, edge = "start" as "start" | "end") =>
  bracketKeys(stations, window, edge, key, shift);

describe("a window on stations", () => {
  it("snaps to the nearest station, upstream where two are equally near", () => {
    expect(nearestStation(stations, 0.44)).toBe(5);
    expect(nearestStation([0, 1], 0.5)).toBe(0);
    expect(nearestStation(stations, -9)).toBe(0);
  });
  it("given between stations holds those inside", () => {
    expect(onStations(stations, [0.28, 1.75])).toEqual([0.3, 1.6]);
  });
  it("finds its station although a sheet's last bit differs", () => {
    expect(edgeStation(stations, [0.1 + 0.2, 1.8], "start")).toBe(3);
  });
  it("keeps two stations inside and its own order, wherever an edge is moved", () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: -2000, max: 5000 }), { minLength: 2, maxLength: 30 }),
        fc.nat(),
        fc.nat(),
        fc.integer({ min: -40, max: 40 }),
        fc.boolean(),
        (places, a, b, to, start) => {
          // in whole mm, as files name them
          const xs = places.map((mm) => mm / 1000).sort((x, y) => x - y);
          const first = a % (xs.length - 1);
          const last = first + 1 + (b % (xs.length - 1 - first));
          const window = moveEdge(xs, [xs[first], xs[last]], start ? "start" : "end", to);
          return xs.indexOf(window[0]) >= 0 && xs.indexOf(window[1]) > xs.indexOf(window[0]);
        },
      ),
      { seed: 20_261, numRuns: 300 },
    );
  });
});

describe("the keys of a bracket", () => {
  it("move it by one station, with Shift by five", () => {
    expect(moved("ArrowRight")).toEqual({ kind: "move", window: [0.35, 1.8] });
    expect(moved("ArrowLeft")).toEqual({ kind: "move", window: [0.25, 1.8] });
    expect(moved("ArrowRight", true)).toEqual({ kind: "move", window: [0.7, 1.8] });
    expect(moved("ArrowLeft", true, [0.3, 1.8], "end")).toEqual({ kind: "move", window: [0.3, 0.9] });
  });
  it("take it as far as it may go: never past the other bracket", () => {
    expect(moved("Home")).toEqual({ kind: "move", window: [0.15, 1.8] });
    expect(moved("End")).toEqual({ kind: "move", window: [1.6, 1.8] });
    expect(moved("Home", false, [0.3, 1.8], "end")).toEqual({ kind: "move", window: [0.3, 0.35] });
  });
  it("return it to automatic, or back, and leave other keys alone", () => {
    expect(moved("A")).toEqual({ kind: "automatic" });
    expect(moved("Escape")).toEqual({ kind: "back" });
    expect(moved("Tab")).toBeNull();
  });
});

describe("a bracket dragged in several lanes", () => {
  const lane = { stations, map: { at: 0, perX: 400 } };
  it("moves each lane's own bracket by as much, to its own nearest station", () => {
    const windows = gestureWindows(
      [
        { ...lane, id: "a", window: [0.3, 1.8] },
        { ...lane, id: "b", window: [0.25, 1.6] },
      ],
      "start",
      42,
    );
    expect([...windows]).toEqual([
      ["a", [0.4, 1.8]],
      ["b", [0.35, 1.6]],
    ]);
  });
});

describe("the keys of the flag", () => {
  const place = { x0: 0.08, length: 0.025, limit: 0.3 };
  it("hold it where it stands to the last digit on Enter", () => {
    expect(originKeys({ ...place, x0: 0.0812345 }, "Enter", false)).toEqual({ kind: "hold", x0: 0.0812345 });
  });
  it("move it by a tenth of M, with Shift by M", () => {
    expect(originKeys(place, "ArrowRight", false)).toEqual({ kind: "hold", x0: 0.0825 });
    expect(originKeys(place, "ArrowLeft", true)).toEqual({ kind: "hold", x0: 0.055 });
  });
  it("keep it upstream of the first fitted station, where the law would divide by zero", () => {
    expect(originAt(place, 0.9)).toBe(0.2975);
    expect(originAt({ ...place, limit: 0.31 }, 0.31)).toBe(0.3075);
  });
});

describe("the keys of the body", () => {
  it("move it by one percent of the scale, with Shift by five, to a tidy number", () => {
    expect(bodyKeys(0.9, 2.1, "ArrowRight", false)).toBe(0.921);
    expect(bodyKeys(0.9, 2.1, "ArrowLeft", true)).toBe(0.795);
    expect(bodyKeys(0.9, 2.1, "Enter", false)).toBeNull();
  });
});
