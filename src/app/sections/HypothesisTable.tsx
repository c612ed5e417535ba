import type { Hypothesis } from "../../core/decayResult.ts";
import { bare } from "../../core/quantity.ts";
import { exponentText } from "../../export/sentences/decaySentences.ts";
import type { FigureTable } from "../../figures/figureSpec.ts";
import { formatProbability } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseHeads } from "./CaseHeads.tsx";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { TableSave } from "./TableSave.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Exponents of the classical hypotheses, each with the probability of data so far from it. */
export function HypothesisTable({ cases }: { cases: readonly CaseView[] }) {
  const fitted = cases.filter(({ decay }) => decay !== null);
  const names = fitted[0]?.decay?.hypotheses ?? [];
  return (
    <>
      <TableScroll label="Hypotheses">
        <table className="data dense" {...cellKeys}>
          <CaseHeads cases={fitted} first={<Definition of="p">Exponent held at</Definition>} />
          <tbody>
            {names.map(({ name, n }) => (
              <tr key={name}>
                <th scope="row" className="text">
                  {exponentText(n)} {name}
                </th>
                {fitted.map((view) => (
                  <HypothesisCells
                    key={view.id}
                    view={view}
                    hypothesis={view.decay?.hypotheses.find((each) => each.name === name)}
                  />
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </TableScroll>
      <TableSave name="hypotheses" table={() => hypothesesTable(fitted)} />
    </>
  );
}

/** Below this probability the data exclude an exponent; above it nothing is confirmed. */
const level = 0.05;
const tests = { "chi-square": "χ²", F: "F" } as const;

function HypothesisCells({ view, hypothesis }: { view: CaseView; hypothesis: Hypothesis | undefined }) {
  const { p = null, test = null, name = "", n = 0 } = hypothesis ?? {};
  if (p === null)
    return (
      <td className="why" colSpan={2}>
        not tested: there is no law, or n is held
      </td>
    );
  const verdict = p < level ? "excluded by these data in this window" : "not excluded";
  return (
    <>
      <td title={String(p)}>
        <NumberButton
          cell
          of="p"
          quantity={bare(p, "a probability of these data: it has no interval")}
          at={{
            kind: "page",
            view,
            shown: formatProbability(p),
            rows: [
              ["hypothesis", `n = ${exponentText(n)}, ${name}`],
              [
                "test",
                `likelihood ratio of n held there against n free${test === null ? "" : `, by ${tests[test]}`}`,
              ],
              ...(view.decay?.windowChosen === "auto"
                ? [["window", "the largest p over the windows united"] as const]
                : []),
              ["interval", "none: a probability of these data"],
            ],
          }}
        >
          {formatProbability(p)}
        </NumberButton>
      </td>
      <td className="pm wrap">
        {verdict}
        {test !== null && ` (${tests[test]})`}
      </td>
    </>
  );
}

function hypothesesTable(cases: readonly CaseView[]): FigureTable {
  return {
    heading: ["case", "hypothesis", "n", "p", "test"],
    rows: cases.flatMap((view) =>
      (view.decay?.hypotheses ?? []).map(({ name, n, p, test = null }) => [view.name, name, n, p, test]),
    ),
  };
}
