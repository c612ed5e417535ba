import { formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { bracketKeys } from "./bracketKeys.ts";
import type { RulerCase } from "./rulerProps.ts";
import { type Edge, edgeStation, type StationWindow } from "./snapWindow.ts";
import type { SpokenScale } from "./spokenText.ts";

interface StepperProps {
  readonly one: RulerCase;
  readonly edge: Edge;
  readonly window: StationWindow;
  readonly scale: SpokenScale;
  readonly onStep: (window: StationWindow | "auto") => void;
}

/** The row below the head that moves the chosen bracket by a station: for fingers, which cover what they drag. */
export function Stepper({ one, edge, window, scale, onStep }: StepperProps) {
  const stations = one.stations.map(({ x }) => x);
  const step = (key: "ArrowLeft" | "ArrowRight") => {
    const move = bracketKeys(stations, window, edge, key, false);
    if (move?.kind === "move") onStep(move.window);
  };
  const x = stations[edgeStation(stations, window, edge)];
  const end = edge === "start" ? "first station" : "last station";
  return (
    // The bracket keeps the focus, so that its keys go on working and the row stays.
    // biome-ignore lint/a11y/noStaticElementInteractions: nothing is done here but to leave the focus where it is
    <div
      className="ruler-stepper"
      onPointerDown={(event) => event.preventDefault()}
      onMouseDown={(event) => event.preventDefault()}
    >
      <button
        type="button"
        aria-label={`${end} of ${one.name}, one station upstream`}
        onClick={() => step("ArrowLeft")}
      >
        ‹
      </button>
      <p>
        {end}, {one.name}: <b>{withUnit(formatNumber(x, scale.decimals), scale.units)}</b>
      </p>
      <button type="button" className="action" onClick={() => onStep("auto")}>
        automatic
      </button>
      <button
        type="button"
        aria-label={`${end} of ${one.name}, one station downstream`}
        onClick={() => step("ArrowRight")}
      >
        ›
      </button>
    </div>
  );
}
