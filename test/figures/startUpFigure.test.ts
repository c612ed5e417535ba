import { describe, expect, it } from "vitest";
import { jointLayout, pairIndex } from "../../src/core/signal/jointMoments.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { blockTraces } from "../../src/figures/blockTrace.ts";
import { defaultFigureOptions, type FigureOptions } from "../../src/figures/figureSpec.ts";
import { startUpFigure } from "../../src/figures/startUpFigure.ts";
import { lightTokens } from "../../src/figures/tokens.ts";
import { expectClose } from "../support/expectClose.ts";
import { madePair } from "./powerLawCase.ts";

const [of] = madePair;
const layout = jointLayout(1);
const weight = 100;

/** A record of u in blocks of 100 samples at 0.01 s, of the given means about U and variances. */
function stationOf(blocks: readonly (readonly [mean: number, variance: number])[]): StationResult {
  const fields = ["weight", "u", "uu", "uuu", "uuuu"];
  const data = new Float64Array(blocks.length * fields.length);
  blocks.forEach(([mean, variance], row) => {
    data[row * fields.length] = weight;
    data[row * fields.length + layout.mean] = weight * mean;
    data[row * fields.length + layout.second + pairIndex(1, 0, 0)] = weight * (variance + mean ** 2);
  });
  const [made] = of.stations;
  return {
    ...made,
    facts: { ...made.facts, components: ["u"] },
    blocks: { fields, rows: blocks.length, data, blockSamples: weight, step: 0.01, start: 0 },
  };
}

const steady = Array.from({ length: 20 }, () => [0, 0.04] as const);

describe("the beginning of a record, block by block", () => {
  const station = stationOf([[0.6, 0.16], ...steady]);
  const [trace] = blockTraces(station, 0.5);

  it("has the mean and the variance of every block, each over those of the record", () => {
    const U = station.U.value ?? 0;
    expectClose(trace[0].mean, (U + 0.6) / U, { relative: 1e-12, because: "a ratio of two numbers given" });
    expectClose(trace[1].mean, 1, { relative: 1e-12, because: "this block departs by nothing" });
    const mean = (0.16 + 20 * 0.04) / 21;
    expectClose(trace[0].variance, 0.16 / mean, { relative: 1e-9, because: "a ratio of two numbers given" });
  });
  it("is drawn against the time since the record began, what was left out included", () => {
    expectClose(trace[0].time, 0.5 + 0.5, {
      relative: 1e-12,
      because: "the middle of a block of one second",
    });
    expectClose(trace[20].time, 0.5 + 20.5, { relative: 1e-12, because: "the middle of the last block" });
  });
  it("shows what is left out as a shaded stretch, and what is proposed as a line", () => {
    const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens, widthMm: 178 };
    const shapes = (startup: number, proposed: number | null) =>
      startUpFigure({ of, station, startup, proposed }, options).layout.shapes ?? [];
    const shaded = (startup: number) => shapes(startup, null).filter(({ type }) => type === "rect").length;
    expect([shaded(0), shaded(0.5)]).toEqual([0, 2]);
    expect(shapes(0, 1).length - shapes(0, null).length).toBe(2);
  });
  it("of a profile there is none", () => {
    expect(blockTraces({ ...station, blocks: null }, 0)).toEqual([]);
  });
});
