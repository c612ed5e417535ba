import { labelOf, type Run } from "../../core/catalogue.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import type { Quantity } from "../../core/quantity.ts";
import { exponentText } from "../../export/sentences/decaySentences.ts";
import { formatDigits, formatProbability } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { QuantityCells } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

interface Line {
  readonly name: string;
  /** Key of the label: its symbol and its definition. */
  readonly label: string;
  readonly of: (decay: DecayResult) => Quantity;
  /** Given in multiples of the reference length, where there is one. */
  readonly inLengths?: true;
}

const lines: readonly Line[] = [
  { name: "exponent", label: "n", of: (decay) => decay.n },
  { name: "virtual origin", label: "x0", of: (decay) => decay.x0, inLengths: true },
  { name: "coefficient", label: "A", of: (decay) => decay.A },
  { name: "given this window", label: "n", of: (decay) => decay.given_window.n },
  { name: "given this window", label: "x0", of: (decay) => decay.given_window.x0, inLengths: true },
  { name: "line of the Taylor scale", label: "n", of: (decay) => decay.lambda_route.n },
  { name: "line of the Taylor scale", label: "x0", of: (decay) => decay.lambda_route.x0, inLengths: true },
  { name: "law of the dissipation", label: "n", of: (decay) => decay.epsilon_route.n },
  { name: "growth of the integral scale", label: "m", of: (decay) => decay.growth.m },
];

/** The fit of every case: exponent, origin and coefficient, then the same by other routes. */
export function FitTable({ cases }: { cases: readonly CaseView[] }) {
  const fitted = cases.flatMap((view) => (view.decay ? [{ view, decay: view.decay }] : []));
  return (
    <TableScroll label="Fits">
      <table className="data dense">
        <CaseHeads cases={fitted.map(({ view }) => view)} first="Fit" />
        <tbody>
          {lines.map(({ name, label, of, inLengths }) => (
            <tr key={name + label}>
              <th scope="row" className="text">
                {name}{" "}
                <Definition of={label}>
                  <SymbolText runs={labelOf(label).symbol} />
                </Definition>
              </th>
              {fitted.map(({ view, decay }) => (
                <QuantityCells
                  key={view.id}
                  quantity={of(decay)}
                  label={label}
                  units={view.of.sheet.units}
                  {...(inLengths && view.length !== null
                    ? { per: { length: view.length, symbol: view.symbol } }
                    : {})}
                />
              ))}
            </tr>
          ))}
          <PlainLine
            name="correlation of"
            symbol={[{ text: "n, x" }, { text: "0", place: "sub", upright: true }]}
            texts={fitted.map(({ decay }) => numberText(decay.correlation_n_x0, 2))}
          />
          <PlainLine
            name="reduced"
            symbol={[{ text: "χ" }, { text: "2", place: "sup", upright: true }]}
            texts={fitted.map(({ decay }) => numberText(decay.chi2_reduced, 2))}
          />
        </tbody>
      </table>
    </TableScroll>
  );
}

/** Exponents of the classical hypotheses, each with the probability of data so far from it. */
export function HypothesisTable({ cases }: { cases: readonly CaseView[] }) {
  const fitted = cases.flatMap((view) => (view.decay ? [{ view, decay: view.decay }] : []));
  const names = fitted[0]?.decay.hypotheses ?? [];
  return (
    <TableScroll label="Hypotheses">
      <table className="data dense">
        <CaseHeads cases={fitted.map(({ view }) => view)} first="Exponent held at" />
        <tbody>
          {names.map(({ name, n }) => (
            <tr key={name}>
              <th scope="row" className="text">
                {exponentText(n)} {name}
              </th>
              {fitted.map(({ view, decay }) => (
                <HypothesisCells
                  key={view.id}
                  p={decay.hypotheses.find((each) => each.name === name)?.p ?? null}
                />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

/** Below this probability the data exclude an exponent; above it nothing is confirmed. */
const level = 0.05;

function HypothesisCells({ p }: { p: number | null }) {
  return (
    <>
      <td>{p === null ? "–" : formatProbability(p)}</td>
      <td className="pm">{p === null ? "" : p < level ? "excluded" : "not excluded"}</td>
    </>
  );
}

function CaseHeads({ cases, first }: { cases: readonly CaseView[]; first: string }) {
  return (
    <thead>
      <tr>
        <th scope="col">{first}</th>
        {cases.map((view) => (
          <th scope="colgroup" colSpan={2} key={view.id}>
            <CaseMark mark={view.mark} /> {view.name}
          </th>
        ))}
      </tr>
    </thead>
  );
}

function PlainLine({
  name,
  symbol,
  texts,
}: {
  name: string;
  symbol?: readonly Run[];
  texts: readonly string[];
}) {
  return (
    <tr>
      <th scope="row" className="text">
        {name} {symbol && <SymbolText runs={symbol} />}
      </th>
      {texts.map((text, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: one cell a case, in the order of the cases
        <PlainCells text={text} key={i} />
      ))}
    </tr>
  );
}

function PlainCells({ text }: { text: string }) {
  return (
    <>
      <td>{text}</td>
      <td className="pm" />
    </>
  );
}

const numberText = (value: number | null, digits: number) =>
  value === null ? "–" : formatDigits(value, digits);
