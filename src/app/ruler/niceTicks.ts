/** Marks of a straight scale: majors carry numerals, minors do not. */
export interface ScaleTicks {
  readonly majors: readonly number[];
  readonly minors: readonly number[];
  readonly step: number;
  /** Decimals that tell the majors apart. */
  readonly decimals: number;
}

/** 1, 2 or 5 times a power of ten, not below `least`. */
export function niceStep(least: number): number {
  const decade = 10 ** Math.floor(Math.log10(least));
  const lead = least / decade;
  // 1e-9: a step that is 2.0000000001 by rounding is a 2.
  const nice = [1, 2, 5, 10].find((step) => step >= lead * (1 - 1e-9)) ?? 10;
  return nice * decade;
}

/**
 * Majors at multiples of 1, 2 or 5, about ten on the scale and never closer than their numerals allow;
 * minors a quarter of a step for 2, a fifth for 1 and 5.
 * @param from,to    ends of the scale, in the numbers it shows; from < to
 * @param width      its length, px; > 0
 */
export function niceTicks(from: number, to: number, width: number): ScaleTicks {
  const span = to - from;
  // 0.8: ten majors is the aim, twelve are still calm, five are not enough to read between.
  let step = niceStep((0.8 * span) / 10);
  while ((step * width) / span < numeralRoom(from, to, step) && step < span) step = niceStep(step * 1.5);
  const decimals = decimalsOf(step);
  const parts = Math.round(step / 10 ** Math.floor(Math.log10(step) + 1e-9)) === 2 ? 4 : 5;
  const first = Math.ceil((from / step) * parts - 1e-9);
  const last = Math.floor((to / step) * parts + 1e-9);
  const marks = Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);
  const at = (mark: number) => (mark * step) / parts;
  return {
    majors: marks.filter((mark) => mark % parts === 0).map(at),
    minors: marks.filter((mark) => mark % parts !== 0).map(at),
    step,
    decimals,
  };
}

function decimalsOf(step: number): number {
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
}

/** Px that the longest numeral takes, with a gap: 6 px a sign at 13 px. */
function numeralRoom(from: number, to: number, step: number): number {
  const signs = [from, to].map((end) => (Math.trunc(end / step) * step).toFixed(decimalsOf(step)).length);
  return 6 * Math.max(...signs) + 5;
}
