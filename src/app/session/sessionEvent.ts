import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { Argued, Held, Plan, Reduced, Work } from "./session.ts";

/** Everything that can happen to a session. */
export type SessionEvent =
  /** Files were dropped or chosen. */
  | { readonly kind: "offered"; readonly files: number; readonly bytes: number }
  | { readonly kind: "looked"; readonly looked: number }
  | { readonly kind: "planned"; readonly plan: Plan }
  /** A case is on its way to its stations. */
  | { readonly kind: "started"; readonly caseId: string; readonly work: Work }
  | {
      readonly kind: "progressed";
      readonly caseId: string;
      readonly filesDone: number;
      readonly done?: readonly string[];
      readonly bytesDone: number;
    }
  | { readonly kind: "reduced"; readonly caseId: string; readonly reduced: Reduced }
  /** The work on a case came to an end without a result. */
  | { readonly kind: "stopped"; readonly caseId: string }
  | { readonly kind: "changed"; readonly change: WorkspaceChange }
  | { readonly kind: "undone" }
  | { readonly kind: "redone" }
  | { readonly kind: "argued"; readonly argued: Argued }
  /** The page as it was left comes back, or a workspace file was opened. */
  | { readonly kind: "restored"; readonly held: Held };
