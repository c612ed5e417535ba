import { describe, expect, it } from "vitest";
import { bandShape } from "../../src/app/ruler/bandShape.ts";
import { fitDecay } from "../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../src/core/decayResult.ts";
import { decayFigure } from "../../src/figures/decayFigure.ts";
import { defaultFigureOptions, type FigureCase } from "../../src/figures/figureSpec.ts";
import { streamwise } from "../../src/figures/streamwise.ts";
import { lightTokens } from "../../src/figures/tokens.ts";
import { expectClose } from "../support/expectClose.ts";
import { known, plainSettings, spacedFrom, stationAt } from "../support/lawStations.ts";

const M = 0.025;
const [n, x0] = [1.25, 3 * M];
const xs = spacedFrom(x0, 0.2, 2, 12);
const U = (x: number) => 4 + 1.5 * (x - 0.2);
const Us = xs.reduce((sum, x) => sum + U(x) / xs.length, 0);
/** Us times the time from the origin; U is straight from the first station on. */
const distance = (x: number) => Us * (Math.log(U(x) / 4) / 1.5 + (0.2 - x0) / 4);
const stations = xs.map((x) =>
  stationAt(x, { U: known(U(x), 1e-4), uu: known(0.06 * Us ** 2 * (distance(x) / M) ** -n, 0.01) }),
);
const settings: DecaySettings = { ...plainSettings, quantity: "uu", referenceLength: M };
const digits = { relative: 1e-9, because: "an exact law" };

function caseAlong(coordinate: "x" | "flight"): FigureCase {
  const decay = fitDecay(stations, { ...settings, coordinate, window: [0, 9] });
  return { name: "screen", mark: 0, stations, decay, length: M, symbol: "M" };
}
const options = { ...defaultFigureOptions, tokens: lightTokens, axis: "(x-x0)/ell" as const };

describe("a law that runs along the time of flight", () => {
  const of = caseAlong("flight");

  it("is drawn against s - s0, and says so on the axis", () => {
    for (const x of xs) expectClose(streamwise(of, x, "(x-x0)/ell"), distance(x) / M, digits);
    expect(JSON.stringify(decayFigure([of], options).layout)).toContain("(<i>s</i> − <i>s</i><sub>0</sub>)");
    expect(JSON.stringify(decayFigure([caseAlong("x")], options).layout)).toContain("(<i>x</i> − <i>x</i>");
  });
  it("passes through the stations it was made from in the figure's table", () => {
    const { heading, rows } = decayFigure([of], options).table;
    const at = heading.indexOf("residual_percent");
    for (const row of rows) expect(Math.abs(Number(row[at]))).toBeLessThan(1e-6);
    const alongX = decayFigure([caseAlong("x")], options).table.rows;
    expect(Math.max(...alongX.map((row) => Math.abs(Number(row[at]))))).toBeGreaterThan(0.3);
  });
  it("has its curve in the figure where its stations lie", () => {
    const curves = decayFigure([of], options).traces as unknown as {
      mode: string;
      x: number[];
      y: number[];
    }[];
    const curve = curves.find(({ mode, x }) => mode === "lines" && x.length > 50);
    const { x, y } = curve ?? { x: [], y: [] };
    expect(x.length).toBeGreaterThan(50);
    x.forEach((xi, i) => {
      expectClose(y[i], 0.06 * xi ** -n, { relative: 1e-6, because: "q = A xi^-n, xi on the axis" });
    });
  });
  it("is as wide in the ruler's band as the law is at each place", () => {
    const law = of.decay?.law;
    if (!law) throw new Error("no law");
    const map = { at: -20, perX: 300 } as Parameters<typeof bandShape>[2];
    const { px, half } = bandShape(law, 1, map, { width: 560, height: 40 });
    const between = px
      .map((at) => (at + 20) / 300)
      .flatMap((x, i) => (x > 0.2 ? [{ x, width: half[i] }] : []));
    const ratio = between.map(({ x, width }) => width / (distance(x) / M) ** (-n / 2));
    expect(ratio.length).toBeGreaterThan(50);
    for (const value of ratio) expectClose(value, ratio[0], digits);
  });
});
