/** Crossings are found to this share of their distance from where the search begins. */
const endTolerance = 1e-6;

/**
 * Where `excess` crosses zero, outward from a point where it is negative; null where it never does.
 * Steps outward grow until the crossing is bracketed, then false position closes on it (Illinois).
 */
export function crossing(
  excess: (at: number) => number,
  from: number,
  step: number,
  limit: number,
  excessThere: number,
): number | null {
  const beyond = (at: number) => (step > 0 ? at >= limit : at <= limit);
  let inside = from;
  let inner = excessThere;
  let outside = from;
  let outer = excessThere;
  for (let tries = 0; outer < 0; tries++) {
    inside = outside;
    inner = outer;
    if (inside === limit || tries > 24) return null;
    outside = from + step * 1.5 ** tries;
    if (beyond(outside)) outside = limit;
    outer = excess(outside);
  }
  const fine = Math.abs(outside - from) * endTolerance;
  for (let round = 0; round < 60 && Math.abs(outside - inside) > fine; round++) {
    const at = inside - (inner * (outside - inside)) / (outer - inner);
    const value = excess(at);
    if (Math.abs(value) < endTolerance * -excessThere) return at;
    if (value < 0) {
      inside = at;
      inner = value;
      outer *= 0.5;
    } else {
      outside = at;
      outer = value;
      inner *= 0.5;
    }
  }
  return (inside + outside) / 2;
}
