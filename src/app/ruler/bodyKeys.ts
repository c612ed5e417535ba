/** Where a key moves the body: arrows 1 % of the scale, with Shift 5 %. Null: not a key that moves it. */
export function bodyKeys(x: number, scaleSpan: number, key: string, shift: boolean): number | null {
  const step = (scaleSpan * (shift ? 5 : 1)) / 100;
  if (key === "ArrowLeft" || key === "ArrowDown") return tidy(x - step, scaleSpan);
  if (key === "ArrowRight" || key === "ArrowUp") return tidy(x + step, scaleSpan);
  return null;
}

/** A place set by hand keeps no digits finer than a thousandth of the scale. */
export function tidy(x: number, scaleSpan: number): number {
  const finest = 10 ** Math.floor(Math.log10(scaleSpan / 1000));
  return Number((Math.round(x / finest) * finest).toPrecision(12));
}
