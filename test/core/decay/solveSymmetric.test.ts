import { describe, expect, it } from "vitest";
import { inverseOfSymmetric, solveSymmetric } from "../../../src/core/decay/solveSymmetric.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";

const random = seededRandom(17);

/** J'J of a random J, its columns of very different size, as those of a law's numbers are. */
function normal(scales: readonly number[]): number[] {
  const rows = Array.from({ length: 6 }, () => scales.map((scale) => scale * random.gaussian()));
  return [0, 1, 2].flatMap((a) => [0, 1, 2].map((b) => rows.reduce((sum, row) => sum + row[a] * row[b], 0)));
}

const times = (matrix: readonly number[], x: ArrayLike<number>) =>
  [0, 1, 2].map((row) => matrix[3 * row] * x[0] + matrix[3 * row + 1] * x[1] + matrix[3 * row + 2] * x[2]);

describe.each([[[1, 1, 1]], [[1e-4, 1, 1e5]], [[3e6, 2e-3, 40]]])(
  "three equations of scales %s",
  (scales) => {
    const matrix = normal(scales);
    const right = scales.map((scale) => scale * random.gaussian());
    const out = new Float64Array(3);
    const close = (found: number, expected: number, at: number) =>
      expectClose(found, expected, { absolute: 1e-9 * scales[at], because: "rounding times the condition" });

    it("are solved: the matrix times the solution is the right-hand side", () => {
      expect(solveSymmetric(matrix, 0, right, out)).toBe(true);
      times(matrix, out).forEach((value, i) => {
        close(value, right[i], i);
      });
    });
    it.each([0.001, 0.5, 20])("are damped by %d of each element of the diagonal (Marquardt)", (damping) => {
      expect(solveSymmetric(matrix, damping, right, out)).toBe(true);
      const damped = matrix.map((value, at) => (at % 4 === 0 ? value * (1 + damping) : value));
      times(damped, out).forEach((value, i) => {
        close(value, right[i], i);
      });
    });
    it("have an inverse: with the matrix it gives the unit matrix, and it is symmetric", () => {
      const inverse = inverseOfSymmetric(matrix) ?? [];
      for (let row = 0; row < 3; row++)
        for (let column = 0; column < 3; column++) {
          const product = [0, 1, 2].reduce(
            (sum, k) => sum + matrix[3 * row + k] * inverse[3 * k + column],
            0,
          );
          close(product * scales[column], (row === column ? 1 : 0) * scales[row], row);
          const other = inverse[3 * column + row];
          expectClose(inverse[3 * row + column], other, { relative: 1e-9, because: "rounding" });
        }
    });
  },
);

describe("equations that do not tell their numbers apart", () => {
  const out = new Float64Array(3);
  it.each([
    ["the second is the first", [4, 4, 1, 4, 4, 1, 1, 1, 9]],
    ["the third is the sum of both", [2, 1, 3, 1, 2, 3, 3, 3, 6]],
    ["one is empty", [0, 0, 0, 0, 1, 0, 0, 0, 1]],
    ["the last is empty", [1, 0, 0, 0, 1, 0, 0, 0, 0]],
    ["one is no number", [1, 0, 0, 0, Number.NaN, 0, 0, 0, 1]],
  ])("are refused: %s", (_, matrix) => {
    expect(solveSymmetric(matrix, 0, [1, 1, 1], out)).toBe(false);
    expect(inverseOfSymmetric(matrix)).toBeNull();
  });
});
