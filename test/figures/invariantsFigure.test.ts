import { describe, expect, it } from "vitest";
import { bare } from "../../src/core/quantity.ts";
import { defaultFigureOptions, type FigureOptions } from "../../src/figures/figureSpec.ts";
import { invariantsFigure } from "../../src/figures/invariantsFigure.ts";
import { lightTokens } from "../../src/figures/tokens.ts";
import { madePair } from "./powerLawCase.ts";

const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens };
const at = (xi: number, eta: number) =>
  madePair.slice(0, 1).map((of) => ({
    ...of,
    stations: of.stations.map((station) => ({
      ...station,
      routes: { anisotropy_xi: bare(xi, "made"), anisotropy_eta: bare(eta, "made") },
    })),
  }));

describe("the map of the invariants", () => {
  it("holds the rod of one component, at 1/3 and 1/3, inside its frame (Pope 2000, ch. 11)", () => {
    const { layout, table } = invariantsFigure(at(1 / 3, 1 / 3), options);
    expect(layout.yaxis2?.range?.[1]).toBeGreaterThan(1 / 3);
    expect(layout.xaxis2?.range?.[1]).toBeGreaterThan(1 / 3);
    expect(table.rows[0].slice(2)).toEqual([1 / 3, 1 / 3]);
  });

  it("shows the corner alone where all stations are nearly isotropic", () => {
    const { layout } = invariantsFigure(at(0.01, 0.02), options);
    expect(layout.yaxis2?.range?.[1]).toBeLessThan(0.05);
  });
});
