import { createContext } from "react";
import type { CaseView } from "../session/caseView.ts";

/** The cases as they are without what is in the hand: what figures out of view are drawn from. */
export const RestedCases = createContext<readonly CaseView[]>([]);
