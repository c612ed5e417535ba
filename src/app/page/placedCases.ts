import { createContext } from "react";
import type { CaseView } from "../session/caseView.ts";

/** The cases at rest with the body where it stands now: what the body's own numbers are drawn from. */
export const PlacedCases = createContext<readonly CaseView[]>([]);
