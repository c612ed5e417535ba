import { useRef, useState } from "react";
import { formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import { BodyField } from "./BodyField.tsx";
import type { Phase, RulerBody } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { type SpokenScale, spokenPlace } from "./spokenText.ts";
import { useBodyGrip } from "./useBodyGrip.ts";

interface BodyMarkProps {
  readonly body: RulerBody;
  readonly map: LaneMap;
  readonly width: number;
  readonly scale: SpokenScale;
  readonly onBody: ((x: number, phase: Phase) => void) | null;
}

/** The body: a dot above the lanes, to scale where it is wide enough, and its name. */
export function BodyMark({ body, map, width, scale, onBody }: BodyMarkProps) {
  const px = map.at + map.perX * body.x;
  if (px < 0 || px > width) return null;
  const size = Math.max(7, (body.chord ?? 0) * map.perX);
  const shown = { ...scale, decimals: Math.max(scale.decimals, positionDecimals([body.x])) };
  const label = { px: px + size / 2 + 5, text: withUnit(formatNumber(body.x, shown.decimals), scale.units) };
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
  readonly label: { readonly px: number; readonly text: string };
}

/** The grip on the dot: a slider; Enter turns the name into a field. */
function MovableBody({ body, map, width, scale, onBody, px, label }: MovableBodyProps) {
  const [typing, setTyping] = useState(false);
  const slider = useRef<HTMLDivElement>(null);
  const span = width / map.perX;
  const grip = useBodyGrip({ x: body.x, span, perX: map.perX, onBody, onType: () => setTyping(true) });
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
        aria-label={`Body, ${body.name}`}
        aria-orientation="horizontal"
        aria-valuemin={-map.at / map.perX}
        aria-valuemax={(width - map.at) / map.perX}
        aria-valuenow={body.x}
        aria-valuetext={`${spokenPlace(body.x, scale)}. Enter to type a number.`}
        {...grip}
      />
      {typing ? (
        <BodyField px={label.px} x={body.x} name={body.name} onDone={typed} />
      ) : (
        <BodyName name={body.name} {...label} />
      )}
    </>
  );
}

function BodyName({ name, px, text }: { name: string; px: number; text: string }) {
  return (
    <span className="ruler-body-name" style={{ left: px }}>
      {name}
      <span className="long">, {text}</span>
    </span>
  );
}
