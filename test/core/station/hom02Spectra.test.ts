import { describe, expect, it } from "vitest";
import { oneDimensionalSpectra } from "../../../sample-data/maker/oneDimensionalSpectra.mjs";
import { expectClose } from "../../support/expectClose.ts";
import { readRows } from "../../support/readRows.ts";
import { interpolated } from "../../support/tabulatedSpectrum.ts";

/**
 * Decaying isotropic turbulence on 512^3 points, A. A. Wray (1997): data set HOM02 of J. Jimenez (ed.), AGARD-AR-345 (1998).
 * E, E11 and E22 were stored independently of each other: E over shells, the others over planes.
 */
const rows = readRows(new URL("../../reference/agard_hom02/hom02_spectra_selected.csv", import.meta.url));
const times = [...new Set(rows.map((row) => row.time))];

describe.each(times)("the energy spectrum of HOM02 at t = %s", (time) => {
  const own = rows.filter((row) => row.time === time);
  const read = (name: string) => own.map((row) => Number(row[name]));
  const [k, E, E11, E22] = ["k", "E", "E11_longitudinal", "E22_transverse"].map(read);
  const held = E.flatMap((value, i) => (value > 0 ? [i] : []));
  const table = { k: held.map((i) => k[i]), E: held.map((i) => E[i]) };
  const derived = oneDimensionalSpectra(interpolated(table, "nothing"), [1, table.k[table.k.length - 1]]);
  const at = (of: Float64Array, k1: number) => {
    const after = derived.k1.findIndex((one) => one >= k1 * (1 - 1e-12));
    const share =
      after === 0
        ? 0
        : Math.log(derived.k1[after] / k1) / Math.log(derived.k1[after] / derived.k1[after - 1]);
    return of[after] + share * (of[Math.max(0, after - 1)] - of[after]);
  };

  // Pope (2000) eqs. (6.216)-(6.218), numbers from memory: E11 = ∫ (E/κ)(1 - k1²/κ²) dκ, E22 = ½ ∫ (E/κ)(1 + k1²/κ²) dκ
  it("gives its E11 and E22 by the isotropic relations where the box holds many waves", () => {
    let compared = 0;
    for (let k1 = 12; k1 <= 160; k1 += 4) {
      const because = `one box at one time, k1 = ${k1}`;
      expectClose(at(derived.E11, k1), E11[k1], { relative: 0.025, because });
      expectClose(at(derived.E22, k1), E22[k1], { relative: 0.025, because });
      compared++;
    }
    expect(compared).toBe(38);
  });
  it("gives them on average over these waves far closer: what is left is scatter", () => {
    const mean = (of: Float64Array, stored: readonly number[]) => {
      let sum = 0;
      for (let k1 = 12; k1 <= 160; k1++) sum += Math.log(at(of, k1) / stored[k1]) / 149;
      return sum;
    };
    const because = "149 wavenumbers that scatter by a percent";
    expectClose(mean(derived.E11, E11), 0, { absolute: 0.005, because });
    expectClose(mean(derived.E22, E22), 0, { absolute: 0.005, because });
  });
  it("gives them within the scatter of the few waves there are at the scale of the box", () => {
    for (let k1 = 1; k1 <= 4; k1++) {
      const because = `a handful of modes in a box, k1 = ${k1}`;
      expectClose(at(derived.E11, k1), E11[k1], { relative: 0.12, because });
      expectClose(at(derived.E22, k1), E22[k1], { relative: 0.12, because });
    }
  });
});
