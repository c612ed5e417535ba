import type { ReactNode } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import type { FlagCode } from "../../core/flag.ts";
import { bare, missing, type Quantity } from "../../core/quantity.ts";
import { withReference } from "../../core/symbolRuns.ts";
import { sensitivityOf } from "../../export/sentences/sensitivitySentence.ts";
import type { FigureTable } from "../../figures/figureSpec.ts";
import { endsOf } from "../../figures/stationPoints.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseHeads } from "./CaseHeads.tsx";
import { Definition } from "./Definition.tsx";
import { originManner } from "./fitNumber.ts";
import { Pennant } from "./Pennant.tsx";
import { type Manner, QuantityCells } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableSave } from "./TableSave.tsx";
import { TableScroll } from "./TableScroll.tsx";

interface Line {
  readonly name: string;
  /** Key of the label: its symbol and its definition. */
  readonly label: string;
  readonly of: (decay: DecayResult) => Quantity;
  /** Doubts that are about this number. */
  readonly flags?: readonly FlagCode[];
}

const onExponent: readonly FlagCode[] = [
  ...(["short-span", "few-stations", "held-origin", "half-open", "chi-square-fails"] as const),
  ...(["window-without-plateau", "equal-weights"] as const),
];
const onOrigin = onExponent.filter((code) => code !== "held-origin");
const whole = "a statistic of this fit: it has no interval";
const alike = "all stations weigh alike: the scatter is what tells the errors";
const statistic = (value: number | null, why: string) => (value === null ? missing(why) : bare(value, whole));

const lines: readonly Line[] = [
  { name: "exponent", label: "n", of: ({ n }) => n, flags: onExponent },
  { name: "virtual origin", label: "x0", of: ({ x0 }) => x0, flags: onOrigin },
  { name: "coefficient", label: "A", of: ({ A }) => A },
  { name: "given this window", label: "n", of: ({ given_window }) => given_window.n },
  { name: "given this window", label: "x0", of: ({ given_window }) => given_window.x0 },
  { name: "sensitivity", label: "dn/dx0", of: sensitivityOf },
  {
    name: "correlation",
    label: "correlation_n_x0",
    of: ({ correlation_n_x0 }) => statistic(correlation_n_x0, "one of the two is held, or there is no law"),
  },
  {
    name: "reduced χ²",
    label: "chi2_reduced",
    of: ({ chi2_reduced, weights }) =>
      statistic(chi2_reduced, weights === "equal" ? alike : "no station is left over, or there is no law"),
  },
  {
    name: "probability of a larger χ²",
    label: "p",
    of: ({ p }) => statistic(p, alike),
  },
];

/** The fit of every case: exponent, origin and coefficient, how they are tied, and how well the law fits. */
export function FitTable({ cases }: { cases: readonly CaseView[] }) {
  const fitted = cases.flatMap((view) => (view.decay ? [{ view, decay: view.decay }] : []));
  return (
    <>
      <TableScroll label="Fits">
        <table className="data dense">
          <CaseHeads cases={fitted.map(({ view }) => view)} first="Fit" />
          <tbody>
            {lines.map(({ name, label, of, flags = [] }) => (
              <tr key={name + label}>
                <th scope="row" className="text">
                  {name}{" "}
                  <Definition of={keyOf(label, cases)}>
                    <SymbolText runs={labelOf(keyOf(label, cases)).symbol} />
                  </Definition>
                </th>
                {fitted.map(({ view, decay }) => (
                  <QuantityCells
                    key={view.id}
                    quantity={of(decay)}
                    {...mannerOf(label, view)}
                    beside={<Doubts decay={decay} codes={flags} />}
                  />
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </TableScroll>
      <PerLength cases={fitted.map(({ view }) => view)} />
      <TableSave name="fits" table={() => fitsTable(cases)} />
    </>
  );
}

/** The origin of a decay in time is one. */
const keyOf = (label: string, cases: readonly CaseView[]) =>
  label === "x0" && cases[0]?.along === "t" ? "t0" : label;

function mannerOf(label: string, view: CaseView): Manner {
  return label === "x0" ? originManner(view) : { label, units: view.units };
}

/** What the sensitivity is counted in. */
function PerLength({ cases }: { cases: readonly CaseView[] }) {
  const [view] = cases;
  if (view === undefined) return null;
  const step: ReactNode =
    view.length === null ? (
      "unit of the axis"
    ) : (
      <SymbolText runs={withReference([{ text: "ℓ" }], view.symbol)} />
    );
  return (
    <p className="small-print">
      The sensitivity is the change of <i className="sym">n</i> for each {step} that the origin lies farther
      downstream.
    </p>
  );
}

function Doubts({ decay, codes }: { decay: DecayResult; codes: readonly FlagCode[] }) {
  const text = decay.flags
    .filter(({ code }) => codes.includes(code))
    .map((flag) => flag.text)
    .join(" ");
  if (text === "") return null;
  return (
    <span className="cell-flag" title={text}>
      <Pennant />
      <span className="spoken">{text}</span>
    </span>
  );
}

function fitsTable(cases: readonly CaseView[]): FigureTable {
  return {
    heading: ["case", "number", "of", "value", "low", "high"],
    rows: cases.flatMap(({ name: of, decay }) =>
      decay === null
        ? []
        : lines.map(({ name, label, of: numberOf }) => {
            const { value, low, high } = endsOf(numberOf(decay));
            return [of, name, label, value, low, high];
          }),
    ),
  };
}
