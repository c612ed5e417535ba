import { describe, expect, it } from "vitest";
import type { ReductionFailure } from "../../../../src/core/failure.ts";
import type { Quantity } from "../../../../src/core/quantity.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import { lineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { snapshotTime } from "../../../../src/core/station/lines/snapshotTime.ts";
import { withoutRepeatedEnd } from "../../../../src/core/station/lines/withoutRepeatedEnd.ts";
import type { StationResult } from "../../../../src/core/stationResult.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { eta, type LineWish, lineGrid, lineSettings, madeSnapshots, partOf, truth } from "./madeLines.ts";

const wish: LineWish = { along: "y", size: 256, spacing: 3 * eta, snapshots: 40, seed: 1 };
const keys = ["U", "uu", "vv", "ww", "k", "gradient", "epsilon", "lambda", "Re_lambda", "L11"] as const;
const exact = (because: string) => ({ relative: 1e-11, because });

/** Share of seeds whose 95 % interval holds the truth, by quantity. */
function coverage(of: LineWish, seeds: number): Record<string, number> {
  const shares: Record<string, number> = {};
  for (let seed = 1; seed <= seeds; seed++) {
    const station = reduceLines([partOf({ ...of, seed })], lineSettings);
    for (const key of keys) {
      const { value, low, high } = station[key] as { value: number | null; low: number; high: number };
      const holds = value !== null && low <= truth[key] && truth[key] <= high;
      shares[key] = (shares[key] ?? 0) + (holds ? 1 / seeds : 0);
    }
  }
  return shares;
}

/** 30 draws of a probability of 0.95 give fewer than 24 once in two thousand. */
const leastShare = 0.8;

describe("isotropic turbulence with Pope's model spectrum, sampled on periodic lines", () => {
  it("gives back its statistics within their 95 % intervals", () => {
    const shares = coverage(wish, 30);
    for (const [key, share] of Object.entries(shares)) expect(share, key).toBeGreaterThanOrEqual(leastShare);
    const mean = Object.values(shares).reduce((sum, share) => sum + share, 0) / keys.length;
    expect(mean).toBeGreaterThanOrEqual(0.9);
  }, 60_000);

  const station = reduceLines([partOf(wish)], lineSettings);

  it("is found to be periodic, and its circular spectrum holds all of the variance", () => {
    expect(station.facts.lines).toMatchObject({ periodic: true, independentSnapshots: 40 });
    expectClose(
      station.facts.recoveredVariance,
      1,
      exact("Parseval's identity, the mean of each line included"),
    );
  });

  it("has scales across that are half of those along, and gradients across that are twice", () => {
    for (const key of ["K_v", "K_w"]) expect(holds(station.routes[key], 1), key).toBe(true);
    for (const key of ["L_v", "L_w"]) expect(holds(station.routes[key], truth.L11 / 2), key).toBe(true);
  });

  it("needs no hypothesis that turns time into space", () => {
    const off = reduceLines([partOf(wish)], { ...lineSettings, taylorCorrection: false });
    expect(off.gradient).toEqual(station.gradient);
    expect(station.facts.taylorFactor).toBe(null);
  });
});

function holds(quantity: Quantity, value: number): boolean {
  const { low, high } = quantity as { low: number | null; high: number | null };
  return low !== null && high !== null && low <= value && value <= high;
}

it("lines along z give what lines along y give, with v and w exchanged", () => {
  const y = reduceLines([partOf(wish)], lineSettings);
  const snapshots = madeSnapshots(wish).map(([u, v, w]) => [u, w, v] as const);
  const z = reduceLines([partOf({ ...wish, along: "z" }, snapshots)], lineSettings);
  const same = ["U", "uu", "uv", "k", "L11", "gradient", "lambda", "epsilon", "S_dudx", "C_epsilon"] as const;
  const partner = { uv: "uw" } as const;
  for (const key of same) {
    const [a, b] = [y[key], z[key in partner ? "uw" : key]];
    expectClose(b.value, a.value ?? 0, exact("the order of sums differs"));
  }
  expect(z.vv).toEqual(y.ww);
  expect(z.curves?.E11).toEqual(y.curves?.E11);
});

describe("a line cut from a longer periodic one", () => {
  const cut: LineWish = { ...wish, size: 512, kept: 250 };
  const part = partOf(cut);

  it("is found not to be periodic, and gives its statistics within their intervals", () => {
    expect(reduceLines([part], lineSettings).facts.lines?.periodic).toBe(false);
    const shares = coverage(cut, 30);
    for (const [key, share] of Object.entries(shares)) expect(share, key).toBeGreaterThanOrEqual(leastShare);
  }, 60_000);

  it("has a covariance of pairs within the line, about the common mean", () => {
    const lines = joinLines([part]);
    const found = lineSpectra(lines, false)?.covariance[1];
    const snapshots = madeSnapshots(cut);
    for (const lag of [0, 1, 7, 125]) {
      let sum = 0;
      for (const [, v] of snapshots)
        for (let i = lag; i < 250; i++) sum += (v[i] - lines.means[1]) * (v[i - lag] - lines.means[1]);
      expectClose(found?.[lag], sum / (snapshots.length * (250 - lag)), {
        absolute: 1e-12 * truth.vv,
        because: "the definition; sums are taken about another constant",
      });
    }
  });

  it("told to be periodic, has a circular covariance", () => {
    const lines = joinLines([part]);
    const found = lineSpectra(lines, true)?.covariance[0];
    const snapshots = madeSnapshots(cut);
    for (const lag of [0, 3, 125]) {
      let sum = 0;
      for (const [u] of snapshots)
        for (let i = 0; i < 250; i++) sum += (u[i] - lines.means[0]) * (u[(i + lag) % 250] - lines.means[0]);
      expectClose(found?.[lag], sum / (snapshots.length * 250), {
        absolute: 1e-12,
        because: "the definition",
      });
    }
  });
});

describe("snapshots that are not independent", () => {
  /** Each keeps a share of the last: a correlation e^(-m/T) after m snapshots, T their integral time. */
  const memory = 5;
  const keep = Math.exp(-1 / memory);
  const fresh = madeSnapshots({ ...wish, snapshots: 400 });
  let last = fresh[0].map((column, c) => column.map((value) => value - (c === 0 ? truth.U : 0)));
  const snapshots = fresh.map((snapshot) => {
    last = last.map((column, c) =>
      column.map(
        (value, i) => keep * value + Math.sqrt(1 - keep * keep) * (snapshot[c][i] - (c === 0 ? truth.U : 0)),
      ),
    );
    return [last[0].map((value) => value + truth.U), last[1], last[2]] as const;
  });
  const station = reduceLines([partOf(wish, snapshots)], lineSettings);

  it("count for the time they span over twice their integral time", () => {
    expectClose(station.facts.lines?.snapshotCorrelation, keep, {
      relative: 0.03,
      because: "estimated from 400",
    });
    expectClose(station.facts.lines?.independentSnapshots, 400 / (2 * memory), {
      relative: 0.15,
      because: "the sum of nine estimated correlations and their continuation",
    });
  });

  it("count each where they are independent", () => {
    expectClose(snapshotTime(joinLines([partOf(wish)])).independent, 40, exact("every one"));
  });
});

describe("what lines cannot tell is said", () => {
  const codes = ({ flags }: StationResult) => flags.map(({ code }) => code);
  const why = (quantity: Quantity) => (quantity as { why?: string }).why ?? "";

  it("fewer than ten snapshots have values and no intervals", () => {
    const station = reduceLines([partOf({ ...wish, snapshots: 6 })], lineSettings);
    expect(codes(station)).toContain("short-record");
    expect(station.k).toMatchObject({ low: null, high: null });
    expect(station.k.value).toBeGreaterThan(0);
    expect(station.facts.integralTimes).toBeLessThan(20);
  });

  it("a line shorter than eight integral scales is flagged with its length in them", () => {
    const station = reduceLines(
      [partOf({ ...wish, size: 128, spacing: 1.5 * eta, snapshots: 60 })],
      lineSettings,
    );
    const flag = station.flags.find(({ code }) => code === "short-box");
    expect(flag?.value).toBeLessThan(8);
  });

  it("points that are unequally spaced have moments, and a reason for all else", () => {
    const part = partOf(wish);
    const points = part.points.map((y) => y * y);
    const station = reduceLines([{ ...part, points, spectra: null }], lineSettings);
    expect(station.uu).toEqual(reduceLines([part], lineSettings).uu);
    for (const key of ["L11", "gradient", "lambda", "epsilon"] as const)
      expect(why(station[key]), key).toContain("not equally spaced");
    expect(station.curves).toBe(null);
    expect(codes(station)).toContain("unequal-steps");
  });

  it("without a viscosity only what needs it is missing", () => {
    const station = reduceLines([partOf(wish)], { ...lineSettings, kinematicViscosity: null });
    expect(why(station.epsilon)).toBe("no kinematic viscosity is given");
    expect(station.lambda.value).toBeGreaterThan(0);
  });

  it("a u that is the same everywhere is refused", () => {
    const still = madeSnapshots(wish).map(([u, v, w]) => [u.map(() => 5), v, w] as const);
    expect(() => reduceLines([partOf(wish, still)], lineSettings)).toThrow("does not vary");
  });

  it("one line in two files at the same times, or with other points, is refused", () => {
    const part = partOf(wish);
    const again = { ...part, origin: { ...part.origin, file: "again.csv" } };
    const fewer = { ...again, points: part.points.subarray(0, 100) };
    const code = (parts: Parameters<typeof joinLines>[0]) => {
      try {
        joinLines(parts);
      } catch (error) {
        return (error as ReductionFailure).code;
      }
      return null;
    };
    expect([code([part, again]), code([part, fewer])]).toEqual(["backward-time", "different-points"]);
  });
});

describe("a line", () => {
  const codes = (station: StationResult) => station.flags.map(({ code }) => code);
  const shifted = (by: (i: number) => number) =>
    madeSnapshots(wish).map(([u, v, w]) => [u.map((value, i) => value + by(i)), v, w] as const);

  it("whose mean varies along it is flagged, and one that is homogeneous is not", () => {
    const sheared = shifted((i) => 0.3 * Math.cos((2 * Math.PI * i) / wish.size));
    expect(codes(reduceLines([partOf(wish, sheared)], lineSettings))).toContain("inhomogeneous");
    expect(codes(reduceLines([partOf(wish)], lineSettings))).not.toContain("inhomogeneous");
  });

  it("that repeats its first point at the end gives what it gives without", () => {
    const closed = madeSnapshots(wish).map((snapshot) =>
      snapshot.map((column) => Float64Array.from([...column, column[0]])),
    );
    const grid = lineGrid({ ...wish, kept: wish.size + 1 });
    const cases = [
      ["auto", wish.size],
      [false, wish.size + 1],
    ] as const;
    const parts = cases.map(([periodic, points]) => {
      const reducer = withoutRepeatedEnd(grid, periodic);
      closed.forEach((snapshot, t) => {
        reducer.add(t, snapshot);
      });
      const [part] = reducer.finish();
      expect(part.points.length).toBe(points);
      return part;
    });
    expect(reduceLines([parts[0]], lineSettings)).toEqual(reduceLines([partOf(wish)], lineSettings));
  });
});
