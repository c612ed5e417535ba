import { describe, expect, it } from "vitest";
import { bodyFigure } from "../../src/figures/bodyFigure.ts";
import { developmentFigure } from "../../src/figures/developmentFigure.ts";
import { defaultFigureOptions, type FigureOptions, type FigureSpec } from "../../src/figures/figureSpec.ts";
import { darkTokens, lightTokens } from "../../src/figures/tokens.ts";
import { arguedCase, screenLaw } from "../support/arguedCase.ts";
import { expectClose } from "../support/expectClose.ts";
import { known } from "../support/lawStations.ts";

const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens };
const body = { x: 0.9, chord: 0.02, Tu: 0.025, L11: 1.2 };
const screen = arguedCase({
  settings: { body },
  edit: ({ x }) => ({ isotropy_uv: known(1 + 0.4 * Math.exp(-(x - 0.2) / 0.15), 0.01) }),
});
const simulation = arguedCase({
  name: "simulation",
  mark: 1,
  law: { ...screenLaw, A: 0.09, x0: -0.07 },
  settings: { body },
});

interface Seen {
  readonly mode: string;
  readonly name?: string;
  readonly x: readonly (number | null)[];
  readonly y: readonly (number | null)[];
  readonly error_x?: { readonly array: readonly (number | null)[] };
}
const traces = (spec: FigureSpec) => spec.traces as readonly unknown[] as readonly Seen[];
const named = (spec: FigureSpec, name: string) => traces(spec).filter((trace) => trace.name === name);
const because = "the stations lie on the law itself";

describe.each([
  ["body", bodyFigure],
  ["development", developmentFigure],
] as const)("the figure of %s", (key, build) => {
  const spec = build([screen, simulation], options);
  it("has a key and a size of its own, and no number that is not finite", () => {
    expect(spec.key).toBe(key);
    expect(spec.layout.width).toBe(86 * 5);
    expect(spec.layout.height).toBe(spec.heightMm * 5);
    const text = JSON.stringify(spec, (_, value) =>
      typeof value === "number" && !Number.isFinite(value) ? "BAD" : value,
    );
    expect(text).not.toContain("BAD");
  });
  it("is the same drawing in the dark", () => {
    const dark = build([screen, simulation], { ...options, tokens: darkTokens });
    expect(traces(dark).map(({ x, y }) => [x, y])).toEqual(traces(spec).map(({ x, y }) => [x, y]));
  });
  it("gives its numbers as a table with a heading for each column", () => {
    expect(spec.table.rows.length).toBeGreaterThan(0);
    for (const row of spec.table.rows) expect(row.length).toBe(spec.table.heading.length);
  });
});

describe("the path of a case", () => {
  const spec = bodyFigure([screen, simulation], options);
  it("rings the place of the body: per cent of intensity, chords of length", () => {
    const [ring] = named(spec, "body");
    expectClose(ring.x[0], 100 * Math.sqrt(0.04 * ((0.9 - 0.075) / 0.025) ** -1.25), {
      relative: 1e-6,
      because,
    });
    expectClose(ring.y[0], (0.005 * ((0.9 - 0.075) / 0.025) ** 0.375) / 0.02, { relative: 1e-6, because });
    expect(ring.error_x?.array[0]).toBeGreaterThan(0);
  });
  it("marks targets that all cases share once", () => {
    const crosses = named(spec, "target");
    expect(crosses.map(({ x, y }) => [x[0], y[0]])).toEqual([[2.5, 1.2]]);
  });
  it("is in millimetres where a case has no chord, and its target a share of a chord that is not there", () => {
    const bare = arguedCase({ settings: { body: { ...body, chord: null } } });
    const other = bodyFigure([bare], options);
    expectClose(named(other, "body")[0].y[0], 5 * ((0.9 - 0.075) / 0.025) ** 0.375, {
      relative: 1e-6,
      because,
    });
    expect(named(other, "target")).toEqual([]);
  });
  it("tells every station, the body and the target in its table", () => {
    const places = spec.table.rows.filter(([name]) => name === "screen").map(([, place]) => place);
    expect(places.filter((place) => place === "station")).toHaveLength(screen.stations.length);
    expect(places.slice(-2)).toEqual(["body", "target"]);
  });
});

describe("the lines of development", () => {
  it("end where every interval lies inside, and begin where none contradicts", () => {
    const spec = developmentFigure([screen], { ...options, axis: "x/ell" });
    const row = spec.table.rows.find(([, criterion]) => criterion === "isotropy_uv");
    const at = (name: string) => Number(row?.[spec.table.heading.indexOf(name)]);
    const [open, inside] = [at("x_not_contradicted"), at("x_inside")];
    expect(open).toBeLessThanOrEqual(inside);
    // the ratio is within 10 % of one for good from 0.2 m + 0.15 m ln 4 on
    expect(open).toBeGreaterThan(0.3);
    expect(inside).toBeLessThan(0.7);
    const places = named(spec, "screen").map(({ x }) => x[0]);
    expect(places).toContain(open / 0.025);
    expect(places).toContain(inside / 0.025);
  });
  it("say what cannot be judged", () => {
    const notes = developmentFigure([screen], options).layout.annotations ?? [];
    expect(notes.map(({ text }) => text)).toContain("not judged");
  });
});
