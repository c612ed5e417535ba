import { Fragment } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { Criterion, Development } from "../../core/decayArgument.ts";
import type { Quantity } from "../../core/quantity.ts";
import { withReference } from "../../core/symbolRuns.ts";
import { unitOf } from "../../core/unitText.ts";
import {
  criterionWords,
  developmentKey,
  placeInterval,
} from "../../export/sentences/developmentSentences.ts";
import { plainText } from "../../export/sentences/piece.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import type { FoundNumber } from "./foundNumber.ts";
import { NumberButton } from "./NumberButton.tsx";
import { RichText } from "./RichText.tsx";
import { SentenceText } from "./SentenceText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

const readings = [
  ["notContradicted", "no interval contradicts it from"],
  ["inside", "every interval lies inside from"],
] as const;
type Reading = (typeof readings)[number][0];

/** Both readings of every criterion, in x, in reference lengths and in integral scales at the inflow. */
export function DevelopmentTable({ cases }: { cases: readonly CaseView[] }) {
  const shown = cases.flatMap((view) => {
    const development = arguedOf(view)?.argument.development;
    return development === undefined ? [] : [{ view, development }];
  });
  if (shown.length === 0) return null;
  const { view } = shown[0];
  const along = view.along ?? "x";
  const unit = unitOf(along === "t" ? "T" : "L", view.units);
  return (
    <TableScroll label="Development length by criterion">
      <table className="data dense first-fixed">
        <thead>
          <tr>
            <th scope="col" rowSpan={2} className="text">
              <Definition of={developmentKey(view)}>Criterion</Definition>
            </th>
            {readings.map(([reading, words]) => (
              <th scope="colgroup" colSpan={4} key={reading}>
                {words}
              </th>
            ))}
          </tr>
          <tr>
            {readings.map(([reading]) => (
              <Fragment key={reading}>
                <th scope="colgroup" colSpan={2}>
                  <i className="sym">{along}</i>
                  {unit !== "" && ` (${unit})`}
                </th>
                <th scope="col">
                  <SymbolText runs={withReference(labelOf(`${along}/ell`).symbol, view.symbol)} />
                </th>
                <th scope="col">
                  <InLengths along={along} />
                </th>
              </Fragment>
            ))}
          </tr>
        </thead>
        {shown.map(({ view, development }) => (
          <CaseRows view={view} development={development} key={view.id} />
        ))}
      </table>
    </TableScroll>
  );
}

function InLengths({ along }: { along: string }) {
  return (
    <span className="sym">
      {along}
      <span className="up">/</span>L<sub className="up">11,in</sub>
    </span>
  );
}

function CaseRows({ view, development }: { view: CaseView; development: Development }) {
  const { inflowL11 } = development;
  const inflow =
    inflowL11.value === null
      ? inflowL11.why
      : withUnit(
          formatDigits(inflowL11.value * (view.units === "SI" ? 1000 : 1), 3),
          view.units === "SI" ? "mm" : "",
        );
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" colSpan={9}>
          <CaseMark mark={view.mark} /> {view.name}, at the inflow{" "}
          <span className="sym">
            L<sub className="up">11</sub>
          </span>{" "}
          ={" "}
          <NumberButton of="L11" quantity={inflowL11}>
            {inflow}
          </NumberButton>
        </th>
      </tr>
      {development.criteria.map((criterion) => (
        <tr key={criterion.key}>
          <th scope="row" className="text">
            <SentenceText sentence={criterionWords(criterion, development)} />
          </th>
          <ReadingCells {...{ view, development, criterion }} />
        </tr>
      ))}
    </tbody>
  );
}

function ReadingCells(row: { view: CaseView; development: Development; criterion: Criterion }) {
  const { notContradicted, inside } = row.criterion;
  // one reason for both readings is given once
  if (notContradicted.value === null && inside.value === null && notContradicted.why === inside.why)
    return (
      <td className="why" colSpan={8}>
        <RichText text={inside.why} />
      </td>
    );
  return readings.map(([reading]) => <PlaceCells key={reading} {...row} reading={reading} />);
}

function PlaceCells({
  view,
  development,
  criterion,
  reading,
}: {
  view: CaseView;
  development: Development;
  criterion: Criterion;
  reading: Reading;
}) {
  const place = criterion[reading];
  if (place.value === null)
    return (
      <td className="why" colSpan={4}>
        <RichText text={place.why} />
      </td>
    );
  const { length, inflowL11 } = development;
  const over = (unit: number | null) => (unit === null ? "–" : formatDigits(place.value / unit, 3));
  const interval = placeInterval(place);
  return (
    <>
      <td title={String(place.value)}>
        <NumberButton
          of={developmentKey(view)}
          quantity={place}
          at={developmentNumber(view, development, criterion, place, interval)}
        >
          {formatPosition(place.value)}
        </NumberButton>
      </td>
      <td className="pm">{interval ?? "–"}</td>
      <td>{over(length)}</td>
      <td>{over(view.along === "t" ? null : inflowL11.value)}</td>
    </>
  );
}

/** What a development length rests on. */
function developmentNumber(
  view: CaseView,
  development: Development,
  criterion: Criterion,
  place: Quantity & { value: number },
  interval: string | null,
): FoundNumber {
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  const none = "why_low" in place ? place.why_low : undefined;
  return {
    kind: "page",
    view,
    shown: `${withUnit(formatPosition(place.value), unit)}${interval === null ? "" : ` (${interval})`}`,
    rows: [
      ["criterion", plainText(criterionWords(criterion, development))],
      ["stations", `${view.stations.length}: the place is one of theirs`],
      ["interval", interval ?? none ?? "every station drawn anew gave the same place"],
    ],
  };
}
