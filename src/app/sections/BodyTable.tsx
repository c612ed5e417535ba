import { labelOf } from "../../core/catalogue.ts";
import { type BodyKey, bodyKeys } from "../../core/decayArgument.ts";
import { isEstimate, type Quantity } from "../../core/quantity.ts";
import { displayOf } from "../../core/unitText.ts";
import { formatPosition } from "../../figures/formatNumber.ts";
import { formatScaled } from "../../figures/formatQuantity.ts";
import { BodyCells } from "./BodyCells.tsx";
import { howFound, type PlacedBody } from "./bodyRows.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { formatted } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** What the body meets in every case, and how it changes over its chord. */
export function BodyTable({ placed }: { placed: readonly PlacedBody[] }) {
  const chords = placed.some(({ body }) => body.chord !== null);
  return (
    <TableScroll label="At the body">
      <table className="data dense first-fixed">
        <thead>
          <tr>
            <th scope="col">At the body</th>
            {placed.map(({ view, body }) => (
              <th scope="colgroup" colSpan={2} key={view.id}>
                <CaseMark mark={view.mark} /> {view.name}
                {placed.some((other) => other.body.x !== body.x) && `, ${formatPosition(body.x)}`}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {bodyKeys.flatMap((key) => [
            <MetRow placed={placed} of={key} key={key} />,
            key === "L11" && chords && <ChordRow placed={placed} key="chord" />,
          ])}
        </tbody>
        {chords && (
          <tbody>
            <tr>
              <th scope="rowgroup" colSpan={2 * placed.length + 1}>
                <Definition of="chord_change">Change over the chord</Definition>, %
              </th>
            </tr>
            {bodyKeys.map((key) => (
              <ChangeRow placed={placed} of={key} key={key} />
            ))}
          </tbody>
        )}
      </table>
    </TableScroll>
  );
}

function Head({ of, unit }: { of: string; unit: string }) {
  return (
    <th scope="row" className="text">
      <Definition of={of}>
        <SymbolText runs={labelOf(of).symbol} />
      </Definition>
      {unit !== "" && ` (${unit})`}
    </th>
  );
}

function MetRow({ placed, of }: { placed: readonly PlacedBody[]; of: BodyKey }) {
  const { units } = placed[0].view;
  return (
    <tr>
      <Head of={of} unit={displayOf(labelOf(of), units).unit} />
      {placed.map((one) => {
        const quantity = one.body.at[of];
        const shown = formatted(quantity, { label: of, units: one.view.units });
        return <BodyCells key={one.view.id} {...{ one, of, quantity, shown }} rows={howFound(one, of)} />;
      })}
    </tr>
  );
}

function ChordRow({ placed }: { placed: readonly PlacedBody[] }) {
  return (
    <tr>
      <Head of="L11_chord" unit="" />
      {placed.map((one) => {
        const quantity = one.body.L11_chord;
        const shown = formatted(quantity, { label: "L11_chord", units: one.view.units });
        const rows = howFound(one, "L11");
        return <BodyCells key={one.view.id} {...{ one, quantity, shown, rows }} of="L11_chord" />;
      })}
    </tr>
  );
}

function ChangeRow({ placed, of }: { placed: readonly PlacedBody[]; of: BodyKey }) {
  return (
    <tr>
      <Head of={of} unit="" />
      {placed.map((one) => {
        const quantity = one.body.change[of];
        const shown = formatScaled(asChange(quantity), { factor: 100, unit: "%", digits: 2 });
        const rows = howFound(one, of);
        return <BodyCells key={one.view.id} {...{ one, quantity, shown, rows }} of="chord_change" />;
      })}
    </tr>
  );
}

/** A ratio less one. */
function asChange(ratio: Quantity): Quantity {
  if (!isEstimate(ratio)) return ratio;
  const less = (end: number | null) => (end === null ? null : end - 1);
  const { error: _, ...rest } = ratio;
  return { ...rest, value: ratio.value - 1, low: less(ratio.low), high: less(ratio.high) };
}
