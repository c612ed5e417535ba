import type { CommonBlocks } from "./commonBlocks.ts";
import type { Refusal, WindowFit } from "./fitWindow.ts";
import { jackknifeLaw } from "./jackknifeLaw.ts";

/** A window's law with what its common blocks tell; `from`: its first station among those of the blocks. */
export function withCommonBlocks(
  fitted: WindowFit | Refusal,
  blocks: CommonBlocks | null,
  from: number,
): WindowFit | Refusal {
  if (blocks === null || "refused" in fitted) return fitted;
  const together = jackknifeLaw(fitted, blocks, from);
  return together === null ? fitted : { ...fitted, together };
}
