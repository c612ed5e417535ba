/** Bands a decade, as wide in the logarithm everywhere. */
export const bandsPerDecade = 20;

/**
 * Borders of frequency bands, counted down from Nyquist by twentieths of a decade, so that spectra of segments
 * of any length share them: band 0 is the highest.
 * @param size  samples a segment
 * @returns     bin at which band b begins (inclusive); band b ends where band b - 1 begins, band 0 at size/2 + 1.
 *              The last band takes all that is left above bin 0.
 */
export function bandBorders(size: number): readonly number[] {
  let borders = known.get(size);
  if (!borders) {
    borders = makeBorders(size);
    known.set(size, borders);
  }
  return borders;
}

const known = new Map<number, readonly number[]>();

function makeBorders(size: number): number[] {
  const nyquist = size / 2;
  const borders: number[] = [];
  for (let band = 1; ; band++) {
    const border = Math.ceil(nyquist * 10 ** (-band / bandsPerDecade) - 1e-9);
    if (border <= 1) return [...borders, 1];
    borders.push(border);
  }
}
