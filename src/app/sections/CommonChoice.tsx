import type { ReactNode } from "react";
import type { CaseSheet } from "../../sheet/caseSheet.ts";
import { ChoiceField } from "./ChoiceField.tsx";

/** A choice of several cases at once; where they differ it says so until one answer is chosen for all. */
export function CommonChoice<T extends string>({
  label,
  choices,
  of,
  sheets,
  onChange,
}: {
  label: ReactNode;
  choices: Readonly<Record<T, string>>;
  of: (sheet: CaseSheet) => T;
  sheets: readonly CaseSheet[];
  onChange: (value: T) => void;
}) {
  const [first, ...others] = sheets.map(of);
  const value = others.every((other) => other === first) ? first : null;
  return <ChoiceField label={label} value={value} choices={choices} onChange={onChange} />;
}
