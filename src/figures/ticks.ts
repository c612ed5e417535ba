import { decimalsForDigits, formatNumber } from "./formatNumber.ts";

/** Where an axis is marked, in the axis' own numbers; texts are of the majors alone. */
export interface Ticks {
  readonly major: readonly number[];
  readonly text: readonly string[];
  readonly minor: readonly number[];
}

const within = (low: number, high: number) => (value: number) =>
  value >= low * (1 - 1e-9) && value <= high * (1 + 1e-9);

/** 1, 2 … 9 times every power of ten inside a range. */
function logSteps(low: number, high: number, steps: readonly number[]): number[] {
  const values: number[] = [];
  for (let power = Math.floor(Math.log10(low)); power <= Math.ceil(Math.log10(high)); power++) {
    // Division keeps 0.3 what a reader would write: 3 * 0.1 is not.
    for (const step of steps) values.push(power < 0 ? step / 10 ** -power : step * 10 ** power);
  }
  return values.filter(within(low, high));
}

const everyStep = [1, 2, 3, 4, 5, 6, 7, 8, 9];
/** Sparse to dense: the first that marks at least three places. */
const plainSteps = [
  [1, 2, 5],
  [1, 2, 3, 5],
  [1, 2, 3, 4, 5, 6, 8],
];

/** Powers of ten over two decades or more, plain numbers at 1, 2, 5 below; minor ticks at 2 to 9. */
export function logTicks(low: number, high: number): Ticks {
  const minor = logSteps(low, high, everyStep);
  if (Math.log10(high / low) >= 2) {
    const major = logSteps(low, high, [1]);
    return { major, text: major.map((value) => powerText(Math.round(Math.log10(value)))), minor };
  }
  const candidates = plainSteps.map((steps) => logSteps(low, high, steps));
  const major = candidates.find((values) => values.length >= 3) ?? candidates[candidates.length - 1];
  // Less than a third of a decade: the steps of a straight scale say more.
  if (major.length < 2) return linearTicks(low, high);
  return { major, text: major.map(plainText), minor };
}

/** Round steps of 1, 2 or 5 times a power of ten, about `wanted` of them, with minor ticks between. */
export function linearTicks(low: number, high: number, wanted = 5): Ticks {
  const rough = (high - low) / wanted;
  const power = 10 ** Math.floor(Math.log10(rough));
  const lead = rough / power;
  const [step, parts] =
    lead < 1.5 ? [power, 5] : lead < 3.5 ? [2 * power, 4] : lead < 7.5 ? [5 * power, 5] : [10 * power, 5];
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const at = (unit: number, places: number) => {
    const values: number[] = [];
    for (let i = Math.ceil(low / unit - 1e-9); i * unit <= high + 1e-9 * unit; i++)
      values.push(Number((i * unit).toFixed(places)));
    return values;
  };
  const major = at(step, decimals + 2);
  return {
    major,
    text: major.map((value) => (value === 0 ? "0" : formatNumber(value, decimals))),
    minor: at(step / parts, decimals + 4),
  };
}

const powerText = (power: number) => `10<sup>${power < 0 ? `\u2212${-power}` : power}</sup>`;
const plainText = (value: number) => formatNumber(value, decimalsForDigits(value, 1));
