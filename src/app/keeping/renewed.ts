import { readCaseSheet } from "../../sheet/readCaseSheet.ts";
import type { Workspace } from "../../sheet/workspace.ts";
import type { KeptPage } from "./keptPage.ts";

/**
 * A page that another version may have kept, in the form of this one: every sheet passes the schema once more, which
 * checks it and gives the keys that have come since their defaults. Results stay as they are as long as their keys
 * do; where a new key changes how records are reduced, they are reduced again.
 * @throws sheet-invalid a sheet holds what no version could have written
 */
export function renewed(page: KeptPage): KeptPage {
  const { past, present, future } = page.history;
  return {
    ...page,
    history: {
      past: past.map(withRenewedSheets),
      present: withRenewedSheets(present),
      future: future.map(withRenewedSheets),
    },
  };
}

function withRenewedSheets(workspace: Workspace): Workspace {
  return {
    ...workspace,
    cases: workspace.cases.map((each) => ({
      ...each,
      sheet: readCaseSheet(JSON.stringify(each.sheet), each.sheet.case).sheet,
    })),
  };
}
