import { type JointLayout, jointLayout, pairIndex } from "../signal/jointMoments.ts";
import type { Component } from "./stationPart.ts";

/** Names of the sums of differences of u that follow the joint moments in a block's row. */
export const differenceFields = [
  /** Differences taken, and Σ d² of the second- and fourth-order central difference, per step². */
  "differences",
  "difference2",
  "difference4",
  /** Central differences at the step nearest eta: how many, Σ d² and Σ d³, per time unit. */
  "derivatives",
  "derivative_squared",
  "derivative_cubed",
] as const;

/**
 * What stands in a block's row of a part: weight, means about the plan's reference, centred sums of the second
 * order (uu, uv …), third (uuu …) and fourth (uuuu …), then the differences of u.
 */
export function blockFields(components: readonly Component[]): string[] {
  const layout = jointLayout(components.length);
  const fields = new Array<string>(layout.length);
  fields[0] = "weight";
  components.forEach((a, i) => {
    fields[layout.mean + i] = a;
    fields[layout.third + i] = a.repeat(3);
    fields[layout.fourth + i] = a.repeat(4);
    for (let j = i; j < components.length; j++) {
      fields[layout.second + pairIndex(components.length, i, j)] = a + components[j];
    }
  });
  return [...fields, ...differenceFields];
}

export function blockLayout(components: readonly Component[]): JointLayout {
  return jointLayout(components.length);
}
