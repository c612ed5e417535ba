import { wholeMoments } from "./recordCorrelation.ts";
import { aboutItself } from "./recordTime.ts";
import type { StationPart } from "./stationPart.ts";

/**
 * Records of one probe, one after another, are given one mean: about a mean of its own, each would lose what is
 * slower than itself. They are of one probe where they stand at one place that is known, or where their times follow
 * each other at places that are not.
 * @param parts  of one station, in order of place and time
 */
export function withCommonMeans(parts: readonly StationPart[]): readonly StationPart[] {
  const probes = recordsByProbe(parts);
  const common = new Map(probes.filter(({ length }) => length > 1).flatMap(meansOf));
  return parts.map((part) => common.get(part) ?? aboutItself(part));
}

/** Records sorted by the probe that took them, each probe's in order of time. */
export function recordsByProbe(parts: readonly StationPart[]): StationPart[][] {
  const probes: StationPart[][] = [];
  for (const part of [...parts].sort((a, b) => a.start - b.start)) {
    const probe = probes.find((held) => held.every((other) => isOneProbe(other, part)));
    if (probe === undefined) probes.push([part]);
    else probe.push(part);
  }
  return probes;
}

function isOneProbe(before: StationPart, after: StationPart): boolean {
  const [a, b] = [before.origin, after.origin];
  if (a.y !== b.y || a.z !== b.z || before.components.length !== after.components.length) return false;
  const known = a.y !== null || a.z !== null;
  const follows = after.start >= before.start + before.duration - before.step;
  // without a time column every record begins at 0, which tells nothing
  return follows || (known && before.start === after.start);
}

function meansOf(probe: readonly StationPart[]): [StationPart, StationPart][] {
  const samples = probe.reduce((sum, part) => sum + part.samples, 0);
  const means = probe[0].components.map((_, c) =>
    probe.reduce(
      (sum, part) => sum + (part.samples / samples) * (part.plan.reference[c] + wholeMoments(part)[1 + c]),
      0,
    ),
  );
  return probe.map((part) => [
    part,
    { ...part, commonRest: means.map((mean, c) => mean - part.plan.reference[c]) },
  ]);
}
