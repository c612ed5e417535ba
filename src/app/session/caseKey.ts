import { readSettings } from "../../sheet/readSettings.ts";
import { reduceSettings } from "../../sheet/reduceSettings.ts";
import { resultKey } from "../../sheet/resultKey.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";

/**
 * The key a case's stations are kept under: files, reading and reducing settings. A name, a window or a
 * reference length leaves it as it is, so that only what must be read again is.
 */
export function caseKey(of: WorkspaceCase): string {
  const before = known.get(of);
  if (before !== undefined) return before;
  const { sheet, sources } = of;
  const reduce = reduceSettings(sheet);
  const key = sources
    .map(({ fingerprint }, i) => resultKey(fingerprint, readSettings(sheet, sheet.files[i]), reduce))
    .join(" ");
  known.set(of, key);
  return key;
}

/** A case is asked for its key at every change of the page, and does not change itself. */
const known = new WeakMap<WorkspaceCase, string>();
