import { describe, expect, it } from "vitest";
import type { Comparison } from "../../src/core/comparison.ts";
import { bare } from "../../src/core/quantity.ts";
import { balanceFigure } from "../../src/figures/balanceFigure.ts";
import { comparedPairs } from "../../src/figures/comparedPair.ts";
import { comparisonFigure } from "../../src/figures/comparisonFigure.ts";
import {
  defaultFigureOptions,
  type FigureCase,
  type FigureOptions,
  type FigureSpec,
} from "../../src/figures/figureSpec.ts";
import { overlayFigure } from "../../src/figures/overlayFigure.ts";
import { lightTokens } from "../../src/figures/tokens.ts";
import { expectClose } from "../support/expectClose.ts";
import { madeComparison } from "./madeComparison.ts";
import { madePair } from "./powerLawCase.ts";

const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens, widthMm: 178 };
const mesh = madePair[0].length ?? 1;

interface Seen {
  readonly name?: string;
  readonly mode: string;
  readonly x: readonly (number | null)[];
  readonly y: readonly (number | null)[];
  readonly xaxis?: string;
  readonly fill?: string;
  readonly marker?: { readonly color: string | readonly string[] };
}
const traces = (figure: FigureSpec) => figure.traces as unknown as readonly Seen[];
const notes = (figure: FigureSpec) =>
  (figure.layout.annotations ?? []) as { text: string; x: number; y: number; xanchor: string }[];
const axis = (figure: FigureSpec, name: string) =>
  (figure.layout as Record<string, { range: number[]; title?: unknown } | undefined>)[name];

/** The comparison with spectra at stations that both made cases have. */
const [first, second] = madePair;
const withSpectra: Comparison = {
  ...madeComparison,
  spectra: {
    ...madeComparison.spectra,
    pairs: madeComparison.spectra.pairs.map((pair, i) => ({
      ...pair,
      x: [first.stations[4 + i].x, second.stations[5 + i].x] as const,
    })),
  },
};

describe("cases laid over one another", () => {
  const figure = overlayFigure([withSpectra], madePair, "Tu", options);
  const [screen] = traces(figure).filter(({ name, xaxis }) => name === "screen" && xaxis === "x2");
  it("stand at their distance from the origins that the comparison used", () => {
    const at = (first.stations[3].x - 0.078) / mesh;
    expectClose(screen.x[3], at, { relative: 1e-12, because: "x0 with one exponent is 0.078" });
    expectClose(screen.y[3], 100 * (first.stations[3].Tu.value ?? 0), {
      relative: 1e-12,
      because: "per cent",
    });
  });
  it("carry the interval of the origin as a band along the axis", () => {
    const band = traces(figure).find(({ fill, xaxis }) => fill === "toself" && xaxis === "x2");
    const used = first.stations.findIndex(({ x }) => x >= (first.decay?.window[0] ?? 0));
    expectClose(band?.x[0], (first.stations[used].x - 0.096) / mesh, {
      relative: 1e-12,
      because: "upper end",
    });
    expectClose(band?.x[1], (first.stations[used].x - 0.06) / mesh, {
      relative: 1e-12,
      because: "lower end",
    });
    expect(band?.y[0]).toBe(band?.y[1]);
  });
  it("have the ratio below on the same axis, with its interval as a band", () => {
    expect(axis(figure, "xaxis3")?.range).toEqual(axis(figure, "xaxis2")?.range);
    const curve = traces(figure).find(({ mode, xaxis, fill }) => mode === "lines" && xaxis === "x3" && !fill);
    expect(curve?.x).toEqual(madeComparison.quantities.Tu.curve.xi);
    expect(curve?.y).toEqual(madeComparison.quantities.Tu.curve.ratio);
  });
  it("show the spectra of the middle pair, and every distance filled where it is more than chance", () => {
    const spectra = traces(figure).filter(({ xaxis, mode }) => xaxis === "x4" && mode === "lines");
    expect(spectra).toHaveLength(2);
    const distances = traces(figure).find(({ xaxis, name }) => xaxis === "x5" && name === "simulation");
    expect(distances?.y).toEqual([0.21, 0.09]);
    expect(distances?.marker?.color).toEqual([
      expect.not.stringMatching(lightTokens.paper),
      lightTokens.paper,
    ]);
  });
  it("have one column where there are no spectra, and stand on x without bands where x is what is equal", () => {
    const none = {
      ...withSpectra,
      align: "x" as const,
      spectra: { within: 0.1, pairs: [], why: "no spectra" },
    };
    const plain = overlayFigure([none], madePair, "L11", { ...options, widthMm: 86 });
    expect(axis(plain, "xaxis4")).toBeUndefined();
    expect(traces(plain).some(({ fill, xaxis }) => fill === "toself" && xaxis === "x2")).toBe(false);
    const [own] = traces(plain).filter(({ name }) => name === "screen");
    expect(own.x[3]).toBe(first.stations[3].x);
  });
  it("run against falling Tu where that is what is equal", () => {
    const [left, right] = axis(
      overlayFigure([{ ...withSpectra, align: "Tu" }], madePair, "L11", options),
      "xaxis2",
    )?.range ?? [0, 0];
    expect(left).toBeGreaterThan(right);
  });
  it("write finite numbers alone into the table", () => {
    for (const row of figure.table.rows) {
      expect(row).toHaveLength(figure.table.heading.length);
      for (const cell of row) if (typeof cell === "number") expect(Number.isFinite(cell)).toBe(true);
    }
  });
  it("are an empty frame where nothing could be compared", () => {
    const apart = { ...withSpectra, overlap: null, why: "the ranges do not overlap" };
    expect(overlayFigure([apart], madePair, "Tu", options).traces).toEqual([]);
  });
});

/** The second made case under several names, all against the first. */
function many(count: number): { cases: FigureCase[]; comparisons: Comparison[] } {
  const others = Array.from(
    { length: count },
    (_, i): FigureCase => ({
      ...second,
      name: `inflow number ${i + 2}`,
      mark: i + 1,
    }),
  );
  return {
    cases: [first, ...others],
    comparisons: others.map(({ name }) => ({ ...madeComparison, cases: ["screen", name] })),
  };
}

describe("the figure of six cases", () => {
  const { cases, comparisons } = many(5);
  const figure = comparisonFigure(comparedPairs(comparisons, cases), options);
  it("has a row for each quantity and pair, none over another", () => {
    const shown = notes(figure).filter(({ text }) => /^(equivalent|undecided|<b>different<\/b>)$/.test(text));
    // six quantities, one of them missing
    expect(shown).toHaveLength(5 * 5);
    const rows = shown.map(({ y }) => y).sort((a, b) => a - b);
    rows.slice(1).forEach((y, i) => {
      expect(y - rows[i]).toBeGreaterThan(3.4);
    });
  });
  it("says below which mark is which case, and names the quantity once", () => {
    expect(notes(figure).filter(({ text }) => text === "turbulence intensity")).toHaveLength(1);
    const names = notes(figure).filter(({ text }) => text.startsWith("inflow"));
    expect(names).toHaveLength(5);
    for (const { y } of names) expect(y).toBeLessThan(0);
  });
  it("tells the pairs apart in its table", () => {
    expect(figure.table.rows).toHaveLength(30);
    expect(figure.table.rows[1].slice(0, 3)).toEqual(["screen", "inflow number 2", "L11"]);
  });
});

describe("a legend of eight cases", () => {
  const { cases } = many(7);
  const figure = balanceFigure(cases, { ...options, widthMm: 86 });
  it("stands below the figure in columns, where nothing is covered and no two rows meet", () => {
    const names = notes(figure).filter(({ text }) => text.startsWith("inflow") || text === "screen");
    expect(names).toHaveLength(8);
    for (const { x, y } of names) {
      expect(y).toBeLessThan(0);
      expect(x + 14 * 1.3).toBeLessThan(figure.widthMm + 4);
    }
    expect(new Set(names.map(({ x, y }) => `${x.toFixed(2)} ${y.toFixed(2)}`)).size).toBe(8);
  });
  it("makes the figure taller and leaves the panels their size", () => {
    const few = balanceFigure(cases.slice(0, 3), { ...options, widthMm: 86 });
    expect(figure.heightMm).toBeGreaterThan(few.heightMm + 6);
    const frame = (of: FigureSpec) => {
      const [low, high] = (of.layout.yaxis2?.domain ?? [0, 0]) as number[];
      return (high - low) * of.heightMm;
    };
    expectClose(frame(figure), frame(few), { relative: 1e-12, because: "only room below is added" });
  });
});

describe("a ratio that could not be formed", () => {
  it("does not stop the others from being drawn", () => {
    const bareRatio = { ...madeComparison.quantities.Tu, ratio: bare(1.02, "no errors"), verdict: null };
    const comparison = { ...madeComparison, quantities: { ...madeComparison.quantities, Tu: bareRatio } };
    const figure = comparisonFigure(comparedPairs([comparison], madePair), options);
    expect(notes(figure).map(({ text }) => text)).toContain("1.02");
  });
});
