import { describe, expect, it } from "vitest";
import { bandBorders } from "../../../src/core/station/bandBorders.ts";
import { joinParts } from "../../../src/core/station/joinParts.ts";
import { joinSpectra } from "../../../src/core/station/joinSpectra.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { stationGradients } from "../../../src/core/station/stationGradients.ts";
import { structureSums } from "../../../src/core/station/structureSums.ts";
import { expectClose } from "../../support/expectClose.ts";
import {
  centred,
  close,
  count,
  density,
  mean,
  productAt,
  station,
  step,
  u,
  v,
  w,
  whole,
} from "./quickStation.ts";
import { partOf, settings, smooth, whiteNoise } from "./records.ts";

describe("the curves of a station", () => {
  const { curves } = station;
  if (curves === null) throw new Error("no curves");
  const U = mean(u);
  const [a, b, c] = [u, v, w].map(centred);

  it("are Welch's spectra in wavenumber, k1 = 2πf/U", () => {
    const unit = (2 * Math.PI) / (U * 64 * step);
    [1, 2, 9].forEach((f) => {
      expectClose(curves.k1[f - 1], f * unit, close);
      expectClose(curves.E11[f - 1], (density(a, f) * U) / (2 * Math.PI), close);
      expectClose(curves.E22?.[f - 1], (density(b, f) * U) / (2 * Math.PI), close);
      expectClose(curves.E33?.[f - 1], (density(c, f) * U) / (2 * Math.PI), close);
      expectClose(curves.E12?.[f - 1], (density(a, f, b) * U) / (2 * Math.PI), close);
    });
  });
  it("have 36 K/19 degrees of freedom, or 2 T df of a band", () => {
    const segments = Math.floor((count - 64) / 32) + 1;
    expectClose(curves.freedom, (36 * segments) / 19, close);
    expectClose(curves.freedoms?.[0], Math.max((36 * segments) / 19, (2 * count) / 64), close);
    expect([station.facts.segment, station.facts.segments]).toEqual([64, segments]);
  });
  it("are correlations over their value at 0, up to four zero crossings", () => {
    [0, 1, 5].forEach((l) => {
      expectClose(curves.rho_u[l], productAt(a, l) / productAt(a, 0), close);
      expectClose(curves.rho_v?.[l], productAt(b, l) / productAt(b, 0), close);
      expectClose(curves.rho_w?.[l], productAt(c, l) / productAt(c, 0), close);
      expectClose(curves.lag[l], l * step, close);
    });
    expect(curves.lag.length).toBe(Math.ceil((4 * (station.facts.tauStar ?? 0)) / step) + 1);
  });
  it("of u alone have no others", () => {
    const alone = reduceStation([partOf({ u })], settings).curves;
    expect([alone?.E22, alone?.E33, alone?.E12, alone?.rho_v, alone?.rho_w]).toEqual([
      null,
      null,
      null,
      null,
      null,
    ]);
  });
  it("have a local slope where there are bands enough, for u and what else is measured", () => {
    expect(curves.local?.E22?.length).toBe(curves.local?.k1.length);
    expect(curves.local?.E33).not.toBeNull();
    const long = reduceStation([partOf({ u }, { settings: { segment: 512 } })], settings).curves?.local;
    expect(long?.k1.length).toBeGreaterThan(10);
    expect([long?.E22, long?.E33]).toEqual([null, null]);
  });
});

describe("how the gradient varies along a record", () => {
  const record = joinParts([whole], settings);
  const spectra = joinSpectra(record);
  const times = {
    routes: station.routes as never,
    tauStar: station.facts.tauStar,
    scale: station.T_int.value,
  };
  const [found] = stationGradients(record, spectra, times);

  it("is told by short segments in each block, and their mean is the record's value", () => {
    const { bands, blocks } = whole;
    if (bands === null) throw new Error("no bands");
    expect(found.rule.floor).toBe(0);
    const borders = bandBorders(bands.size);
    const at = (block: number) => {
      let power = 0;
      for (let band = 0; band < borders.length; band++) power += bands.sums[0][block * bands.count + band];
      const width = 1 / (bands.size * step);
      const rate =
        ((2 * Math.PI * width) ** 2 * width * 2 * step * power) /
        (bands.segments[block] * 0.375 * bands.size);
      const row = record.rows[block];
      const variance = row[record.fields.indexOf("uu")] / row[0];
      return row[0] * (rate - (4 / 3) * (Math.PI * width) ** 2 * variance);
    };
    expectClose(found.rows[7] / found.rows[3], at(7) / at(3), close);
    const total = found.rows.reduce((sum, value) => sum + value, 0);
    expectClose(total / count, found.rate, close);
    expect(blocks.rows).toBe(found.rows.length);
  });
  it("has the record's own noise taken out of every block, up to its cut", () => {
    const white = whiteNoise(count, 6);
    const part = partOf({ u: smooth(count, 8).map((value, i) => 10 + value + 0.06 * white[i]) });
    const { bands } = part;
    if (bands === null) throw new Error("no bands");
    const own = joinParts([part], settings);
    const [one] = stationGradients(own, joinSpectra(own), { ...times, scale: 0.04 });
    expect(one.rule.floor).toBeGreaterThan(0);
    const borders = bandBorders(bands.size);
    const at = (block: number) => {
      let [power, squares] = [0, 0];
      for (let band = one.rule.cut; band < borders.length; band++) {
        power += bands.sums[0][block * bands.count + band];
        const end = band === 0 ? bands.size / 2 + 1 : borders[band - 1];
        for (let f = borders[band]; f < end; f++) squares += f * f;
      }
      const width = 1 / (bands.size * step);
      const density = (2 * step * power) / (bands.segments[block] * 0.375 * bands.size);
      const row = own.rows[block];
      const variance = row[own.fields.indexOf("uu")] / row[0];
      const rate = (2 * Math.PI * width) ** 2 * width * (density - one.rule.floor * squares);
      return row[0] * (rate - (4 / 3) * (Math.PI * width) ** 2 * variance);
    };
    const steady = Array.from({ length: part.blocks.rows }, (_, b) => b).filter((b) => bands.segments[b] > 0);
    const total = steady.reduce((sum, b) => sum + at(b), 0);
    const weight = steady.reduce((sum, b) => sum + own.rows[b][0], 0);
    for (const b of steady.slice(0, 6)) expectClose(one.rows[b], (at(b) * one.rate * weight) / total, close);
  });
  it("is taken like the record's where a block has no segment of its own", () => {
    const bands = whole.bands && {
      ...whole.bands,
      segments: whole.bands.segments.map((n, b) => (b === 5 ? 0 : n)),
    };
    const holed = joinParts([{ ...whole, bands }], settings);
    const [one] = stationGradients(holed, spectra, times);
    expectClose(one.rows[5], 64 * one.rate, close);
  });
  it("is not formed of samples that are not correlated", () => {
    expect(stationGradients(record, spectra, { ...times, scale: 0.99 * step })).toEqual([]);
    expect(stationGradients(record, spectra, { ...times, scale: 1.01 * step }).length).toBe(3);
    expect(stationGradients(record, null, times)).toEqual([]);
  });
});

describe("structure functions of a station", () => {
  it("are held at the lags where they bound the dissipation best, between lambda and L11", () => {
    const record = joinParts([whole], settings);
    const [from, to] = [2 * step, 4 * step];
    const found = structureSums(record, from, to);
    const table = whole.increments;
    if (!found || !table) throw new Error("none");
    const between = table.lags.filter((lag) => lag >= 2 && lag <= 4);
    expect(between.length).toBeGreaterThan(1);
    const sums = between.map((lag) => {
      const at = table.lags.indexOf(lag);
      const of = (entry: number) => {
        let sum = 0;
        for (let block = 0; block < whole.blocks.rows; block++)
          sum += table.sums[(block * table.lags.length + at) * 3 + entry];
        return sum;
      };
      return { lag, second: (of(1) / of(0)) ** 1.5 / lag, third: of(2) / of(0) / lag };
    });
    const best = (key: "second" | "third") => sums.reduce((p, q) => (q[key] > p[key] ? q : p)).lag;
    expectClose(found.second.lag, best("second") * step, close);
    expectClose(found.third.lag, best("third") * step, close);
    expect(structureSums(record, 0.1 * step, 0.9 * step)).toBeNull();
  });
});
