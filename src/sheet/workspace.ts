import type { CaseSheet, SheetBody, SheetFile } from "./caseSheet.ts";
import type { ReductionChange } from "./changeReduction.ts";

/** All that a user decides, one immutable value. Results are not in it: they follow from it and the files. */
export interface Workspace {
  readonly schema: 1;
  readonly title: string;
  readonly cases: readonly WorkspaceCase[];
  /** What the ruler and the figures against x are drawn on. */
  readonly axis: Axis;
  /** Stations picked for the spectra, in the order of picking. */
  readonly picked: readonly PickedStation[];
}
export type Axis = "x" | "x/ell" | "(x-x0)/ell";

export interface WorkspaceCase {
  /** Kept for the case's life; its sheet's name may change. */
  readonly id: string;
  /** Index of its colour, marker and dash: kept for the case's life. */
  readonly mark: number;
  readonly sheet: CaseSheet;
  /** Questions that the page must ask before the case can be reduced or told apart. */
  readonly fromSheet: boolean;
  /** Names and fingerprints of the files behind it, one for each entry of sheet.files. */
  readonly sources: readonly WorkspaceSource[];
}
export interface WorkspaceSource {
  readonly name: string;
  readonly bytes: number;
  readonly fingerprint: string;
}
export interface AddedFiles {
  readonly caseId: string;
  readonly files: readonly SheetFile[];
  readonly sources: readonly WorkspaceSource[];
}
export interface PickedStation {
  readonly caseId: string;
  readonly x: number;
}
/** What of a body differs from now on, in one case or (null) in all of them; no body takes it away. */
export interface BodyEdit {
  readonly caseId: string | null;
  readonly body: Partial<SheetBody> | null;
}

/** Everything that can be done to a workspace. */
export type WorkspaceChange =
  | { readonly kind: "add-cases"; readonly cases: readonly Omit<WorkspaceCase, "mark">[] }
  /** Further files of a case, an entry of its sheet for each source. */
  | ({ readonly kind: "add-files" } & AddedFiles)
  | { readonly kind: "remove-case"; readonly caseId: string }
  | { readonly kind: "edit-sheet"; readonly caseId: string; readonly edit: Partial<CaseSheet> }
  | { readonly kind: "edit-every-sheet"; readonly edit: Partial<CaseSheet> }
  | {
      readonly kind: "set-window";
      readonly caseId: string;
      readonly window: "auto" | readonly [number, number];
    }
  | { readonly kind: "hold-origin"; readonly caseId: string; readonly x0: number | null }
  | { readonly kind: "hold-exponent"; readonly caseId: string; readonly n: number | null }
  | ({ readonly kind: "set-body" } & BodyEdit)
  /** The marker of all bodies was moved. */
  | { readonly kind: "move-body"; readonly from: number; readonly to: number }
  | ({ readonly kind: "set-reduction" } & ReductionChange)
  | { readonly kind: "place-file"; readonly caseId: string; readonly name: string; readonly x: number | null }
  | { readonly kind: "set-axis"; readonly axis: Axis }
  | { readonly kind: "pick"; readonly station: PickedStation }
  | { readonly kind: "unpick"; readonly station: PickedStation }
  | { readonly kind: "set-title"; readonly title: string }
  | { readonly kind: "clear" };
