import { ReductionFailure } from "../../core/failure.ts";
import { program } from "../../core/program.ts";
import type { Workspace } from "../../sheet/workspace.ts";
import { workspaceMark } from "./isWorkspaceFile.ts";
import { type KeptPage, nothingKept } from "./keptPage.ts";
import { numbersFromJson, numbersToJson } from "./numbersJson.ts";
import { renewed } from "./renewed.ts";

/** A page as one file that a colleague can open: decisions and results, without the records themselves. */
export function workspaceText(page: KeptPage): string {
  const { history, ...rest } = page;
  const { name, version } = program;
  const text = numbersToJson({ program: name, version, ...rest, workspace: history.present });
  return `${workspaceMark},${text.slice(1)}\n`;
}

/**
 * A workspace file as a page. Its cases get fresh names of their own inside the program, so that a file can be
 * opened beside the page it was saved from. Settings that its version did not know get their defaults.
 * @param token unlike that of any file opened before
 * @throws sheet-not-json, sheet-invalid it is damaged, or from a later version than this can read
 */
export function readWorkspaceText(text: string, file: string, token: string): KeptPage {
  const held = parsed(text, file);
  const { schema, workspace, previews, reductions, files, aside } = held;
  if (typeof schema !== "number" || schema > nothingKept.schema)
    throw refused(file, `schema ${String(schema)}`, "Open it with the version of the program that saved it.");
  try {
    const page = {
      ...nothingKept,
      history: { past: [], present: workspace as Workspace, future: [] },
      previews: (previews ?? []) as KeptPage["previews"],
      reductions: (reductions ?? {}) as KeptPage["reductions"],
      files: (files ?? []) as KeptPage["files"],
      aside: (aside ?? nothingKept.aside) as KeptPage["aside"],
    };
    return withFreshIds(renewed(page), token);
  } catch (error) {
    if (error instanceof ReductionFailure)
      throw new ReductionFailure(error.code, error.facts, { ...error.where, file });
    throw refused(
      file,
      "a part that is missing or of another kind",
      "Save the workspace again where it is whole.",
    );
  }
}

function parsed(text: string, file: string): Record<string, unknown> {
  try {
    return numbersFromJson(text) as Record<string, unknown>; // an object: its mark was seen
  } catch {
    throw refused(
      file,
      "a text that ends or is broken in the middle",
      "Save the workspace again where it is whole.",
    );
  }
}

function withFreshIds(page: KeptPage, token: string): KeptPage {
  const fresh = (id: string) => `${token}-${id}`;
  const { present } = page.history;
  const workspace: Workspace = {
    ...present,
    cases: present.cases.map((each) => ({ ...each, id: fresh(each.id) })),
    picked: present.picked.map((each) => ({ ...each, caseId: fresh(each.caseId) })),
  };
  return {
    ...page,
    history: { past: [], present: workspace, future: [] },
    reductions: Object.fromEntries(Object.entries(page.reductions).map(([id, each]) => [fresh(id), each])),
  };
}

function refused(file: string, found: string, remedy: string): ReductionFailure {
  return new ReductionFailure(
    "sheet-invalid",
    {
      message: "The workspace file cannot be opened",
      found,
      expected: "a workspace as this program saves it",
      remedy,
    },
    { file },
  );
}
