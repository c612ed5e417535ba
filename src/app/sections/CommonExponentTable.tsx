import type { Comparison } from "../../core/comparison.ts";
import { bare, estimate, type Quantity } from "../../core/quantity.ts";
import type { FigureTable } from "../../figures/figureSpec.ts";
import { formatNumber, formatProbability } from "../../figures/formatNumber.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import { endsOf } from "../../figures/stationPoints.ts";
import type { CaseView } from "../session/caseView.ts";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { formatted, QuantityCells } from "./QuantityText.tsx";
import { TableSave } from "./TableSave.tsx";
import { TableScroll } from "./TableScroll.tsx";

interface Shared {
  readonly cases: readonly string[];
  readonly n: Quantity;
  readonly p: number;
  readonly test: "chi-square" | "F" | null;
  readonly AICc: { readonly common: number; readonly own: number } | null;
}

/** One exponent for several cases against one each: of every pair compared, and of all cases at once. */
export function CommonExponentTable({
  cases,
  comparisons,
}: {
  cases: readonly CaseView[];
  comparisons: readonly Comparison[];
}) {
  const rows = sharedOf(comparisons);
  if (rows.length === 0) return null;
  return (
    <>
      <TableScroll label="One exponent or one each">
        <table className="data dense" {...cellKeys}>
          <thead>
            <tr>
              <th scope="col" className="text">
                Cases
              </th>
              <th scope="colgroup" colSpan={2}>
                <Definition of="common_n">one n</Definition>
              </th>
              <th scope="colgroup" colSpan={2}>
                <Definition of="p">p, test</Definition>
              </th>
              <th scope="col">
                <Definition of="AICc">AICc, one n</Definition>
              </th>
              <th scope="col">AICc, one each</th>
              <th scope="col">preferred</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <SharedRow row={row} cases={cases} key={row.cases.join(" ")} />
            ))}
          </tbody>
        </table>
      </TableScroll>
      <TableSave name="common-exponent" table={() => sharedTable(rows)} />
    </>
  );
}

function SharedRow({ row, cases }: { row: Shared; cases: readonly CaseView[] }) {
  const { n, p, test, AICc } = row;
  const view = cases.find(({ name }) => name === row.cases[0]) ?? cases[0];
  const manner = { label: "common_n", units: view.units };
  const by = test === null ? "" : `, ${test === "F" ? "F" : "χ²"}`;
  const rows = [["cases", row.cases.join(", ")] as const];
  return (
    <tr>
      <th scope="row" className="text">
        {row.cases.join(", ")}
      </th>
      <QuantityCells
        cell
        quantity={n}
        at={{ kind: "page", view, shown: quantityText(formatted(n, manner)), rows }}
        {...manner}
      />
      <td title={String(p)}>
        <NumberButton
          cell
          of="p"
          quantity={bare(p, "a probability of these data: it has no interval")}
          at={{
            kind: "page",
            view,
            shown: formatProbability(p),
            rows: [...rows, ["test", `one n against one each${by}`]],
          }}
        >
          {formatProbability(p)}
        </NumberButton>
      </td>
      <td className="pm wrap">
        {p < 0.05 ? "one n excluded by these data in these windows" : "one n not excluded"}
        {by === "" ? "" : ` (${by.slice(2)})`}
      </td>
      <td>{AICc === null ? "–" : formatNumber(AICc.common, 1)}</td>
      <td>{AICc === null ? "–" : formatNumber(AICc.own, 1)}</td>
      <td>{AICc === null ? "too few stations" : AICc.common <= AICc.own ? "one n" : "one each"}</td>
    </tr>
  );
}

function sharedOf(comparisons: readonly Comparison[]): Shared[] {
  const number = (value: number, low: number | null, high: number | null) =>
    estimate(value, low ?? Number.NaN, high ?? Number.NaN);
  const pairs = comparisons.flatMap(
    ({ cases, common_n: { value, low, high, p, test = null, AICc = null } }) =>
      value === null || p === null ? [] : [{ cases, n: number(value, low, high), p, test, AICc }],
  );
  const all = comparisons.flatMap(({ common_n_of_all }) => common_n_of_all ?? []).slice(0, 1);
  return [...pairs, ...all.map(({ n, low, high, ...rest }) => ({ ...rest, n: number(n, low, high) }))];
}

function sharedTable(rows: readonly Shared[]): FigureTable {
  return {
    heading: ["cases", "n", "n_low", "n_high", "p", "test", "AICc_one", "AICc_each"],
    rows: rows.map(({ cases, n, p, test, AICc }) => {
      const { value, low, high } = endsOf(n);
      return [cases.join(" "), value, low, high, p, test, AICc?.common ?? null, AICc?.own ?? null];
    }),
  };
}
