import type { ReactNode } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { BodyArgument } from "../../core/decayArgument.ts";
import type { Quantity } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { leastMissPlace, targetKey, targetNumber } from "../../export/sentences/bodySentences.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { BodyCells } from "./BodyCells.tsx";
import type { PlacedBody } from "./bodyRows.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import type { SettingRow } from "./definitionRows.ts";
import { formatted } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

type TargetKey = keyof BodyArgument["targets"];

/** Where each target is met in every case, where both are missed least, and what the inflow would have to bring. */
export function TargetTable({ placed }: { placed: readonly PlacedBody[] }) {
  const keys = (["Tu", "L11_chord"] as const).filter((key) =>
    placed.some(({ body }) => body.targets[key] !== null),
  );
  if (keys.length === 0) return null;
  return (
    <TableScroll label="Targets at the body">
      <table className="data dense first-fixed">
        <thead>
          <tr>
            <th scope="col">Targets</th>
            {placed.map(({ view }) => (
              <th scope="colgroup" colSpan={2} key={view.id}>
                <CaseMark mark={view.mark} /> {view.name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {keys.flatMap((key) => [
            <WantedRow placed={placed} of={key} key={`${key} wanted`} />,
            <MetRow placed={placed} of={key} key={`${key} met`} />,
          ])}
          {keys.length === 2 && <BothRow placed={placed} />}
          {keys.includes("Tu") && <InflowRow placed={placed} />}
        </tbody>
      </table>
    </TableScroll>
  );
}

const placeUnit = ({ view }: PlacedBody) => unitOf(view.along === "t" ? "T" : "L", view.units);

function RowHead({ children }: { children: ReactNode }) {
  return (
    <th scope="row" className="text">
      {children}
    </th>
  );
}

function WantedRow({ placed, of }: { placed: readonly PlacedBody[]; of: TargetKey }) {
  return (
    <tr>
      <RowHead>
        <Definition of={of}>
          <SymbolText runs={labelOf(of).symbol} />
        </Definition>{" "}
        wanted
      </RowHead>
      {placed.map(({ view, body }) => {
        const wanted = body.targets[of];
        return <TextCells key={view.id} text={wanted === null ? "–" : targetNumber(of, wanted.target)} />;
      })}
    </tr>
  );
}

function MetRow({ placed, of }: { placed: readonly PlacedBody[]; of: TargetKey }) {
  return (
    <tr>
      <RowHead>
        <Definition of={targetKey(placed[0].view)}>is met at</Definition>, {placeUnit(placed[0])}
      </RowHead>
      {placed.map((one) => {
        const wanted = one.body.targets[of];
        if (wanted === null) return <TextCells key={one.view.id} text="–" />;
        const rows: SettingRow[] = [
          ["target", targetNumber(of, wanted.target)],
          [
            "found on",
            of === "Tu"
              ? "the fitted law inside its window, between stations outside"
              : "the line of ln L11 against ln(x − x0) in the window",
          ],
        ];
        return <Placed key={one.view.id} {...{ one, rows }} of={targetKey(one.view)} quantity={wanted.x} />;
      })}
    </tr>
  );
}

function BothRow({ placed }: { placed: readonly PlacedBody[] }) {
  return (
    <tr>
      <RowHead>
        <Definition of="least_miss">both are missed least at</Definition>, {placeUnit(placed[0])}
      </RowHead>
      {placed.map((one) => {
        const { both } = one.body;
        if (both === null || both.x.value === null) return <TextCells key={one.view.id} text="–" />;
        const times = (factor: number) => formatDigits(factor, 3);
        return (
          <td key={one.view.id} colSpan={2} className="text wrap">
            {formatPosition(leastMissPlace(both.x.value))}: <SymbolText runs={labelOf("Tu").symbol} />{" "}
            {times(both.Tu)} times, <SymbolText runs={labelOf("L11_chord").symbol} /> {times(both.L11_chord)}{" "}
            times the target
          </td>
        );
      })}
    </tr>
  );
}

function InflowRow({ placed }: { placed: readonly PlacedBody[] }) {
  return (
    <tr>
      <RowHead>
        <Definition of="Tu_inflow">
          <SymbolText runs={labelOf("Tu").symbol} /> needed at the first station
        </Definition>
        , %, extrapolated
      </RowHead>
      {placed.map((one) => {
        const { inflow } = one.body;
        if (inflow === null) return <TextCells key={one.view.id} text="–" />;
        const rows: SettingRow[] = [
          ["first station", withUnit(formatPosition(inflow.x), placeUnit(one))],
          ["extrapolated", "the law’s n and x0 are held, its A is changed: nothing was measured there"],
          ["interval", "covariance of n and x0 between the two places"],
        ];
        return <Placed key={one.view.id} {...{ one, rows }} of="Tu_inflow" quantity={inflow.Tu} />;
      })}
    </tr>
  );
}

function Placed({
  one,
  of,
  quantity,
  rows,
}: {
  one: PlacedBody;
  of: string;
  quantity: Quantity;
  rows: readonly SettingRow[];
}) {
  const shown = formatted(quantity, { label: of, units: one.view.units });
  return <BodyCells {...{ one, of, quantity, shown, rows }} />;
}

function TextCells({ text }: { text: string }) {
  return (
    <>
      <td>{text}</td>
      <td className="pm" />
    </>
  );
}
