import { safeFileNames } from "../../export/safeFileNames.ts";
import { download } from "../page/download.ts";
import type { Held } from "../session/session.ts";
import { keptPage } from "./keptPage.ts";
import { workspaceText } from "./workspaceFile.ts";

/** Hands the page over as one file: what was decided and what was found, without the records. */
export function saveWorkspace(held: Held): void {
  const { title, cases } = held.history.present;
  const [name] = safeFileNames([title || cases.map(({ sheet }) => sheet.case).join(" and ") || "page"]);
  download(`${name}.workspace.json`, workspaceText(keptPage(held)), "application/json");
}
