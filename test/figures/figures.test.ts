import { describe, expect, it } from "vitest";
import { missing } from "../../src/core/quantity.ts";
import { balanceFigure } from "../../src/figures/balanceFigure.ts";
import { comparedPairs } from "../../src/figures/comparedPair.ts";
import { comparisonFigure } from "../../src/figures/comparisonFigure.ts";
import { decayFigure } from "../../src/figures/decayFigure.ts";
import {
  defaultFigureOptions,
  type FigureCase,
  type FigureOptions,
  type FigureSpec,
} from "../../src/figures/figureSpec.ts";
import { isotropyFigure } from "../../src/figures/isotropyFigure.ts";
import { overlayFigure } from "../../src/figures/overlayFigure.ts";
import { scalesFigure } from "../../src/figures/scalesFigure.ts";
import { spectrumFigure } from "../../src/figures/spectrumFigure.ts";
import { darkTokens, lightTokens } from "../../src/figures/tokens.ts";
import { expectClose } from "../support/expectClose.ts";
import { madeComparison } from "./madeComparison.ts";
import { madePair } from "./powerLawCase.ts";

const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens, widthMm: 178 };
const picked = madePair.map((of, i) => ({ of, station: of.stations[5], letter: "ab"[i] }));
const everyFigure: [string, (options: FigureOptions) => FigureSpec][] = [
  ["decay", (how) => decayFigure(madePair, how)],
  ["isotropy", (how) => isotropyFigure(madePair, how)],
  ["scales", (how) => scalesFigure(madePair, how)],
  ["balance", (how) => balanceFigure(madePair, how)],
  ["spectrum", (how) => spectrumFigure(picked, how)],
  ["overlay", (how) => overlayFigure([madeComparison], madePair, "L11", how)],
  ["comparison", (how) => comparisonFigure(comparedPairs([madeComparison], madePair), how)],
];

/** A trace as the tests look at it. */
interface Seen {
  readonly mode: string;
  readonly name?: string;
  readonly x: readonly (number | null)[];
  readonly y: readonly (number | null)[];
  readonly xaxis?: string;
  readonly marker?: { readonly symbol: string; readonly color: string | string[] };
  readonly line?: { readonly color: string; readonly width: number; readonly dash: string };
  readonly error_y?: { readonly array: (number | null)[]; readonly visible: boolean };
}
const traces = (spec: FigureSpec) => spec.traces as readonly unknown[] as readonly Seen[];
const markers = (spec: FigureSpec, name: string) =>
  traces(spec).filter((trace) => trace.mode === "markers" && trace.name === name);
const axis = (spec: FigureSpec, key: string) =>
  (spec.layout as Record<string, { range: number[]; ticktext: string[]; tickvals: number[]; type: string }>)[
    key
  ];

describe.each(everyFigure)("the figure of %s", (_, build) => {
  it.each([84, 86, 90, 140, 174, 178, 190])("has its size in mm, %d wide", (widthMm) => {
    const spec = build({ ...options, widthMm });
    expect(spec.widthMm).toBe(widthMm);
    expect(spec.layout.width).toBe(widthMm * 5);
    expect(spec.layout.height).toBe(spec.heightMm * 5);
  });
  it("holds no number that is not finite, and as many x as y", () => {
    const spec = build(options);
    expect(
      JSON.stringify(spec, (_key, value) =>
        typeof value === "number" && !Number.isFinite(value) ? "BAD" : value,
      ),
    ).not.toContain("BAD");
    for (const { x, y } of traces(spec)) expect(x.length).toBe(y.length);
  });
  it("gives every axis a text for each of its ticks", () => {
    const spec = build(options);
    for (const key of Object.keys(spec.layout).filter((name) => /^[xy]axis\d/.test(name)))
      expect(axis(spec, key).ticktext.length).toBe(axis(spec, key).tickvals.length);
  });
  it("is the same drawing in the dark, but for its colours", () => {
    const [light, dark] = [build(options), build({ ...options, tokens: darkTokens })];
    const places = (spec: FigureSpec) => traces(spec).map(({ x, y }) => [x, y]);
    expect(places(dark)).toEqual(places(light));
    expect(dark.layout.paper_bgcolor).toBe(darkTokens.paper);
  });
  it("puts its panels one above the other on a narrow screen", () => {
    const stacked = build({ ...options, widthMm: 86, stacked: true });
    const lefts = Object.keys(stacked.layout)
      .filter((key) => /^xaxis\d/.test(key))
      .map((key) => (stacked.layout as Record<string, { domain: number[] }>)[key].domain[0]);
    expect(new Set(lefts).size).toBe(1);
  });
  it("has a CSV row of the heading's length for each of its numbers", () => {
    const { table } = build(options);
    expect(table.rows.length).toBeGreaterThan(0);
    for (const row of table.rows) expect(row.length).toBe(table.heading.length);
  });
});

describe("the figure of the decay", () => {
  const spec = decayFigure(madePair, { ...options, widthMm: 86 });
  const [screen] = madePair;

  it("draws one marker for each station, filled inside the window and open outside", () => {
    const [decay] = markers(spec, "screen");
    expect(decay.x.length).toBe(screen.stations.length);
    const fills = decay.marker?.color as string[];
    const used = screen.decay?.points.map((point) => point.used);
    expect(fills.map((fill) => fill === lightTokens.cases[0])).toEqual(used);
  });
  it("draws no bar where a station has no interval", () => {
    const short = screen.stations.findIndex(({ x }) => x === 1.6);
    const [decay] = markers(spec, "screen");
    expect(decay.error_y?.array[short]).toBeNull();
    expect(decay.error_y?.array[short - 1]).toBeGreaterThan(0);
  });
  it("places stations by their distance from the virtual origin over M", () => {
    const [decay] = markers(spec, "screen");
    expect(decay.x[0]).toBe((0.15 - 3.2 * 0.025) / 0.025);
  });
  it("draws the law with the case's dash inside the window and thin and solid beyond", () => {
    const lines = traces(spec).filter(({ mode, xaxis, line }) => mode === "lines" && xaxis === "x2" && line);
    const simulation = lines.filter(({ line }) => line?.color === lightTokens.cases[1]);
    expect(simulation.map(({ line }) => line?.dash)).toEqual(["solid", "5.4px,2.2px"]);
    expect(simulation[0].line?.width).toBeLessThan(simulation[1].line?.width ?? 0);
  });
  it("shows the law's departures as nought on the law itself", () => {
    const onLaw: FigureCase = {
      ...screen,
      decay: screen.decay && {
        ...screen.decay,
        points: screen.decay.points.map((point) => ({
          ...point,
          q: 0.23 * ((point.x - 0.08) / 0.025) ** -1.25,
        })),
      },
    };
    const { table } = decayFigure([onLaw], options);
    const residuals = table.rows.map((row) => Number(row[table.heading.indexOf("residual_percent")]));
    expect(Math.max(...residuals.map(Math.abs))).toBeLessThan(1e-9);
  });
  it("fills every marker of a case that has no fit window yet", () => {
    const unfitted = madePair.map((of) => ({ ...of, decay: null }));
    const [first] = markers(isotropyFigure(unfitted, options), "screen");
    const fills = first.marker?.color as string[];
    expect(fills.filter((fill) => fill === lightTokens.paper)).toHaveLength(1); // the one without an interval
  });
  it("stands on x where a case has no law, without a strip of residuals", () => {
    const lawless = madePair.map((of) => ({ ...of, decay: of.decay && { ...of.decay, law: null } }));
    const plain = decayFigure(lawless, { ...options, widthMm: 86 });
    expect(markers(plain, "screen")).toHaveLength(1);
    expect(markers(plain, "screen")[0].x[0]).toBe(0.15);
    expect(plain.layout).not.toHaveProperty("xaxis3");
  });
  it("marks Tu at the right by its own definition: Tu = √(2k/3)/U", () => {
    const notes = (spec.layout.annotations ?? []) as { text: string; y: number }[];
    const ten = notes.find(({ text }) => text === "10");
    const { range } = axis(spec, "yaxis2");
    const domain = (spec.layout.yaxis2?.domain ?? []) as number[];
    const share = ((ten?.y ?? 0) / spec.heightMm - domain[0]) / (domain[1] - domain[0]);
    const energy = 10 ** (range[0] + share * (range[1] - range[0]));
    expectClose(Math.sqrt((2 * energy) / 3), 0.1, { relative: 1e-9, because: "a closed form, rounded" });
  });
});

describe("figures of what is missing", () => {
  const without = madePair.map((of) => ({
    ...of,
    stations: of.stations.map((station, i) =>
      i === 4 ? { ...station, isotropy_uv: missing("no v") } : station,
    ),
  }));
  it("leave a gap, never a zero", () => {
    const [first] = markers(isotropyFigure(without, options), "screen");
    expect(first.y[4]).toBeNull();
    expect(first.y.filter((value) => value === 0)).toEqual([]);
  });
  it("leave out the panel of Reynolds numbers where there is no viscosity", () => {
    const inviscid = madePair.map((of) => ({
      ...of,
      stations: of.stations.map((station) => ({ ...station, Re_lambda: missing("no viscosity") })),
    }));
    expect(scalesFigure(inviscid, options).layout).not.toHaveProperty("xaxis3");
  });
  it("fall back to the spectrum in its own units where epsilon is not known", () => {
    const bare = picked.map((one) => ({
      ...one,
      station: { ...one.station, epsilon: missing("no viscosity") },
    }));
    expect(spectrumFigure(bare, options).table.heading).toEqual([
      ...["case", "x", "k1", "E11", "E11_low", "E11_high"],
    ]);
    expect(spectrumFigure(picked, options).table.heading).toEqual([
      ...["case", "x", "k1_eta", "E11_compensated", "E11_compensated_low", "E11_compensated_high"],
    ]);
  });
  it("offer a premultiplied spectrum whose area over ln k1 is its share of the variance, and the spectra of v and w", () => {
    const { rows, heading } = spectrumFigure([picked[0]], options, "premultiplied").table;
    expect(heading[3]).toBe("E11_premultiplied");
    const [k, y] = [2, 3].map((column) => rows.map((row) => Number(row[column])));
    const area = y.reduce(
      (sum, value, i) => (i === 0 ? 0 : sum + ((value + y[i - 1]) / 2) * Math.log(k[i] / k[i - 1])),
      0,
    );
    // what the made spectrum itself holds, by trapezoids over its own points
    const { curves, uu } = picked[0].station;
    const [k1, E11] = [curves?.k1 ?? [], curves?.E11 ?? []];
    const held = [...k1].reduce(
      (sum, at, i) => (i === 0 ? 0 : sum + ((E11[i] + E11[i - 1]) / 2) * (at - k1[i - 1])),
      0,
    );
    expectClose(area, held / (uu.value ?? Number.NaN), {
      relative: 0.02,
      because: "trapezoids in k1 over bands are not those in ln k1",
    });
    expect(spectrumFigure(picked, options, "dimensional", "E22").table.heading[3]).toBe("E22");
  });
  it("say that a quantity is not compared", () => {
    const notes = (comparisonFigure(comparedPairs([madeComparison], madePair), options).layout.annotations ??
      []) as {
      text: string;
    }[];
    expect(notes.map(({ text }) => text)).toContain("not compared");
  });
  it("are empty frames where there is no case at all", () => {
    for (const build of [decayFigure, isotropyFigure, scalesFigure, balanceFigure])
      expect(() => build([], options)).not.toThrow();
    expect(() => spectrumFigure([], options)).not.toThrow();
  });
});

describe("a name with markup in it", () => {
  it("is text in the figure, not markup", () => {
    const hostile = madePair.map((of) => ({ ...of, name: "<b>screen</b> & co" }));
    const notes = (balanceFigure(hostile, options).layout.annotations ?? []) as { text: string }[];
    expect(notes.map(({ text }) => text).join()).toContain("&lt;b&gt;screen");
    expect(notes.map(({ text }) => text).join()).not.toContain("<b>screen");
  });
});
