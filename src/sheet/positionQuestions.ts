import type { CaseSheet } from "./caseSheet.ts";
import type { Question } from "./dropPlan.ts";
import type { Previews } from "./planDrop.ts";

/**
 * The files of a case that do not say where, or how often, they were sampled, so that it must be asked.
 * Rows of a profile carry their own position.
 * @param sheet with one entry of `files` for each name
 */
export function positionQuestions(
  sheet: CaseSheet,
  names: readonly string[],
  previews: Previews,
): Question[] {
  if (sheet.layout === "profile") return [];
  return names.flatMap((file, i) => {
    const preview = previews.get(file);
    if (preview === undefined || "code" in preview) return [];
    const questions: Question[] = [];
    if (sheet.files[i].x === null && preview.position.source === null && !sheet.columns?.x) {
      questions.push({ key: "files.x", file });
    }
    // a snapshot has a time and no step
    if (sheet.layout === "lines") return questions;
    const timed = preview.columns.some(({ role }) => role === "t") || sheet.columns?.t !== undefined;
    if (!timed && preview.step === null && sheet.read.step === null)
      questions.push({ key: "read.step", file });
    return questions;
  });
}
