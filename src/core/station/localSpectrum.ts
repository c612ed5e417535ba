import { logBins } from "../signal/logBins.ts";
import type { LocalSpectrum } from "../stationResult.ts";

const perDecade = 20;
/** Half of a quarter of a decade, in ln k. */
const halfWindow = Math.LN10 / 8;
const fewestBands = 3;

/**
 * Local log-log slope of E11, and the lateral spectrum that follows from it if the flow is isotropic,
 *     E22 = (E11 - k1 dE11/dk1)/2 = E11 (1 - slope)/2
 * From bands of a twentieth of a decade: a straight line through those within an eighth of a decade of each, all
 * weighing alike, so that a spectrum that curves has the slope of its middle. The raw estimate is never
 * differentiated.
 * @param k1   wavenumbers, rad/m, equally spaced, ascending, the first the spacing
 * @param E11  one-sided spectra at them, m³/s²; E22, E33 measured, null where they are not
 * @returns    points with at least three positive bands within reach, and a whole reach on either side
 * @see   Pope (2000) eq. (6.218)
 */
export function localSpectrum(
  k1: Float64Array,
  E11: Float64Array,
  E22: Float64Array | null,
  E33: Float64Array | null,
): LocalSpectrum {
  const borders = logBins(1, k1.length + 1, perDecade);
  const bands = borders.slice(1).map((end, b) => {
    const [from, to] = [borders[b] - 1, end - 1];
    const of = (E: Float64Array | null) => (E === null ? 0 : mean(E, from, to));
    return { x: Math.log(mean(k1, from, to)), E11: of(E11), E22: of(E22), E33: of(E33) };
  });
  const [first, last] = [bands[0]?.x ?? 0, bands.at(-1)?.x ?? 0];
  const points = bands.flatMap((band) => {
    if (band.x - first < halfWindow || last - band.x < halfWindow * 0.999) return [];
    const near = bands.filter(({ x, E11: E }) => E > 0 && Math.abs(x - band.x) <= halfWindow * (1 + 1e-9));
    if (!(band.E11 > 0) || near.length < fewestBands) return [];
    const slope = slopeOf(near);
    return [{ ...band, slope, isotropic: (band.E11 * (1 - slope)) / 2 }];
  });
  const curve = (value: (point: (typeof points)[number]) => number) => Float64Array.from(points, value);
  return {
    k1: curve(({ x }) => Math.exp(x)),
    E11: curve((point) => point.E11),
    slope: curve(({ slope }) => slope),
    E22_isotropic: curve(({ isotropic }) => isotropic),
    E22: E22 === null ? null : curve((point) => point.E22),
    E33: E33 === null ? null : curve((point) => point.E33),
  };
}

function mean(values: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let i = from; i < to; i++) sum += values[i];
  return sum / (to - from);
}

/** Slope of ln E11 in ln k by least squares. */
function slopeOf(bands: readonly { x: number; E11: number }[]): number {
  const centre = bands.reduce((sum, { x }) => sum + x, 0) / bands.length;
  let [square, product] = [0, 0];
  for (const { x, E11 } of bands) {
    square += (x - centre) ** 2;
    product += (x - centre) * Math.log(E11);
  }
  return product / square;
}
