import { formatRange, withUnit } from "../../figures/formatNumber.ts";
import { CaseMark } from "../sections/CaseMark.tsx";
import type { RulerCase } from "./rulerProps.ts";
import type { StationWindow } from "./snapWindow.ts";
import type { SpokenScale } from "./spokenText.ts";

interface LaneNameProps {
  readonly one: RulerCase;
  readonly window: StationWindow | null;
  readonly scale: SpokenScale;
}

/** Marker and name of a case, and the window its law was fitted in. */
export function LaneName({ one, window, scale }: LaneNameProps) {
  const auto = one.windowChosen === "auto";
  return (
    <div className="ruler-name">
      <p className="ruler-case">
        <CaseMark mark={one.mark} line />
        <b>{one.name}</b>
      </p>
      {window && (
        <p className="ruler-window-text">
          <span className="long">window </span>
          {withUnit(formatRange(window[0], window[1], scale.decimals), scale.units)}
          <span className="long">, {auto ? "automatic" : "set"}</span>
          <span className="short">, {auto ? "auto" : "set"}</span>
        </p>
      )}
    </div>
  );
}
