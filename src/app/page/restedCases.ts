import { createContext } from "react";
import type { CaseView } from "../session/caseView.ts";

/**
 * The cases as they are without what is in the hand: what figures out of view, and folds, are drawn from. They stay the
 * same while a body is moved; see stillCases.
 */
export const RestedCases = createContext<readonly CaseView[]>([]);
