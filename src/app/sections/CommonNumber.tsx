import type { ReactNode } from "react";
import type { CaseSheet } from "../../sheet/caseSheet.ts";
import { NumberField } from "./NumberField.tsx";

/** A number of several cases at once; where they differ the field is empty and says so. */
export function CommonNumber({
  label,
  unit,
  above,
  least,
  of,
  sheets,
  onChange,
}: {
  label: ReactNode;
  unit: string;
  above?: number;
  least?: number;
  of: (sheet: CaseSheet) => number | null;
  sheets: readonly CaseSheet[];
  onChange: (value: number | null) => void;
}) {
  const [first, ...others] = sheets.map(of);
  const agree = others.every((other) => other === first);
  return (
    <NumberField
      label={label}
      unit={unit}
      {...(above === undefined ? {} : { above })}
      {...(least === undefined ? {} : { least })}
      value={agree ? first : null}
      placeholder={agree ? "not given" : "they differ"}
      onChange={onChange}
    />
  );
}
