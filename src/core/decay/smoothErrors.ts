/** The sampling error of one station, as its own record gave it. */
export interface StationError {
  readonly x: number;
  /** Standard error of ln q; null where the record gave none. */
  readonly error: number | null;
  /** Degrees of freedom behind it; null: known beforehand. */
  readonly freedom: number | null;
  /** Time recorded; null for a profile. */
  readonly duration: number | null;
}

/** Fewer errors than this do not make a line. */
const leastErrors = 3;

/**
 * Errors to weight a fit with. An error told by some twenty blocks scatters by 15 % itself, so those of records
 * are smoothed along the stream: ln(error sqrt(T)) is a straight line in ln x. Given errors are kept.
 * The logarithm of an error with B - 1 degrees of freedom lies 1/(2(B - 1)) low on average; that is put back.
 * @returns one error for each station, or null where the fit must weigh all alike
 * @see     Lenschow, Mann & Kristensen (1994), J. Atmos. Oceanic Technol. 11, 661: error² ~ 2 T_int/T
 */
export function smoothErrors(stations: readonly StationError[]): number[] | null {
  if (stations.some((station) => station.duration === null)) {
    const given = stations.map((station) => station.error);
    return given.every((error) => error !== null) ? given : null;
  }
  const known = stations.filter(({ error, duration }) => error !== null && duration !== null);
  if (known.length < Math.min(leastErrors, stations.length) || known.length === 0) return null;
  const along = stations.every(({ x }) => x > 0) ? Math.log : (x: number) => x;
  const line = straight(
    known.map(({ x }) => along(x)),
    known.map(({ error, freedom, duration }) => {
      const lift = freedom === null ? 0 : 1 / (2 * freedom);
      return Math.log((error ?? 1) * Math.sqrt(duration ?? 1)) + lift;
    }),
  );
  const smoothed = stations.map(({ x, duration }) => Math.exp(line(along(x))) / Math.sqrt(duration ?? 1));
  return smoothed.every((error) => error > 0 && Number.isFinite(error)) ? smoothed : null;
}

function straight(x: readonly number[], y: readonly number[]): (at: number) => number {
  const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const [centre, level] = [mean(x), mean(y)];
  const spread = x.reduce((sum, value) => sum + (value - centre) ** 2, 0);
  const slope =
    spread > 0 ? x.reduce((sum, value, i) => sum + (value - centre) * (y[i] - level), 0) / spread : 0;
  return (at) => level + slope * (at - centre);
}
