import type { JoinedLines } from "./joinLines.ts";
import type { LinePart, MemorySums } from "./linePart.ts";
import { startMemory } from "./snapshotMemory.ts";

/** How far apart in time snapshots must be to count as independent. */
export interface SnapshotTime {
  /** Integral time of the point values, by snapshots; null with fewer than two of them. */
  readonly time: number | null;
  /** Correlation between neighbouring snapshots. */
  readonly neighbours: number | null;
  /** Independent snapshots: as many as there are, or the time spanned over twice the integral time. */
  readonly independent: number;
}

/**
 * Decorrelation of snapshots, from point values of all components,
 *     T = dt (1/2 + Σ ρ_m),   up to the first ρ_m ≤ 0,
 * ρ_m the correlation of a point with itself m snapshots later. Where it has not fallen to zero over the snapshots
 * remembered, an exponential through the last one carries on.
 */
export function snapshotTime(lines: JoinedLines): SnapshotTime {
  const { snapshots, start, end } = lines;
  if (snapshots < 2) return { time: null, neighbours: null, independent: snapshots };
  const rho = memoryOf(lines);
  const step = (end - start) / (snapshots - 1);
  let steps = 0.5;
  let last = 1;
  let lag = 1;
  for (; lag < rho.length && rho[lag] > 0; lag++) {
    last = rho[lag];
    steps += last;
  }
  // Σ ρ of what is not remembered, were it to fall on as it fell so far
  if (lag === rho.length && lag > 1 && last < 1) {
    const keep = last ** (1 / (lag - 1));
    steps += (last * keep) / (1 - keep);
  }
  const time = last < 1 || lag === 1 ? steps * step : end - start;
  const independent = Math.max(1, Math.min(snapshots, (end - start + step) / (2 * time)));
  return { time, neighbours: rho.length > 1 ? rho[1] : null, independent };
}

function memoryOf({ parts, means }: JoinedLines): number[] {
  const singles = parts.every((part) => part.single !== null);
  const sums = singles ? acrossFiles(parts) : parts.map((part) => ({ part, memory: part.memory }));
  const lags = sums[0].memory.products.length;
  const rho: number[] = [];
  for (let lag = 0; lag < lags; lag++) {
    let product = 0;
    let count = 0;
    for (const { part, memory } of sums) {
      product += memory.products[lag];
      count += memory.counts[lag];
      // Σ (a - d)(b - d) = Σ a b - d Σ (a + b) + n d²
      for (let c = 0; c < means.length; c++) {
        const d = means[c] - part.reference[c];
        const at = lag * means.length + c;
        product += d * (memory.counts[lag] * d - memory.later[at] - memory.earlier[at]);
      }
    }
    if (!(count > 0)) break;
    rho.push(product / count);
  }
  return rho.map((value) => value / rho[0]);
}

/** Files of one snapshot each: the same lines, one file after the other. */
function acrossFiles(parts: readonly LinePart[]): { part: LinePart; memory: MemorySums }[] {
  const lines = new Map<string, LinePart[]>();
  for (const part of parts) {
    const place = part.across.map(({ y, z }) => `${y} ${z}`).join();
    lines.set(place, [...(lines.get(place) ?? []), part]);
  }
  return [...lines.values()].map((series) => {
    const [first] = series;
    const memory = startMemory(1, first.single?.[0].length ?? 0, first.components.length);
    for (const { single } of series) if (single) memory.add(single, [first.reference]);
    return { part: first, memory: memory.of(0) };
  });
}
