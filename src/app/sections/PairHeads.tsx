import type { ReactNode } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { withReference } from "../../core/symbolRuns.ts";
import { unitOf } from "../../core/unitText.ts";
import type { CaseView } from "../session/caseView.ts";
import { Definition } from "./Definition.tsx";
import { SymbolText } from "./SymbolText.tsx";

/** The heads of n and x0, each over its value and interval. */
export function PairHeads({ view, first, last }: { view: CaseView; first: ReactNode; last?: ReactNode }) {
  const key = view.along === "t" ? "t0" : "x0";
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  return (
    <thead>
      <tr>
        <th scope="col" className="text">
          {first}
        </th>
        <th scope="colgroup" colSpan={2}>
          <Definition of="n">
            <SymbolText runs={labelOf("n").symbol} />
          </Definition>
        </th>
        <th scope="colgroup" colSpan={2}>
          <Definition of={key}>
            <SymbolText runs={labelOf(key).symbol} />
            {view.length === null ? unit !== "" && ` (${unit})` : " in multiples of "}
            {view.length !== null && <SymbolText runs={withReference([{ text: "ℓ" }], view.symbol)} />}
          </Definition>
        </th>
        {last !== undefined && (
          <th scope="col" className="text">
            {last}
          </th>
        )}
      </tr>
    </thead>
  );
}
