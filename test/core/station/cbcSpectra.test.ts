import { describe, it } from "vitest";
import { oneDimensionalSpectra } from "../../../sample-data/maker/oneDimensionalSpectra.mjs";
import { bandBorders } from "../../../src/core/station/bandBorders.ts";
import { meanSquareRate } from "../../../src/core/station/meanSquareRate.ts";
import { spectrumTail } from "../../../src/core/station/spectrumTail.ts";
import consistency from "../../reference/cbc1971/cbc1971_consistency.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";
import { readRows } from "../../support/readRows.ts";
import {
  asDensity,
  columnsOf,
  gradientOf,
  interpolated,
  varianceOf,
} from "../../support/tabulatedSpectrum.ts";

const reference = (name: string) => new URL(`../../reference/${name}`, import.meta.url);

describe.each([0, 1, 2])(
  "the spectra of Comte-Bellot & Corrsin (1971), M = 5.08 cm, station %d of table 4",
  (i) => {
    // cm and s; nu = U0 M/34000, stated in their section 2
    const nu = 0.149412;
    const gross = readRows(reference("cbc1971/cbc1971_table4_gross_properties.csv"))[i];
    const [u, epsilon] = [Number(gross.u1_rms_cm_s), Number(gross.epsilon_cm2_s3)];
    const [one, three] = [consistency.one_dimensional_M_5p08[i], consistency.three_dimensional[i]];
    const station = `tU0M${one.tU0_over_M}_cm3_s2`;
    const E11 = columnsOf(
      readRows(reference("cbc1971/cbc1971_table2a_E11_M5.08cm.csv")),
      "k1_per_cm",
      `E11_${station}`,
    );
    const E = columnsOf(
      readRows(reference("cbc1971/cbc1971_table3_E3D_M5.08cm.csv")),
      "k_per_cm",
      `E_${station}`,
    );
    const spectrum = asDensity(interpolated(E11, "flat"), 2 * E11.k[E11.k.length - 1], 1 << 15);
    const rounded = { absolute: 0.0016, because: "ratios of three digits, and the rule of integration" };

    it("table 2(a): the variance over that of table 4", () => {
      expectClose(varianceOf(spectrum) / u ** 2, one.u2, rounded);
    });
    it("table 2(a): the dissipation over that of table 4, in the measured range", () => {
      expectClose((15 * nu * gradientOf(spectrum)) / epsilon, one.eps_measured, rounded);
    });
    it("table 2(a): the same with the tail beyond it", () => {
      const { density, size, step } = spectrum;
      const measured = bandBorders(size).findIndex((border) => border <= size / 4) + 1;
      const tail = spectrumTail(density, 0, size, measured);
      const rule = {
        floor: 0,
        cut: measured,
        cutBin: bandBorders(size)[measured - 1],
        tail,
        shareBeyond: 0,
        slope: 0,
      };
      expectClose((15 * nu * meanSquareRate(density, size, step, rule)) / epsilon, one.eps_with_tail, {
        absolute: 0.02,
        because: "an exponential through the last octave, not the last points alone; the tail is up to 0.042",
      });
    });
    it("table 2(a): lambda as table 4 has it, but for both ratios", () => {
      const lambda = Math.sqrt(varianceOf(spectrum) / gradientOf(spectrum));
      expectClose(lambda / Number(gross.lambda_g_cm), Math.sqrt(one.u2 / one.eps_measured), {
        relative: 0.006,
        because: "lambda of table 4 follows from its u' and epsilon within 0.5 %",
      });
    });
    it("table 3: the energy and the dissipation over those of table 4, by way of E11", () => {
      const [first, last] = [E.k[0], E.k[E.k.length - 1]];
      const oneSided = oneDimensionalSpectra(interpolated(E, "nothing"), [first / 100, last]);
      const table = { k: Array.from(oneSided.k1).slice(0, -1), E: Array.from(oneSided.E11).slice(0, -1) };
      const derived = asDensity(interpolated(table, "flat"), last, 1 << 14);
      expectClose(varianceOf(derived) / u ** 2, three.k_measured, rounded);
      expectClose((15 * nu * gradientOf(derived)) / epsilon, three.eps_measured, rounded);
      const lambda = Math.sqrt(varianceOf(derived) / gradientOf(derived));
      expectClose(lambda / Number(gross.lambda_g_cm), Math.sqrt(three.k_measured / three.eps_measured), {
        relative: 0.006,
        because: "lambda of table 4 follows from its u' and epsilon within 0.5 %",
      });
    });
    it("table 3: the same with k² below the measured range and an exponential above it", () => {
      const [first, last] = [E.k[0], E.k[E.k.length - 1]];
      const inside = interpolated(E, "nothing");
      const [before, end] = E.E.slice(-2);
      const fall = Math.log(before / end) / (last - E.k[E.k.length - 2]);
      const whole = (k: number) => {
        if (k < first) return E.E[0] * (k / first) ** 2;
        return k > last ? end * Math.exp(-fall * (k - last)) : inside(k);
      };
      const far = 4 * last;
      const oneSided = oneDimensionalSpectra(whole, [first / 100, far]);
      const table = { k: Array.from(oneSided.k1).slice(0, -1), E: Array.from(oneSided.E11).slice(0, -1) };
      const derived = asDensity(interpolated(table, "flat"), far, 1 << 16);
      expectClose(varianceOf(derived) / u ** 2, three.k_with_tails, rounded);
      expectClose((15 * nu * gradientOf(derived)) / epsilon, three.eps_with_tail, {
        absolute: 0.02,
        because: "which of the last points an exponential goes through; the tail is up to 0.157",
      });
    });
  },
);
