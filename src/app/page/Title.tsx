import { useRef, useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { bare, isEstimate } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { NumberButton } from "../sections/NumberButton.tsx";
import { overStations } from "../sections/overStations.ts";
import { SymbolText } from "../sections/SymbolText.tsx";
import { UnitText } from "../sections/UnitText.tsx";
import type { CaseView } from "../session/caseView.ts";

/** The page's title, which can be renamed in place, and one line about what it rests on. */
export function Title({
  title,
  cases,
  onRename,
}: {
  title: string;
  cases: readonly CaseView[];
  onRename: (title: string) => void;
}) {
  const [editing, setEditing] = useState(false);
  const field = useRef<HTMLInputElement>(null);
  const shown = title || defaultTitle(cases);
  const settle = () => {
    const text = field.current?.value.trim() ?? "";
    setEditing(false);
    if (text !== shown) onRename(text);
  };
  return (
    <>
      {editing ? (
        <div className="title">
          <input
            ref={(input) => {
              field.current = input;
              input?.focus();
            }}
            aria-label="Title of the page"
            defaultValue={shown}
            onBlur={settle}
            onKeyDown={(event) => {
              if (event.key === "Enter") settle();
              if (event.key === "Escape") setEditing(false);
            }}
          />
        </div>
      ) : (
        <h1 className="title">{shown}</h1>
      )}
      <p className="description">
        <Grounds cases={cases} /> All intervals are 95{"\u202f"}%.{" "}
        <button type="button" className="action quiet" onClick={() => setEditing(true)}>
          Rename
        </button>
      </p>
    </>
  );
}

function defaultTitle(cases: readonly CaseView[]): string {
  const names = cases.map(({ name }) => name);
  const last = names.pop();
  if (last === undefined) return "Decay along the stream";
  return `Decay along the stream: ${names.length > 0 ? `${names.join(", ")} and ` : ""}${last}`;
}

const words = ["No", "One", "Two", "Three", "Four", "Five", "Six"];

/** "M = 25 mm, U = 5.98 m/s, ν = 1.51 × 10⁻⁵ m²/s. Two cases, 33 stations." as far as the cases share it. */
function Grounds({ cases }: { cases: readonly CaseView[] }) {
  const stations = cases.reduce((sum, view) => sum + view.stations.length, 0);
  const { units } = cases[0].of.sheet;
  const length = shared(cases.map((view) => view.length));
  const nu = shared(cases.map((view) => view.of.sheet.kinematicViscosity));
  const speeds = cases.flatMap((view) => view.stations.map(({ U }) => U)).filter(isEstimate);
  const mean = speeds.reduce((sum, { value }) => sum + value, 0) / speeds.length;
  const alike = speeds.length > 0 && speeds.every(({ value }) => Math.abs(value / mean - 1) < 0.02);
  const facts = [
    length !== null && (
      <span className="nowrap" key="length">
        <i className="sym">{cases[0].symbol}</i> ={" "}
        <GivenNumber of="ell" view={cases[0]} value={length} shown={lengthText(length, units)} />
      </span>
    ),
    alike && (
      <span className="nowrap" key="U">
        <SymbolText runs={labelOf("U").symbol} /> ={" "}
        <NumberButton {...overStations(cases[0], "U", formatDigits(mean, 3), ({ U }) => U.value)}>
          {withUnit(formatDigits(mean, 3), unitOf("L/T", units))}
        </NumberButton>
      </span>
    ),
    nu !== null && (
      <span className="nowrap" key="nu">
        <SymbolText runs={labelOf("nu").symbol} /> ={" "}
        <GivenNumber of="nu" view={cases[0]} value={nu} shown={formatDigits(nu, 3)} />
        {units === "SI" && (
          <>
            {"\u202f"}
            <UnitText unit={unitOf("L²/T", units)} />
          </>
        )}
      </span>
    ),
  ].filter((fact) => fact !== false);
  return (
    <>
      {facts.flatMap((fact, i) => (i === 0 ? [fact] : [", ", fact]))}
      {facts.length > 0 && ". "}
      {words[cases.length] ?? cases.length} case{cases.length === 1 ? "" : "s"}, {stations} station
      {stations === 1 ? "" : "s"}.
    </>
  );
}

/** A number that was given, not found. */
function GivenNumber({
  of,
  view,
  value,
  shown,
}: {
  of: string;
  view: CaseView;
  value: number;
  shown: string;
}) {
  const rows = [["given", "in the case sheet, or typed under Records"]] as const;
  return (
    <NumberButton
      of={of}
      quantity={bare(value, "given, not estimated")}
      at={{ kind: "page", view, shown, rows }}
    >
      {shown}
    </NumberButton>
  );
}

function shared(values: readonly (number | null)[]): number | null {
  return values.every((value) => value === values[0]) ? values[0] : null;
}

function lengthText(length: number, units: "SI" | "nondimensional"): string {
  if (units !== "SI") return plainDigits(length);
  return length < 1 ? withUnit(plainDigits(length * 1000), "mm") : withUnit(plainDigits(length), "m");
}

/** At most four digits, none of them an idle zero: a mesh of 25 mm is not 25.0. */
function plainDigits(value: number): string {
  const rounded = Number(value.toPrecision(4));
  return formatNumber(rounded, (String(rounded).split(".")[1] ?? "").length);
}
