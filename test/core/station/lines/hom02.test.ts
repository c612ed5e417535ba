import { readFileSync } from "node:fs";
import { join } from "node:path";
import { expect, it } from "vitest";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { lineSettings } from "./madeLines.ts";

/**
 * Decaying isotropic turbulence in a box of side 2 pi, a direct simulation on 512^3 points by A. A. Wray (1997): data set
 * HOM02 of J. Jimenez (ed.), AGARD-AR-345 (1998). Energy of each whole wavenumber, longitudinal and transverse.
 */
const folder = join(import.meta.dirname, "../../../reference/agard_hom02");
const rowsOf = (name: string) =>
  readFileSync(join(folder, name), "utf8")
    .trim()
    .split("\n")
    .slice(1)
    .map((line) => line.split(",").map(Number));
const viscosity = 3.5014006e-4;
const time = 4.04124;
const rows = rowsOf("hom02_spectra_selected.csv").filter(([t]) => t === time);
const [E11, E22] = [3, 4].map((column) => rows.map((row) => row[column]));
const moment = (E: readonly number[], power: number) => E.reduce((sum, e, k) => sum + e * k ** power, 0);

/** Lines of that energy at each wavenumber, with phases of their own; their means take turns in sign. */
function station() {
  const random = seededRandom(42);
  const size = 484; // the highest wavenumber of the set is 241
  const grid = {
    file: "hom02",
    position: "sheet" as const,
    along: "z" as const,
    components: ["u", "v", "w"] as const,
    stations: [0],
    points: Float64Array.from({ length: size }, (_, i) => (2 * Math.PI * i) / size),
    across: [{ y: 0, z: null }],
  };
  const reducer = startLines(grid);
  for (let s = 0; s < 20; s++) {
    const line = (E: readonly number[]) => {
      const phases = E.map(() => 2 * Math.PI * random.uniform());
      return grid.points.map((y) =>
        E.reduce(
          (sum, e, k) =>
            sum + (k === 0 ? (-1) ** s * Math.sqrt(e) : Math.sqrt(2 * e) * Math.cos(k * y + phases[k])),
          0,
        ),
      );
    };
    reducer.add(s, [line(E22), line(E22), line(E11)]);
  }
  return reduceLines(reducer.finish(), { ...lineSettings, kinematicViscosity: viscosity });
}

it("lines with the spectra of HOM02 give back its energy, its dissipation and its Taylor Reynolds number", () => {
  const found = station();
  const exact = { relative: 1e-9, because: "every line holds the energy of every wavenumber exactly" };
  expect(found.facts.lines?.periodic).toBe(true);
  expectClose(found.ww.value, moment(E11, 0), exact);
  expectClose(found.uu.value, moment(E22, 0), exact);
  expectClose(found.gradient.value, moment(E11, 2), exact);
  for (let k = 1; k < 20; k++) expectClose(found.curves?.E11[k - 1], E11[k], exact);

  const history = rowsOf("hom02_history.csv");
  const [, K, enstrophy] = history.reduce((best, row) =>
    Math.abs(row[0] - time) < Math.abs(best[0] - time) ? row : best,
  );
  const rounded = {
    relative: 0.012,
    because: "the set's own spectra and history agree to a percent at small scales",
  };
  expectClose(found.k.value, K, rounded);
  expectClose(found.epsilon.value, viscosity * enstrophy, rounded);
  expectClose(found.Re_lambda.value, ((2 * K) / 3) * Math.sqrt(15 / (viscosity ** 2 * enstrophy)), rounded);
}, 30_000);

it("and show its isotropy: small scales within a percent of it", () => {
  const { routes } = station();
  expectClose(routes.K_v.value, (2 * moment(E11, 2)) / moment(E22, 2), {
    relative: 1e-9,
    because: "as above",
  });
  expectClose(routes.K_v.value, 1, {
    relative: 0.01,
    because: "isotropic by construction of the simulation",
  });
}, 30_000);
