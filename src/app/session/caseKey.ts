import { readSettings } from "../../sheet/readSettings.ts";
import { reduceSettings } from "../../sheet/reduceSettings.ts";
import { resultKey } from "../../sheet/resultKey.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";

/**
 * The key a case's stations are kept under: files, reading and reducing settings. A name, a window or a
 * reference length leaves it as it is, so that only what must be read again is.
 */
export function caseKey({ sheet, sources }: WorkspaceCase): string {
  const reduce = reduceSettings(sheet);
  return sources
    .map(({ fingerprint }, i) => resultKey(fingerprint, readSettings(sheet, sheet.files[i]), reduce))
    .join(" ");
}
