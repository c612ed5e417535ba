import type { Comparison } from "../../core/comparison.ts";
import { bare } from "../../core/quantity.ts";
import type { CaseView } from "../session/caseView.ts";
import { NumberButton } from "./NumberButton.tsx";

/** A plain number of a comparison, opening what it means and what it rests on. */
export function ComparedNumber({
  of,
  value,
  text,
  cases,
  comparison,
}: {
  of: string;
  value: number;
  text: string;
  cases: readonly CaseView[];
  comparison: Comparison;
}) {
  const views = comparison.cases.flatMap((name) => cases.find((view) => view.name === name) ?? []);
  return (
    <NumberButton
      of={of}
      quantity={bare(value, "a number of the test, not an estimate")}
      title={String(value)}
      at={{ kind: "comparison", comparison, views }}
    >
      {text}
    </NumberButton>
  );
}
