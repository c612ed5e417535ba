import type { PlainFailure } from "../core/failure.ts";
import type { CaseSheet } from "./caseSheet.ts";

/** What a drop of files amounts to, before anything is reduced. */
export interface DropPlan {
  readonly cases: readonly PlannedCase[];
  readonly leftOut: readonly LeftOut[];
  /** Sheets that cannot be used, and files that a sheet names and that are not there. */
  readonly failures: readonly PlainFailure[];
  /** What was understood only in part: unknown keys, names that had to be changed. */
  readonly warnings: readonly string[];
}

export interface PlannedCase {
  /** One entry of `files` for each file, in the order of `names`; paths relative to the sheet or the case's folder. */
  readonly sheet: CaseSheet;
  /** Path of the sheet in the drop; null where the case was made from what was recognised. */
  readonly sheetName: string | null;
  readonly fromSheet: boolean;
  /** Paths in the drop, one for each entry of sheet.files. */
  readonly names: readonly string[];
  readonly questions: readonly Question[];
}

/** Something that must be asked; `key` as in a case sheet. The first four have an answer already or can do without. */
export interface Question {
  readonly key:
    | "case"
    | "kinematicViscosity"
    | "reference.length"
    | "reference.speed"
    | "files.x"
    | "read.step"
    | "columns";
  /** Path in the drop, where it is asked of one file. */
  readonly file?: string;
}

/** A file of the drop that is not used, and why: one sentence. */
export interface LeftOut {
  readonly name: string;
  readonly reason: string;
}
