import { type KeyboardEvent, useRef } from "react";
import type { Axis } from "../../sheet/workspace.ts";
import type { AxisChoice } from "./axisChoices.ts";
import { OriginSymbol, PlaceSymbol } from "./Symbols.tsx";

interface AxisSwitchProps {
  readonly choices: readonly AxisChoice[];
  readonly axis: Axis;
  readonly along: "x" | "t";
  readonly onAxis: (axis: Axis) => void;
}

/** What the scale counts: x, x in reference lengths, or the distance from the virtual origin. */
export function AxisSwitch({ choices, axis, along, onAxis }: AxisSwitchProps) {
  const group = useRef<HTMLDivElement>(null);
  const chosen = Math.max(
    0,
    choices.findIndex((choice) => choice.axis === axis),
  );
  const turn = (event: KeyboardEvent<HTMLElement>) => {
    const step = { ArrowLeft: -1, ArrowUp: -1, ArrowRight: 1, ArrowDown: 1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = (chosen + step + choices.length) % choices.length;
    onAxis(choices[next].axis);
    group.current?.querySelectorAll<HTMLElement>("[role=radio]")[next].focus();
  };
  if (choices.length < 2) return <div className="ruler-switch" />;
  return (
    <div
      ref={group}
      className="ruler-switch"
      role="radiogroup"
      aria-label="Scale of the ruler"
      onKeyDown={turn}
    >
      {choices.map((choice, i) => (
        // biome-ignore lint/a11y/useSemanticElements: a native radio cannot hold a set symbol as its face
        <button
          key={choice.axis}
          type="button"
          role="radio"
          aria-checked={i === chosen}
          aria-label={choice.spoken}
          tabIndex={i === chosen ? 0 : -1}
          onClick={() => onAxis(choice.axis)}
        >
          <ChoiceText choice={choice} along={along} />
        </button>
      ))}
    </div>
  );
}

/** "x (m)", "x/M", "(x − x0)/M": as the switch and the scale write them. */
function ChoiceText({ choice: { axis, over, unit }, along }: { choice: AxisChoice; along: "x" | "t" }) {
  const inUnit = unit !== null && <span className="of">({unit})</span>;
  const divided = over !== null && (
    <>
      /<span className="sym">{over}</span>
    </>
  );
  if (axis !== "(x-x0)/ell")
    return (
      <>
        <PlaceSymbol along={along} />
        {axis === "x/ell" && divided}
        {inUnit}
      </>
    );
  const difference = (
    <>
      <PlaceSymbol along={along} />
      <span className="minus">{"\u2212"}</span>
      <OriginSymbol along={along} />
    </>
  );
  return over === null ? (
    <>
      {difference}
      {inUnit}
    </>
  ) : (
    <>
      ({difference}){divided}
    </>
  );
}
