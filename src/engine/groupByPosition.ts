/** Positions this close, measured by the span of all of them, are one: they were printed with other digits. */
const sameShare = 1e-9;

/**
 * Parts that stand at one x, station by station.
 * @param parts in the order of the files, probe after probe
 * @returns     stations in order of x; the parts of each in the order in which they came
 */
export function groupByPosition<P extends { readonly origin: { readonly x: number } }>(
  parts: readonly P[],
): P[][] {
  const places = parts.map(({ origin }, order) => ({ x: origin.x, order }));
  places.sort((a, b) => a.x - b.x || a.order - b.order);
  const last = places.at(-1);
  if (!last) return [];
  const span = last.x - places[0].x || Math.abs(last.x);
  const groups: (typeof places)[] = [];
  for (const place of places) {
    const open = groups.at(-1);
    if (open && place.x - open[0].x <= sameShare * span) open.push(place);
    else groups.push([place]);
  }
  return groups.map((group) => group.sort((a, b) => a.order - b.order).map(({ order }) => parts[order]));
}
