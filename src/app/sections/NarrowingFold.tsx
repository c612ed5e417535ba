import { useEffect } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { Narrowing } from "../../core/decayArgument.ts";
import { bare } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { gainText, narrowingSentences } from "../../export/sentences/narrowingSentences.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { DrawnFold } from "./DrawnFold.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { SaidSentences } from "./SaidSentences.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

const kinds = { station: "one more station", record: "a record twice as long" } as const;

/** What one more measurement would do to the intervals of n and x0; while it is open the ruler marks the places. */
export function NarrowingFold({
  cases,
  onMarks,
}: {
  cases: readonly CaseView[];
  onMarks: (shown: boolean) => void;
}) {
  const planned = cases.filter((view) => plansOf(view).length > 0);
  if (planned.length === 0) return null;
  return (
    <DrawnFold name="What would narrow the intervals" fact="one more station, or a longer record">
      {() => <Plans cases={planned} onMarks={onMarks} />}
    </DrawnFold>
  );
}

function Plans({ cases, onMarks }: { cases: readonly CaseView[]; onMarks: (shown: boolean) => void }) {
  useEffect(() => {
    onMarks(true);
    return () => onMarks(false);
  }, [onMarks]);
  const { along, units } = cases[0];
  const unit = unitOf(along === "t" ? "T" : "L", units);
  return (
    <>
      <SaidSentences sentences={narrowingSentences(cases)} />
      <TableScroll label="What would narrow the intervals">
        <table className="data dense">
          <thead>
            <tr>
              <th scope="col" className="text">
                Measurement
              </th>
              <th scope="col">
                <i className="sym">{along ?? "x"}</i>
                {unit !== "" && ` (${unit})`}
              </th>
              {(["n", "x0"] as const).map((key) => (
                <th scope="col" key={key}>
                  <Definition of="narrowing">
                    interval of{" "}
                    <SymbolText runs={labelOf(key === "x0" && along === "t" ? "t0" : key).symbol} /> narrower
                    by
                  </Definition>
                </th>
              ))}
            </tr>
          </thead>
          {cases.map((view) => (
            <tbody key={view.id}>
              <tr>
                <th scope="rowgroup" colSpan={4}>
                  <CaseMark mark={view.mark} /> {view.name}
                </th>
              </tr>
              {shownPlans(plansOf(view)).map((plan) => (
                <PlanRow view={view} plan={plan} key={`${plan.kind} ${plan.x}`} />
              ))}
            </tbody>
          ))}
        </table>
      </TableScroll>
      <p className="small-print">
        With the law as found; a new station measured as well as its neighbours. On the ruler: + one more
        station, ▽ the record to be doubled.
      </p>
    </>
  );
}

function plansOf(view: CaseView): readonly Narrowing[] {
  return arguedOf(view)?.argument.narrowing ?? [];
}

/** Of each kind: the best for n and x0 together, for n, and for x0; once where they are the same. */
function shownPlans(plans: readonly Narrowing[]): readonly Narrowing[] {
  const best = (["station", "record"] as const).flatMap((kind) => {
    const those = plans.filter((plan) => plan.kind === kind);
    return [
      (plan: Narrowing) => plan.n * plan.x0,
      (plan: Narrowing) => plan.n,
      (plan: Narrowing) => plan.x0,
    ].flatMap((width) => [...those].sort((a, b) => width(a) - width(b)).slice(0, 1));
  });
  return [...new Set(best)];
}

function PlanRow({ view, plan }: { view: CaseView; plan: Narrowing }) {
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  const place = formatPosition(plan.x);
  const gain = (key: "n" | "x0") => (
    <td>
      <NumberButton
        of="narrowing"
        quantity={bare(plan[key], "it follows from the law as found")}
        at={{
          kind: "page",
          view,
          shown: formatDigits(plan[key], 3),
          rows: [
            ["measurement", `${kinds[plan.kind]} at ${withUnit(place, unit)}`],
            ["interval", `none: the law is taken as found`],
          ],
        }}
      >
        {gainText(plan[key])}
      </NumberButton>
    </td>
  );
  return (
    <tr>
      <th scope="row" className="text">
        {kinds[plan.kind]}
      </th>
      <td>{place}</td>
      {gain("n")}
      {gain("x0")}
    </tr>
  );
}
