import { describe, expect, it } from "vitest";
import { decayFigure } from "../../src/figures/decayFigure.ts";
import type { FigureSpec } from "../../src/figures/figureSpec.ts";
import { defaultFigureOptions, type FigureCase, type FigureOptions } from "../../src/figures/figureSpec.ts";
import { localDecayFigure } from "../../src/figures/localDecayFigure.ts";
import { regionFigure } from "../../src/figures/regionFigure.ts";
import { routesFigure } from "../../src/figures/routesFigure.ts";
import { scanFigure } from "../../src/figures/scanFigure.ts";
import { straightLineFigure } from "../../src/figures/straightLineFigure.ts";
import { darkTokens, lightTokens } from "../../src/figures/tokens.ts";
import { arguedCases, screenLaw } from "../support/arguedCases.ts";
import { expectClose } from "../support/expectClose.ts";

const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens, widthMm: 178 };
const cases = arguedCases();
const exact = arguedCases({}, 0);
const everyFigure: [string, (of: readonly FigureCase[], how: FigureOptions) => FigureSpec][] = [
  ["the joint regions", regionFigure],
  ["the window scan", scanFigure],
  ["the routes", routesFigure],
  ["the local exponent", localDecayFigure],
  ["the straight line", straightLineFigure],
];

interface Seen {
  readonly mode: string;
  readonly name?: string;
  readonly x: readonly (number | null)[];
  readonly y: readonly (number | null)[];
  readonly xaxis?: string;
  readonly fill?: string;
  readonly line?: { readonly color: string; readonly dash: string };
  readonly marker?: { readonly color: string | string[] };
}
const traces = (spec: FigureSpec) => spec.traces as readonly unknown[] as readonly Seen[];
const fills = (marker: Seen["marker"]) => (Array.isArray(marker?.color) ? marker.color : []);
const column = (
  { table }: FigureSpec,
  key: string,
  of: (row: Record<string, unknown>) => boolean = () => true,
) =>
  table.rows
    .map((row) => Object.fromEntries(table.heading.map((name, i) => [name, row[i]])))
    .filter(of)
    .map((row) => row[key]);

describe.each(everyFigure)("the figure of %s", (_, build) => {
  it.each([86, 140, 178])("has its size in mm, %d wide, side by side or one above the other", (widthMm) => {
    for (const stacked of [false, true]) {
      const spec = build(cases, { ...options, widthMm, stacked });
      expect([spec.widthMm, spec.layout.width, spec.layout.height]).toEqual([
        ...[widthMm, widthMm * 5, spec.heightMm * 5],
      ]);
    }
  });
  it("holds finite numbers alone, as many x as y, and a CSV row of the heading's length for each of its numbers", () => {
    for (const from of [cases, exact, arguedCases({ x0: 0.075 }), arguedCases({ weights: "equal" })]) {
      const spec = build(from, options);
      const bad = (_key: string, value: unknown) =>
        typeof value === "number" && !Number.isFinite(value) ? "BAD" : value;
      expect(JSON.stringify(spec, bad).includes("BAD")).toBe(false);
      for (const { x, y } of traces(spec)) expect(x.length).toBe(y.length);
      expect(spec.table.rows.length).toBeGreaterThan(0);
      for (const row of spec.table.rows) expect(row.length).toBe(spec.table.heading.length);
    }
  });
  it("is the same drawing in the dark, but for its colours", () => {
    const places = (spec: FigureSpec) => traces(spec).map(({ x, y }) => [x, y]);
    expect(places(build(cases, { ...options, tokens: darkTokens }))).toEqual(places(build(cases, options)));
  });
  it("is an empty frame where nothing was argued", () => {
    const bare = cases.map((of) => ({
      ...of,
      decay: of.decay && { ...of.decay, argument: undefined },
      argued: null,
    }));
    expect(() => build(bare as FigureCase[], options)).not.toThrow();
    expect(() => build([], options)).not.toThrow();
  });
});

describe("the joint region", () => {
  const [screen] = cases;
  const region = screen.decay?.argument?.region;

  it("is drawn as the profile's contour itself, x0 in multiples of M", () => {
    const outer = region?.contours.find(({ level }) => level === 0.95);
    const drawn = traces(decayFigure([screen], options)).filter(
      ({ xaxis, fill }) => xaxis === "x4" && fill === "toself",
    );
    expect(drawn[0].x.slice(0, -1)).toEqual(outer?.n);
    expect(drawn[0].y.slice(0, -1)).toEqual(outer?.x0.map((place) => place / screenLaw.ell));
  });
  it("stays, grey and unfilled, while a newer fit waits for its own", () => {
    const moved: FigureCase = {
      ...screen,
      decay: screen.decay && { ...screen.decay, argument: undefined },
    } as FigureCase;
    const spec = decayFigure([moved], options);
    expect(traces(spec).filter(({ xaxis, fill }) => xaxis === "x4" && fill === "toself")).toHaveLength(0);
    const grey = traces(spec).filter(({ xaxis, line }) => xaxis === "x4" && line?.color === lightTokens.ink3);
    expect(grey).toHaveLength(2);
    expect(grey[0].x.slice(0, -1)).toEqual(region?.contours.find(({ level }) => level === 0.95)?.n);
  });
  it("is not drawn where the origin is held: there is an interval, no region", () => {
    const spec = decayFigure(arguedCases({ x0: 0.075 }), options);
    expect(traces(spec).filter(({ xaxis, fill }) => xaxis === "x4" && fill === "toself")).toHaveLength(0);
  });
  it("has the refits and the ellipse of the covariance beside it in detail", () => {
    const spec = regionFigure([screen], options);
    expect(column(spec, "n", ({ curve }) => curve === "refit")).toEqual(
      screen.decay?.argument?.bootstrap?.cloud.n,
    );
    expect(column(spec, "n", ({ curve }) => curve === "covariance")).toHaveLength(2 * 97);
  });
  it("has the least scatter of the classical scan at the origin of an exact law", () => {
    const spec = regionFigure([exact[0]], options);
    const isScan = ({ curve }: Record<string, unknown>) => curve === "scan of x0";
    const rms = column(spec, "rms_percent", isScan) as number[];
    const best = (column(spec, "x0/ell", isScan) as number[])[rms.indexOf(Math.min(...rms))];
    const steps = (column(spec, "x0/ell", isScan) as number[])
      .map((place) => Math.abs(place - 3))
      .sort((a, b) => a - b);
    expect(Math.abs(best - 3)).toBe(steps[0]);
  });
});

describe("the window scan", () => {
  it("fills the marker of the adopted window alone, in each of its four panels", () => {
    const spec = scanFigure([cases[0]], options);
    const markers = traces(spec).filter(({ mode, name }) => mode === "markers" && name === "screen");
    expect(markers).toHaveLength(4);
    for (const { marker, x } of markers) {
      const filled = fills(marker).flatMap((fill, i) => (fill === lightTokens.cases[0] ? [x[i]] : []));
      expect(filled).toHaveLength(1);
    }
  });
  it("gives one n, the law's own, whatever station of an exact law comes first or last", () => {
    const values = column(scanFigure([exact[0]], options), "n").filter((value) => value !== null) as number[];
    expect(values.length).toBeGreaterThan(12);
    for (const value of values)
      expectClose(value, screenLaw.n, { relative: 1e-5, because: "three stations amplify rounding" });
  });
  it("leaves the windows of too few stations as gaps", () => {
    const [last] = column(
      scanFigure([cases[0]], options),
      "n",
      ({ varied, stations }) => varied === "first" && Number(stations) < 3,
    );
    expect(last).toBeNull();
  });
});

describe("the routes", () => {
  it("have a row each, and the numbers of the results", () => {
    const spec = routesFigure([cases[0]], options);
    const routes = cases[0].decay?.argument?.routes ?? [];
    expect(column(spec, "route")).toEqual(["adopted", ...routes.map(({ name }) => name)]);
    expect(column(spec, "n_low").slice(1)).toEqual(routes.map(({ n }) => (n.value === null ? null : n.low)));
  });
  it("show a held number by an open marker and no bar", () => {
    const spec = routesFigure([cases[0]], options);
    const [exponents] = traces(spec).filter(({ mode, name }) => mode === "markers" && name === "screen");
    const held = cases[0].decay?.argument?.routes.findIndex(({ key }) => key === "straight-line") ?? -1;
    expect(fills(exponents.marker)[held + 1]).toBe(lightTokens.paper);
    expect(fills(exponents.marker)[0]).toBe(lightTokens.cases[0]);
  });
  it("gain a row for another origin that is asked about, with the exponent that origin would give", () => {
    const [tried] = arguedCases({ otherX0: 0 }, 0);
    const rows = column(routesFigure([tried], options), "n", ({ route }) =>
      String(route).startsWith("x0 held"),
    );
    expect(rows).toHaveLength(2);
    expect(rows[0]).toBe(rows[1]);
    expect(Number(rows[0])).toBeGreaterThan(screenLaw.n);
  });
});

describe("the local exponent", () => {
  it("of an exact law is its exponent at every station with two neighbours, and the compensated energy is A", () => {
    const spec = localDecayFigure([exact[0]], options);
    const exponents = column(spec, "local_exponent").filter((value) => value !== null) as number[];
    expect(exponents).toHaveLength(10);
    for (const value of exponents)
      expectClose(value, screenLaw.n, {
        relative: 1e-6,
        because: "the law is exact, the fitted origin to nine digits",
      });
    for (const level of column(spec, "compensated") as number[])
      expectClose(level, screenLaw.A, { relative: 1e-6, because: "as above" });
  });
});

describe("the straight line", () => {
  it("of an exact law is the distance from its origin in reference lengths", () => {
    const spec = straightLineFigure([exact[0]], options);
    const [xs, ys] = [column(spec, "x") as number[], column(spec, "straightened") as number[]];
    for (const [i, y] of ys.entries())
      expectClose(y, (xs[i] - screenLaw.x0) / screenLaw.ell, { relative: 1e-6, because: "the law is exact" });
  });
  it("turns the ends of an interval round: more energy is nearer the origin", () => {
    const spec = straightLineFigure([cases[0]], options);
    const [lows, ys] = [
      column(spec, "straightened_low") as number[],
      column(spec, "straightened") as number[],
    ];
    expect(lows.every((low, i) => low < ys[i])).toBe(true);
  });
});
