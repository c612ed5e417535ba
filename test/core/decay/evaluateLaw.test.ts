import { describe, expect, it } from "vitest";
import { evaluateLaw } from "../../../src/core/decay/evaluateLaw.ts";
import { lawCovariance } from "../../../src/core/decay/lawCovariance.ts";
import {
  type Held,
  type LawProblem,
  lawProblem,
  powerLawDefaults,
} from "../../../src/core/decay/lawProblem.ts";
import { normalMatrix } from "../../../src/core/decay/normalMatrix.ts";
import { inverseOfSymmetric } from "../../../src/core/decay/solveSymmetric.ts";
import { expectClose } from "../../support/expectClose.ts";

const x = [1.2, 1.5, 2.1, 2.8, 3.9, 5.5];
const law = { A: 0.3, x0: 0.4, n: 1.3, ell: 0.5 };
const error = [0.03, 0.02, 0.02, 0.025, 0.03, 0.04];
const scatter = [0.02, -0.01, 0.015, -0.02, 0.01, 0.005];
const q = x.map((place, i) => law.A * ((place - law.x0) / law.ell) ** -law.n * Math.exp(scatter[i]));

const problemOf = (residuals: "log" | "linear") =>
  lawProblem({ x, q, error }, { ...powerLawDefaults, residuals, length: law.ell });

/** The law about the centre of the stations that has given A, x0 and n. */
function centred(problem: LawProblem, A: number, x0: number, n: number) {
  const kappa = 1 / (problem.centre - x0);
  return { c: Math.log(A) + n * Math.log(kappa * law.ell), b: n * kappa, kappa };
}

/** Weighted sum of squares by the formula q = A ((x - x0)/ell)^(-n) itself. */
function sumOf(residuals: "log" | "linear", A: number, x0: number, n: number): number {
  return x.reduce((sum, place, i) => {
    const model = A * ((place - x0) / law.ell) ** -n;
    const r = residuals === "log" ? Math.log(q[i] / model) / error[i] : (q[i] - model) / (error[i] * q[i]);
    return sum + r * r;
  }, 0);
}

const heldAt = (A: number, x0: number, n: number): Held => ({ lnA: Math.log(A), x0, n });

describe.each(["log", "linear"] as const)("a law evaluated with %s residuals", (residuals) => {
  const rounding = { relative: 1e-10, because: "the same sum, in other variables" };

  it("with A, x0 and n held has the sum of squares of its formula", () => {
    for (const [A, x0, n] of [
      [0.3, 0.4, 1.3],
      [0.2, -1, 1.1],
      [0.35, 1.1, 2],
    ]) {
      const problem = problemOf(residuals);
      const sum = evaluateLaw(problem, centred(problem, A, x0, n), heldAt(A, x0, n));
      expectClose(sum, sumOf(residuals, A, x0, n), rounding);
    }
  });

  it("with x0 and n held takes the A of least sum: any other is worse", () => {
    const problem = problemOf(residuals);
    const found = centred(problem, 1, 0.6, 1.2);
    const sum = evaluateLaw(problem, found, { lnA: null, x0: 0.6, n: 1.2 });
    const A = Math.exp(found.c - 1.2 * Math.log(found.kappa * law.ell));
    expectClose(sum, sumOf(residuals, A, 0.6, 1.2), rounding);
    for (const factor of [0.999, 1.001]) expect(sumOf(residuals, factor * A, 0.6, 1.2)).toBeGreaterThan(sum);
  });

  it.each([1e-7, 3e-4, 1e-3, 0.02, 0.15])("is its own series about the exponential, kappa = %d", (kappa) => {
    const problem = problemOf(residuals);
    const at = { c: -1.5, b: 0.7, kappa };
    // A held with n: nothing is solved
    const n = at.b / kappa;
    evaluateLaw(problem, at, { lnA: -1.5 - n * Math.log(kappa * law.ell), x0: 0, n });
    x.forEach((place, i) => {
      const d = place - problem.centre;
      let [g, byKappa] = [0, 0];
      // ln(1 + kappa d)/kappa and its derivative, term by term
      for (let k = 0; k < 60; k++) {
        g += (-1) ** k * kappa ** k * (d ** (k + 1) / (k + 1));
        if (k > 0) byKappa += (-1) ** k * k * kappa ** (k - 1) * (d ** (k + 1) / (k + 1));
      }
      const scale = residuals === "log" ? 1 / error[i] : Math.exp(at.c - at.b * g) / (error[i] * q[i]);
      const close = { relative: 1e-11, because: "four terms up to 1e-3; the closed form's digits beyond" };
      expectClose(problem.g[i], g, close);
      expectClose(problem.byC[i], scale, close);
      expectClose(problem.byB[i], -scale * g, close);
      expectClose(problem.byKappa[i], -scale * at.b * byKappa, close);
    });
  });

  it.each([
    ["all free", { lnA: null, x0: null, n: null }],
    ["n held", { lnA: null, x0: null, n: 1.3 }],
    ["x0 held", { lnA: null, x0: 0.4, n: null }],
    ["A held", { lnA: Math.log(0.3), x0: null, n: null }],
    ["A and n held", { lnA: Math.log(0.3), x0: null, n: 1.3 }],
    ["A and x0 held", { lnA: Math.log(0.3), x0: 0.4, n: null }],
  ] as const)("has the slope of its sum in each free number, %s", (_, held) => {
    const problem = problemOf(residuals);
    const [A, x0, n] = [0.3, 0.4, 1.3];
    const start = centred(problem, A, x0, n);
    // nothing is solved: all three are pinned for the evaluation, and the derivatives are those of the formula
    evaluateLaw(problem, { ...start }, heldAt(A, x0, n));
    normalMatrix(problem, start, held);
    const gradient = Array.from(problem.gradient);
    const moved = (at: number, step: number) => {
      const to = { ...start };
      if (at === 0) to.c += step;
      if (at === 1) to.b += step;
      if (at === 2) to.kappa += step;
      if (held.n !== null) to.b = held.n * to.kappa;
      const exponent = to.b / to.kappa;
      if (held.lnA !== null) to.c = held.lnA + exponent * Math.log(to.kappa * law.ell);
      const level = Math.exp(to.c - exponent * Math.log(to.kappa * law.ell));
      return sumOf(residuals, level, problem.centre - 1 / to.kappa, exponent);
    };
    const free = [held.lnA === null, held.n === null, held.x0 === null];
    free.forEach((isFree, at) => {
      const step = 1e-6;
      // J'r is minus half the slope of the sum
      const slope = (moved(at, step) - moved(at, -step)) / (2 * step);
      expectClose(gradient[at], isFree ? -slope / 2 : 0, {
        relative: 1e-6,
        absolute: 1e-6,
        because: "central differences",
      });
    });
  });
});

describe("the covariance of a law", () => {
  const problem = problemOf("log");
  /** Numeric Jacobian of the weighted law in (ln A, x0, n), as far as free. */
  function numeric(free: readonly number[]): number[] {
    const at = [Math.log(law.A), law.x0, law.n];
    const model = (p: readonly number[], i: number) =>
      (p[0] - p[2] * Math.log((x[i] - p[1]) / law.ell)) / error[i];
    const step = 1e-5;
    const columns = [0, 1, 2].map((k) =>
      x.map((_, i) => {
        const [up, down] = [step, -step].map((h) => at.map((value, j) => (j === k ? value + h : value)));
        return (model(up, i) - model(down, i)) / (2 * step);
      }),
    );
    const normal = [0, 1, 2].flatMap((a) =>
      [0, 1, 2].map((b) => {
        if (!free.includes(a) || !free.includes(b)) return a === b ? 1 : 0;
        return x.reduce((sum, _, i) => sum + columns[a][i] * columns[b][i], 0);
      }),
    );
    const inverse = inverseOfSymmetric(normal) ?? [];
    return inverse.map((value, k) => (free.includes(Math.floor(k / 3)) && free.includes(k % 3) ? value : 0));
  }

  it.each([
    ["all free", { lnA: null, x0: null, n: null }, [0, 1, 2]],
    ["n held", { lnA: null, x0: null, n: law.n }, [0, 1]],
    ["x0 held", { lnA: null, x0: law.x0, n: null }, [0, 2]],
    ["x0 and n held", { lnA: null, x0: law.x0, n: law.n }, [0]],
  ] as const)("is (J'J)⁻¹ in ln A, x0 and n, %s", (_, held, free) => {
    const at = centred(problem, law.A, law.x0, law.n);
    evaluateLaw(problem, { ...at }, heldAt(law.A, law.x0, law.n));
    const found = lawCovariance(problem, at, held) ?? [];
    const expected = numeric(free);
    const scale = Math.max(...expected.map(Math.abs));
    found.forEach((value, k) => {
      expectClose(value, expected[k], {
        relative: 1e-5,
        absolute: 1e-9 * scale,
        because: "central differences",
      });
    });
  });
});
