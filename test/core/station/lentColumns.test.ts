import { expect, it } from "vitest";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { borrowColumn, returnColumn } from "../../../src/core/station/columnStore.ts";
import { PilotBuffer } from "../../../src/core/station/pilotBuffer.ts";

const origin = { file: "a.csv", x: 1, y: null, z: null, step: null, position: "sheet" } as const;

it("a record whose first column was lent a longer array than the others holds all of its samples", () => {
  const count = 40_000;
  const random = seededRandom(3);
  const column = () => Float64Array.from({ length: count }, () => random.gaussian());
  const block = {
    count,
    t: Float64Array.from({ length: count }, (_, i) => i),
    u: column(),
    v: column(),
    w: column(),
  };
  // what a record of u alone gives back
  const empty = Array.from({ length: 8 }, () => borrowColumn(1));
  returnColumn(new Float64Array(1 << 20));
  const buffer = new PilotBuffer(origin, 0, "written");
  buffer.add(block, 0, count, (i) => i);
  const held = buffer.block();
  for (const name of ["t", "u", "v", "w"] as const)
    expect(held[name]?.subarray(0, count)).toEqual(block[name]);
  buffer.release();
  expect(empty).toHaveLength(8);
});
