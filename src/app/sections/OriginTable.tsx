import { Fragment } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { AlignedOrigins, Comparison } from "../../core/comparison.ts";
import type { Quantity } from "../../core/quantity.ts";
import { formatDigits, formatProbability } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { ComparedNumber } from "./ComparedNumber.tsx";
import { Definition } from "./Definition.tsx";
import { QuantityCells } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

const ways = [
  { key: "own", name: "own exponent" },
  { key: "common", name: "one exponent" },
] as const;

/** Exponents and origins of every case by both ways of fitting, and how far each lies from the one held against. */
export function OriginTable({
  cases,
  comparisons,
}: {
  cases: readonly CaseView[];
  comparisons: readonly Comparison[];
}) {
  const known = comparisons.filter(({ origins }) => origins.own !== null);
  if (known.length === 0) return <p>No two cases have a law.</p>;
  const base = cases.find(({ name }) => name === known[0].cases[0]);
  return (
    <TableScroll label="Origins and exponents">
      <table className="data dense">
        <thead>
          <tr>
            <th scope="col" className="text">
              Case
            </th>
            <th scope="col" className="text">
              Fitted with
            </th>
            {(["n", "x0", "extra_distance", "matched_distance"] as const).map((key) => (
              <th scope="colgroup" colSpan={2} key={key}>
                <Definition of={key}>
                  <SymbolText runs={labelOf(key).symbol} />
                  {key === "matched_distance" && (
                    <>
                      {" "}
                      at equal <i>Tu</i>
                    </>
                  )}
                </Definition>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {base && <OriginRows view={base} origins={known[0].origins} side={0} comparison={known[0]} />}
          {known.map((comparison) => {
            const view = cases.find(({ name }) => name === comparison.cases[1]);
            return (
              view && (
                <OriginRows
                  key={view.id}
                  view={view}
                  origins={comparison.origins}
                  side={1}
                  comparison={comparison}
                />
              )
            );
          })}
        </tbody>
      </table>
    </TableScroll>
  );
}

function OriginRows({
  view,
  origins,
  side,
  comparison,
}: {
  view: CaseView;
  origins: Comparison["origins"];
  side: 0 | 1;
  comparison: Comparison;
}) {
  return ways.map(({ key, name }) => {
    const found = origins[key];
    if (found === null) return null;
    const used = comparison.aligned_with === (key === "own" ? "own n" : "common n");
    return (
      <tr key={key}>
        <th scope="row" className="text">
          {key === "own" && (
            <>
              <CaseMark mark={view.mark} /> {view.name}
            </>
          )}
          {key !== "own" && <span className="visually-hidden">{view.name}</span>}
        </th>
        <td className="text">
          {name}
          {used && ", used"}
        </td>
        <OriginCells view={view} found={found} side={side} />
        {side === 1 && key === "own" ? (
          <Length view={view} quantity={comparison.matched_distance} label="matched_distance" />
        ) : (
          <td colSpan={2} />
        )}
      </tr>
    );
  });
}

function OriginCells({ view, found, side }: { view: CaseView; found: AlignedOrigins; side: 0 | 1 }) {
  return (
    <>
      <QuantityCells quantity={found.n[side]} label="n" units={view.units} />
      <Length view={view} quantity={found.x0[side]} label={view.along === "t" ? "t0" : "x0"} />
      {side === 1 ? (
        <Length view={view} quantity={found.extra_distance} label="extra_distance" />
      ) : (
        <td colSpan={2} />
      )}
    </>
  );
}

/** In multiples of the reference length, where there is one. */
function Length({ view, quantity, label }: { view: CaseView; quantity: Quantity; label: string }) {
  const per = view.length === null ? {} : { per: { length: view.length, symbol: view.symbol } };
  return <QuantityCells quantity={quantity} label={label} units={view.units} {...per} />;
}

/** What decides between one exponent and one each: test, probability, and Akaike's criterion of both. */
export function ExponentTests({
  cases,
  comparisons,
}: {
  cases: readonly CaseView[];
  comparisons: readonly Comparison[];
}) {
  const ofAll = comparisons[0]?.common_n_of_all;
  const tests = [
    ...(ofAll
      ? [{ name: "all cases", comparison: comparisons[0], found: { ...ofAll, value: ofAll.n } }]
      : []),
    ...comparisons.map((comparison) => ({
      name: comparison.cases.join(", "),
      comparison,
      found: comparison.common_n,
    })),
  ];
  return (
    <dl className="choice-list">
      {tests.map(({ name, comparison, found }) => {
        const number = (of: string, value: number, text: string) => (
          <ComparedNumber of={of} value={value} text={text} cases={cases} comparison={comparison} />
        );
        return (
          <Fragment key={name}>
            <dt>one exponent for {name}</dt>
            <dd>
              {found.value === null || found.p === null ? (
                "why" in found ? (
                  (found.why ?? "–")
                ) : (
                  "–"
                )
              ) : (
                <>
                  {number("common_n", found.value, formatDigits(found.value, 3))},{" "}
                  {found.p < 0.05 ? "excluded" : "not excluded"} by {found.test === "F" ? "F" : "chi-square"},
                  p {number("p", found.p, formatProbability(found.p))}
                  {found.AICc && (
                    <>
                      ; AIC<sub>c</sub>{" "}
                      {number("AICc", found.AICc.common, formatDigits(found.AICc.common, 4))} against{" "}
                      {number("AICc", found.AICc.own, formatDigits(found.AICc.own, 4))} with one each
                    </>
                  )}
                </>
              )}
            </dd>
          </Fragment>
        );
      })}
    </dl>
  );
}
