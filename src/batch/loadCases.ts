import type { PlainFailure } from "../core/failure.ts";
import { ReductionFailure } from "../core/failure.ts";
import { againstWarning } from "../sheet/againstWarning.ts";
import type { LoadedCase } from "./loadCase.ts";
import { loadCase } from "./loadCase.ts";

/** All sheets that can be used, each case name once. What cannot be used is told, and a case to compare with that is none. */
export function loadCases(
  sheets: readonly string[],
  { folder, tell }: { readonly folder: string; tell(line: string): void },
  fail: (failure: PlainFailure) => void,
): LoadedCase[] {
  const loaded = new Map<string, LoadedCase>();
  for (const path of sheets) {
    try {
      const each = loadCase(path, folder);
      each.warnings.forEach(tell);
      const same = loaded.get(each.sheet.case);
      if (same) throw twice(each, same);
      loaded.set(each.sheet.case, each);
      each.failures.forEach(fail);
    } catch (error) {
      if (!(error instanceof ReductionFailure)) throw error;
      fail(error.at({ file: path }).plain());
    }
  }
  const cases = [...loaded.values()];
  const doubt = againstWarning(
    cases.map(({ sheet }) => sheet),
    cases[0]?.path ?? "",
  );
  if (doubt !== null) tell(doubt);
  return cases;
}

function twice(later: LoadedCase, earlier: LoadedCase): ReductionFailure {
  return new ReductionFailure(
    "duplicate-case",
    {
      message: `Two cases have one name, and ${earlier.path} has it already`,
      found: later.sheet.case,
      remedy: "Give this case another name.",
    },
    { file: later.path, key: "case" },
  );
}
