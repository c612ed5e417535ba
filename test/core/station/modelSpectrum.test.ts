import { describe, expect, it } from "vitest";
import { isotropicRecord } from "../../../sample-data/maker/synthesise.mjs";
import { isEstimate } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { stationOf } from "./records.ts";

// Pope (2000) eqs. (6.246)-(6.248), constants solved for k and epsilon: Re_lambda = 51, sampled every 2 eta.
const flow = { k: 0.24, epsilon: 10, viscosity: 1.5e-5, U: 10 };
const eta = (flow.viscosity ** 3 / flow.epsilon) ** 0.25;
const seeds = Array.from({ length: 100 }, (_, i) => i + 1);

function recordOf(seed: number, spacing: number, samples: number) {
  return isotropicRecord({ ...flow, step: (spacing * eta) / flow.U, samples, seed });
}

describe("records of Pope's model spectrum, 300 integral times long", () => {
  const step = (2 * eta) / flow.U;
  const { truth } = recordOf(1, 2, 256);
  const samples = Math.round((300 * truth.T_int) / step);
  const stations: StationResult[] = seeds.map((seed) => {
    const { u, v, w } = recordOf(seed, 2, samples);
    return stationOf({ u, v, w }, {}, { step });
  });
  const wanted = { uu: truth.uu, L11: truth.L11, lambda: truth.lambda, epsilon: truth.epsilon };

  it.each(Object.entries(wanted))(
    "hold %s in their 95 %% interval for 90 of 100 seeds or more",
    (name, value) => {
      const held = stations.filter((station) => {
        const q = station[name as keyof typeof wanted];
        return isEstimate(q) && q.low !== null && q.high !== null && q.low <= value && value <= q.high;
      });
      expect(held.length).toBeGreaterThanOrEqual(90);
    },
  );
  it.each([
    ["uu", 0.03],
    ["L11", 0.08],
    ["lambda", 0.02],
    ["epsilon", 0.01],
  ] as const)("give %s without bias, within %d", (name, allowed) => {
    const logs = stations.map((station) => {
      const q = station[name];
      return isEstimate(q) ? Math.log(q.value / wanted[name]) : Number.NaN;
    });
    const mean = logs.reduce((sum, value) => sum + value, 0) / logs.length;
    expectClose(mean, 0, {
      absolute: allowed,
      because: "two to three standard errors of the mean of 100 seeds",
    });
  });
});
