import type { ReactNode } from "react";
import type { Quantity } from "../../core/quantity.ts";
import { raisedDigits, thinSpace } from "../../figures/formatNumber.ts";
import { type FormattedQuantity, formatScaled } from "../../figures/formatQuantity.ts";
import { NumberButton } from "../sections/NumberButton.tsx";
import { exponentReading, originReading } from "./readings.ts";
import type { RulerCase } from "./rulerProps.ts";
import { OriginSymbol } from "./Symbols.tsx";

interface LaneReadingsProps {
  readonly one: RulerCase;
  readonly along: "x" | "t";
  readonly units: string;
  readonly onCancel: ((caseId: string) => void) | null;
}

/** n and x0 with their 95 % intervals; while a case is read, how far it is; without a law, why. */
export function LaneReadings({ one, along, units, onCancel }: LaneReadingsProps) {
  const { state } = one;
  if (state.kind === "reading") {
    return (
      <div className="ruler-readings notes-only">
        <p>
          {state.done} of {state.total} stations
        </p>
        <p className="quiet">
          {state.amount}
          {onCancel && (
            <button
              type="button"
              className="action"
              aria-label={`Cancel reading ${one.name}`}
              onClick={() => onCancel(one.id)}
            >
              Cancel
            </button>
          )}
        </p>
      </div>
    );
  }
  if (state.kind === "open") {
    return (
      <div className="ruler-readings notes-only">
        <p className="quiet">{state.note}</p>
      </div>
    );
  }
  const stale = state.kind === "stale";
  return (
    <div className={`ruler-readings${stale ? " stale" : ""}`} aria-busy={stale}>
      <Reading of="n" quantity={one.n} symbol={<span className="sym">n</span>} shown={exponentReading(one)} />
      <Reading
        of={along === "t" ? "t0" : "x0"}
        quantity={one.x0}
        symbol={<OriginSymbol along={along} />}
        shown={originReading(one, units)}
        italicUnit={one.length !== null}
        note={one.originHeld ? "held" : null}
      />
    </div>
  );
}

interface ReadingProps {
  /** Key of its label, and the very number: its definition is one click away. */
  readonly of: string;
  readonly quantity: Quantity;
  readonly symbol: ReactNode;
  readonly shown: FormattedQuantity;
  readonly italicUnit?: boolean;
  readonly note?: string | null;
}

function Reading({ of, quantity, symbol, shown, italicUnit = false, note = null }: ReadingProps) {
  const has = shown.value !== formatScaled({ value: null, why: "" }, { factor: 1, unit: "" }).value;
  const power = shown.power === null ? "" : `${thinSpace}×${thinSpace}10${raisedDigits(shown.power)}`;
  return (
    <p className="ruler-reading">
      <span>{symbol}</span>
      <span className="value">
        <NumberButton of={of} quantity={quantity}>
          {shown.value}
          {power}
          {has && shown.unit !== "" && (
            <>
              {thinSpace}
              {italicUnit ? <span className="sym">{shown.unit}</span> : shown.unit}
            </>
          )}
        </NumberButton>
      </span>
      <span className="ci">{note ?? shown.interval ?? shown.why}</span>
    </p>
  );
}
