import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { expectClose } from "../support/expectClose.ts";
import { spacedFrom } from "../support/lawStations.ts";
import { readNistPowerLaw } from "../support/readNistPowerLaw.ts";
import { readRows } from "../support/readRows.ts";
import { type BuiltBatch, buildBatch } from "./builtBatch.ts";
import { expectContract } from "./contract.ts";

const reference = (path: string) => new URL(`../reference/${path}`, import.meta.url);

interface Ends {
  value: number;
  low: number;
  high: number;
}
interface FoundCase {
  case: string;
  settings: { fit: { coordinate: string }; compare: { tolerance: number } };
  development: { tolerance: number };
  flags: { code: string }[];
  decay: Record<"n" | "x0" | "A", Ends> & {
    given_window: { n: Ends; x0: Ends };
    stations: number;
    coordinate: string;
    covariance: { rows: number[][] };
  };
}

// NIST StRD "Bennett5": y = b1 (b2 + x)^(-1/b3), all y negative: q = -y, A = -b1, x0 = -b2, n = 1/b3
const bennett5 = readNistPowerLaw("Bennett5");
const laws = readRows(reference("decay/decay_laws.csv")).flatMap((row) => {
  const [A, n, x0] = [Number(row.A || "1"), Number(row.n), Number(row.x0_over_M || "0")];
  return [A, n, x0].every(Number.isFinite) && n > 0.9 ? [{ id: row.id, A, n, x0 }] : [];
});

/** q ~ age^-1.25 in a stream that speeds up, U = 4 + x, the age from x = 1 on being ln(U/5) and before it (x - 1)/5. */
const carried = spacedFrom(0.4, 1, 12, 14).map((x) => [x, 4 + x, (Math.log((4 + x) / 5) + 0.6 / 5) ** -1.25]);

let batch: BuiltBatch;
let top = "";
let cases: Map<string, FoundCase>;

/** A profile and its sheet; the name of the sheet. */
function profile(name: string, columns: string, rows: readonly (readonly number[])[], sheet: object = {}) {
  mkdirSync(join(top, name));
  writeFileSync(join(top, name, "profile.csv"), [columns, ...rows.map((row) => row.join(","))].join("\n"));
  const whole = { case: name, layout: "profile", files: [{ path: "profile.csv" }], ...sheet };
  writeFileSync(join(top, name, "sheet.json"), JSON.stringify(whole));
  return join(name, "sheet.json");
}

beforeAll(async () => {
  batch = await buildBatch();
  top = mkdtempSync(join(tmpdir(), "waneline-profiles-"));
  const history = readFileSync(reference("agard_hom02/hom02_history.csv"), "utf8").trim().split(/\r?\n/);
  const table = readRows(reference("cbc1971/cbc1971_table4_gross_properties.csv"));
  const sheets = [
    profile(
      "Bennett5",
      "x,q",
      bennett5.x.map((x, i) => [x, -bennett5.y[i]]),
      { fit: { residuals: "linear", weights: "equal" } },
    ),
    ...laws.map(({ id, A, n, x0 }) =>
      profile(
        id,
        "x,q,se",
        spacedFrom(x0, x0 + 20, x0 + 170, 12).map((x) => {
          const q = A * (x - x0) ** -n;
          return [x, q, 0.01 * q];
        }),
      ),
    ),
    profile(
      "HOM02",
      "t,q",
      history.slice(1).map((line) => line.split(",").slice(0, 2).map(Number)),
      { along: "t", units: "nondimensional", fit: { window: [2.5, 5.8] } },
    ),
    profile(
      "CBC1971",
      "x,q",
      table.map((row) => [Number(row.tU0_over_M), Number(row.u1_rms_cm_s) ** 2]),
      { fit: { x0: 3.5 } },
    ),
    profile("duct", "x,U,q", carried, { development: { tolerance: 0.2 } }),
    profile("duct-x", "x,U,q", carried, { fit: { coordinate: "x" } }),
  ];
  const done = batch.run([...sheets, "--out", "out", "--jobs", "1"], top);
  expect(done.code, done.stderr).toBe(0);
  const found = JSON.parse(readFileSync(resolve(top, "out/results.json"), "utf8"));
  expectContract(found);
  cases = new Map(found.cases.map((one: FoundCase) => [one.case, one]));
}, 120_000);
afterAll(() => {
  batch.remove();
  rmSync(top, { recursive: true });
});

function decayOf(name: string): FoundCase["decay"] {
  const found = cases.get(name);
  if (!found) throw new Error(`${name} is not among the results`);
  return found.decay;
}

describe("Bennett5 of NIST as a profile, from its sheet to the results file", () => {
  it("has the certified level, origin and exponent", () => {
    const { A, x0, n } = decayOf("Bennett5");
    const [b1, b2, b3] = bennett5.certified;
    const digits = { relative: 1e-9, because: "eleven digits are certified, correlated to 0.99999" };
    expectClose(A.value, -b1.value, digits);
    expectClose(x0.value, -b2.value, digits);
    expectClose(n.value, 1 / b3.value, digits);
  });
  it("has a covariance whose diagonal holds the certified standard deviations", () => {
    const [b1, b2, b3] = bennett5.certified;
    const { rows } = decayOf("Bennett5").covariance;
    const digits = { relative: 1e-6, because: "eleven digits are certified of each" };
    expectClose(Math.sqrt(rows[0][0]), b1.standardDeviation / -b1.value, digits);
    expectClose(Math.sqrt(rows[1][1]), b2.standardDeviation, digits);
    expectClose(Math.sqrt(rows[2][2]), b3.standardDeviation / b3.value ** 2, digits);
  });
  it("has intervals of about two certified standard deviations to each side", () => {
    // those given the window: the adopted ones are the union over later starts, as nothing tells where to begin
    const { x0 } = decayOf("Bennett5").given_window;
    const [, { standardDeviation }] = bennett5.certified;
    // t with 151 degrees of freedom is 1.976
    expectClose((x0.high - x0.low) / 2 / standardDeviation, 1.976, {
      relative: 0.01,
      because: "the profile bends a little, its two halves in opposite ways",
    });
  });
});

describe("stations on a published law, from their sheet to the results file", () => {
  it.each(laws)("$id: n = $n, x0 = $x0 and A come back", ({ id, A, n, x0 }) => {
    const decay = decayOf(id);
    const because = "the stations lie on the law to the last digit";
    expectClose(decay.n.value, n, { relative: 1e-7, because });
    expectClose(decay.x0.value, x0, { absolute: 1e-5, because });
    expectClose(decay.A.value, A, { relative: 1e-6, because });
  });
});

describe("a law in time, carried by a stream that speeds up", () => {
  it("runs along the time of flight by itself, and gives back n and x0", () => {
    const decay = decayOf("duct");
    const digits = { relative: 1e-8, because: "U is straight between stations" };
    expect(decay.coordinate).toBe("flight");
    expectClose(decay.n.value, 1.25, digits);
    expectClose(decay.x0.value, 0.4, digits);
    expect(cases.get("duct")?.flags.map(({ code }) => code)).toContain("u-varies");
  });
  it("runs along x where the sheet says so, with another n", () => {
    expect(cases.get("duct-x")?.settings.fit.coordinate).toBe("x");
    expect(decayOf("duct-x").coordinate).toBe("x");
    expect(Math.abs(decayOf("duct-x").n.value - 1.25)).toBeGreaterThan(0.05);
  });
  it("has a tolerance of the development length that is not that of the comparison", () => {
    const found = cases.get("duct");
    expect([found?.development.tolerance, found?.settings.compare.tolerance]).toEqual([0.2, 0.1]);
  });
});

// SciPy 1.17.1, curve_fit, odr and a profile by hand; the script beside the fixture is make_published.py
const published = JSON.parse(readFileSync(reference("scipy/published.json"), "utf8"));
const ends = { relative: 2e-6, because: "the search for an end stops at a millionth of its distance" };

describe("the decay in time of AGARD HOM02 (A. A. Wray 1997), from its sheet to the results file", () => {
  it("runs along t, with the law and the intervals that SciPy finds", () => {
    const decay = decayOf("HOM02");
    const { curve_fit, interval } = published.HOM02;
    expect([decay.coordinate, decay.stations]).toEqual(["t", 68]);
    const digits = { relative: 1e-7, because: "curve_fit stops on a flat sum" };
    expectClose(decay.n.value, curve_fit.n, digits);
    expectClose(decay.x0.value, curve_fit.x0, digits);
    for (const key of ["n", "x0"] as const) {
      expectClose(decay[key].low, interval[key][0], ends);
      expectClose(decay[key].high, interval[key][1], ends);
    }
  });
});

describe("Comte-Bellot & Corrsin (1971), M = 5.08 cm, x0 = 3.5 M held, from its sheet to the results file", () => {
  it("has n = 1.235 (1.153 to 1.316), as SciPy has it, which holds the published 1.25", () => {
    const { n } = decayOf("CBC1971");
    const { curve_fit, interval } = published.CBC1971;
    expectClose(n.value, curve_fit.n, { relative: 1e-9, because: "a straight line" });
    expectClose(n.low, interval.n[0], ends);
    expectClose(n.high, interval.n[1], ends);
    expect(n.low < 1.25 && n.high > 1.25).toBe(true);
  });
});
