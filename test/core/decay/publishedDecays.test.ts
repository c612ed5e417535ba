import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { isEstimate } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";
import { readRows } from "../../support/readRows.ts";

const reference = (path: string) => new URL(`../../reference/${path}`, import.meta.url);

describe("Comte-Bellot & Corrsin (1971), table 4, M = 5.08 cm", () => {
  const rows = readRows(reference("cbc1971/cbc1971_table4_gross_properties.csv"));
  const stations = rows.map((row) =>
    stationAt(Number(row.tU0_over_M), { uu: known(Number(row.u1_rms_cm_s) ** 2, 0) }),
  );

  it("decays with n = 1.235 from the published origin x0 = 3.5 M", () => {
    // 1.235 is an independent least-squares fit of the same three u'; the paper's own law for the grid has 1.25
    const { n } = fitDecay(stations, { ...plainSettings, x0: 3.5 });
    expectClose(n.value, 1.235, { absolute: 0.0005, because: "the reference is given to three decimals" });
  });

  it("has an interval of n about the published 1.25", () => {
    const { n } = fitDecay(stations, { ...plainSettings, x0: 3.5 });
    expect(isEstimate(n) && (n.low ?? 9) < 1.25 && (n.high ?? 0) > 1.25).toBe(true);
  });

  it("is refused a free origin: three stations solve for three numbers", () => {
    const { n, flags } = fitDecay(stations, plainSettings);
    expect(n).toEqual({
      value: null,
      why: "three stations lie in the window, and a law with a free virtual origin needs four",
    });
    expect(flags.map(({ code }) => code)).toContain("law-refused");
  });
});

describe("decaying isotropic turbulence AGARD HOM02 (A. A. Wray 1997, AGARD-AR-345)", () => {
  const lines = readFileSync(reference("agard_hom02/hom02_history.csv"), "utf8")
    .trim()
    .split(/\r?\n/)
    .slice(1);
  const stations = lines
    .map((line) => line.split(",").map(Number))
    .map(([t, k]) => stationAt(t, { k: known(k, 0), q: known(k, 0) }));
  const decay = fitDecay(stations, { ...plainSettings, quantity: "q", along: "t", window: [2.5, 5.8] });

  // the reference fit: unweighted least squares in ln K over the same 68 times
  it("decays with n = 1.155 from t0 = 0.749 for t from 2.5 to 5.8", () => {
    expect(decay.stations).toBe(68);
    expectClose(decay.n.value, 1.155, { absolute: 0.0005, because: "three decimals are given" });
    expectClose(decay.x0.value, 0.7489, {
      absolute: 0.0005,
      because: "the reference fit stopped at four decimals",
    });
    expectClose(decay.A.value, 0.26937, { relative: 5e-4, because: "A follows t0" });
  });

  // SciPy 1.17.1; the script beside the fixture is make_published.py
  it("has the standard errors of ln A, n and x0 that curve_fit has, and odr", () => {
    const { HOM02 } = JSON.parse(readFileSync(reference("scipy/published.json"), "utf8"));
    const covariance = decay.law?.covariance ?? [];
    const own = [0, 8, 4].map((at) => Math.sqrt(covariance[at]));
    for (const by of ["curve_fit", "odr"])
      own.forEach((deviation, i) => {
        expectClose(deviation, HOM02[by].deviations[i], {
          relative: 1e-6,
          because: "both differentiate numerically",
        });
      });
  });

  it("leaves a residual standard deviation of 4.6e-4 in ln K", () => {
    const { law, points } = decay;
    if (law === null) throw new Error("no law");
    const residuals = points
      .filter((point) => point.used)
      .map(({ x, q }) => Math.log(q / (law.A * ((x - law.x0) / law.length) ** -law.n)));
    const sum = residuals.reduce((total, value) => total + value ** 2, 0);
    const deviation = Math.sqrt(sum / (residuals.length - 3));
    expectClose(deviation, 4.6e-4, { absolute: 0.05e-4, because: "two digits are given" });
  });
});

describe("stations put on a published law", () => {
  const laws = readRows(reference("decay/decay_laws.csv")).flatMap((row) => {
    const [A, n, x0] = [Number(row.A || "1"), Number(row.n), Number(row.x0_over_M || "0")];
    return [A, n, x0].every(Number.isFinite) && n > 0.9 ? [{ id: row.id, A, n, x0 }] : [];
  });

  it("are many laws", () => expect(laws.length).toBeGreaterThan(8));
  it.each(laws)("$id: n = $n and x0 = $x0 come back", ({ A, n, x0 }) => {
    const xs = spacedFrom(x0, x0 + 20, x0 + 170, 12);
    const stations = xs.map((x) => stationAt(x, { q: known(A * (x - x0) ** -n, 0.01) }));
    const decay = fitDecay(stations, plainSettings);
    const because = "the stations lie on the law to the last digit";
    expectClose(decay.n.value, n, { relative: 1e-7, because });
    expectClose(decay.x0.value, x0, { absolute: 1e-5, because });
    expectClose(decay.A.value, A, { relative: 1e-6, because });
  });
});
