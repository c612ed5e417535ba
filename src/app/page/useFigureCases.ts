import { type RefObject, useContext, useMemo } from "react";
import type { CaseView } from "../session/caseView.ts";
import { RestedCases } from "./restedCases.ts";
import { createStillCases } from "./stillCases.ts";
import { useInView } from "./useInView.ts";
import { useThrottled } from "./useThrottled.ts";

/** Between two redraws of the figure in view while a bracket is dragged, ms. */
const pause = 40;

/**
 * The cases a section's figures are drawn from: those in the hand while the section is in view, a few times
 * a second; those at rest while it is not. A body that is moved leaves them as they are.
 */
export function useFigureCases(
  section: RefObject<Element | null>,
  live: readonly CaseView[],
): readonly CaseView[] {
  const rested = useContext(RestedCases);
  const inView = useInView(section);
  const still = useMemo(createStillCases, []);
  return useThrottled(still(inView ? live : rested), pause);
}
