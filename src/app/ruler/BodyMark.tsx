import { useRef, useState } from "react";
import { formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import { BodyField } from "./BodyField.tsx";
import type { Phase, RulerBody } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { bodyName, type SpokenScale, spokenPlace } from "./spokenText.ts";
import { useBodyGrip } from "./useBodyGrip.ts";

interface BodyMarkProps {
  readonly body: RulerBody;
  readonly map: LaneMap;
  readonly width: number;
  readonly scale: SpokenScale;
  readonly onBody: ((x: number, phase: Phase) => void) | null;
}

/** Px that the name needs beside the dot: with less on its right it stands on the left. */
const nameRoom = 110;

/** The body: a dot above the lanes, to scale where it is wide enough, and its name; off the scale, at its edge. */
export function BodyMark({ body, map, width, scale, onBody }: BodyMarkProps) {
  const at = map.at + map.perX * body.x;
  const px = Math.min(Math.max(at, 0), width);
  const size = px === at ? Math.max(7, (body.chord ?? 0) * map.perX) : 7;
  const shown = { ...scale, decimals: Math.max(scale.decimals, positionDecimals([body.x])) };
  const place = withUnit(formatNumber(body.x, shown.decimals), scale.units);
  const before = px + size / 2 + nameRoom > width;
  const label = {
    px: before ? px - size / 2 - 5 : px + size / 2 + 5,
    before,
    text: at > width ? `${place} →` : at < 0 ? `← ${place}` : place,
  };
  return (
    <>
      <span className="ruler-dot" style={{ left: px, width: size }} aria-hidden="true" />
      {onBody === null ? (
        <BodyName name={body.name} {...label} />
      ) : (
        <MovableBody {...{ body, map, width, onBody, px, label }} scale={shown} />
      )}
    </>
  );
}

interface MovableBodyProps extends BodyMarkProps {
  readonly onBody: (x: number, phase: Phase) => void;
  readonly px: number;
  readonly label: BodyLabel;
}

interface BodyLabel {
  readonly px: number;
  /** It ends there instead of beginning there. */
  readonly before: boolean;
  readonly text: string;
}

/** The grip on the dot: a slider; Enter turns the name into a field. */
function MovableBody({ body, map, width, scale, onBody, px, label }: MovableBodyProps) {
  const [typing, setTyping] = useState(false);
  const slider = useRef<HTMLDivElement>(null);
  const ends: readonly [number, number] = [-map.at / map.perX, (width - map.at) / map.perX];
  const grip = useBodyGrip({ x: body.x, ends, perX: map.perX, onBody, onType: () => setTyping(true) });
  const typed = (x: number | null) => {
    setTyping(false);
    if (x !== null) onBody(x, "rest");
    slider.current?.focus();
  };
  return (
    <>
      <div
        ref={slider}
        className="ruler-grip ruler-body"
        style={{ left: px }}
        role="slider"
        tabIndex={0}
        aria-label={bodyName(body)}
        aria-orientation="horizontal"
        aria-valuemin={Math.min(ends[0], body.x)}
        aria-valuemax={Math.max(ends[1], body.x)}
        aria-valuenow={body.x}
        aria-valuetext={`${spokenPlace(body.x, scale)}. Enter to type a number.`}
        {...grip}
      />
      {typing ? (
        <BodyField {...label} x={body.x} name={body.name} onDone={typed} />
      ) : (
        <BodyName name={body.name} {...label} />
      )}
    </>
  );
}

function BodyName({ name, px, before, text }: BodyLabel & { name: string }) {
  return (
    <span className={`ruler-body-name${before ? " before" : ""}`} style={{ left: px }}>
      {name}
      <span className="long">, {text}</span>
    </span>
  );
}
