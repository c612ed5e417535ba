import { describe, it } from "vitest";
import { startEdges } from "../../../src/core/signal/edgeSums.ts";
import { fillJoint, jointLayout } from "../../../src/core/signal/jointMoments.ts";
import { startLagProducts } from "../../../src/core/signal/lagProducts.ts";
import { mergeJoint } from "../../../src/core/signal/mergeJoint.ts";
import { readUnivariateNist } from "../../reference/readUnivariateNist.ts";
import { expectClose } from "../../support/expectClose.ts";

const layout = jointLayout(1);

/** Mean, deviation and lag-1 autocorrelation as a record gets them: about a first level, block by block. */
function summary(y: Float64Array, block: number) {
  const level = y[0];
  const x = y.map((value) => value - level);
  const whole = new Float64Array(layout.length);
  const row = new Float64Array(layout.length);
  const lags = startLagProducts(4, 4, 1);
  const edges = startEdges(4, 1);
  for (let from = 0; from < x.length; from += block) {
    const to = Math.min(from + block, x.length);
    fillJoint(row, layout, [x], from, to, null);
    mergeJoint(whole, row, layout);
    lags.add(x, from, to);
    edges.add(x, from, to);
  }
  const products = new Float64Array(4);
  lags.flush(products);
  const rest = whole[layout.mean];
  const n = x.length;
  const about = (l: number) =>
    products[l] - rest * (2 * n * rest - edges.heads()[l] - edges.tails()[l]) + (n - l) * rest * rest;
  return {
    mean: level + rest,
    deviation: Math.sqrt(whole[layout.second] / (n - 1)),
    autocorrelation: about(1) / about(0),
  };
}

const eleven = { relative: 1e-11, because: "NIST certifies more digits, and the method keeps eleven" };
const digits: Record<string, { relative: number; because: string }> = {
  NumAcc3: {
    relative: 1e-9,
    because: "1000000.1 in a double is off by 6e-11: its deviation holds nine digits",
  },
  NumAcc4: {
    relative: 1e-8,
    because: "10000000.1 in a double is off by 1e-9: its deviation holds eight digits",
  },
};

describe.each(["Lew", "Mavro", "Michelso", "NumAcc1", "NumAcc2", "NumAcc3", "NumAcc4"])(
  "NIST StRD %s, in blocks of 8",
  (name) => {
    const nist = readUnivariateNist(name);
    const found = summary(nist.y, 8);
    it("has the certified mean", () => expectClose(found.mean, nist.mean, eleven));
    it("has the certified deviation", () =>
      expectClose(found.deviation, nist.deviation, digits[name] ?? eleven));
    it("has the certified lag-1 autocorrelation", () =>
      expectClose(found.autocorrelation, nist.autocorrelation, digits[name] ?? eleven));
  },
);
