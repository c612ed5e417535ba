import { type KeyboardEvent, useRef, useState } from "react";
import { formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { bodyKeys, tidy } from "./bodyKeys.ts";
import type { Phase, RulerBody } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { type SpokenScale, spokenPlace } from "./spokenText.ts";
import { usePointerDrag } from "./usePointerDrag.ts";

interface BodyMarkProps {
  readonly body: RulerBody;
  readonly map: LaneMap;
  readonly width: number;
  readonly scale: SpokenScale;
  readonly onBody: ((x: number, phase: Phase) => void) | null;
}

/** The body: a dot above the lanes, to scale where it is wide enough; it can be moved where the page allows. */
export function BodyMark({ body, map, width, scale, onBody }: BodyMarkProps) {
  const [typing, setTyping] = useState(false);
  const before = useRef(body.x);
  const keyed = useRef<number | null>(null);
  const latest = useRef(body.x);
  const span = width / map.perX;
  const px = map.at + map.perX * body.x;
  const size = Math.max(7, (body.chord ?? 0) * map.perX);
  const tell = (x: number, phase: Phase) => {
    latest.current = x;
    onBody?.(x, phase);
  };
  const rest = () => {
    if (keyed.current !== null) tell(keyed.current, "rest");
    keyed.current = null;
  };
  const { putBack, ...pointer } = usePointerDrag({
    start: () => {
      before.current = body.x;
    },
    move: (dx) => tell(tidy(before.current + dx / map.perX, span), "drag"),
    end: () => tell(latest.current, "rest"),
    cancel: () => tell(before.current, "cancel"),
  });
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (putBack(event) || event.ctrlKey || event.metaKey || event.altKey) return;
    const next = bodyKeys(body.x, span, event.key, event.shiftKey);
    if (next !== null) {
      keyed.current = next;
      tell(next, "drag");
    } else if (event.key === "Escape") {
      keyed.current = null;
      tell(before.current, "cancel");
    } else if (event.key === "Enter") setTyping(true);
    else return;
    event.preventDefault();
  };
  const place = withUnit(formatNumber(body.x, decimalsOf(body.x, scale.decimals)), scale.units);
  const label = (
    <>
      {body.name}
      <span className="long">, {place}</span>
    </>
  );
  if (px < 0 || px > width) return null;
  return (
    <>
      <span className="ruler-dot" style={{ left: px, width: size }} aria-hidden="true" />
      {onBody === null ? (
        <span className="ruler-body-name" style={{ left: px + size / 2 + 5 }}>
          {label}
        </span>
      ) : (
        <div
          className="ruler-grip ruler-body"
          style={{ left: px }}
          role="slider"
          tabIndex={0}
          aria-label={`Body, ${body.name}`}
          aria-orientation="horizontal"
          aria-valuemin={-map.at / map.perX}
          aria-valuemax={(width - map.at) / map.perX}
          aria-valuenow={body.x}
          aria-valuetext={`${spokenPlace(body.x, { ...scale, decimals: decimalsOf(body.x, scale.decimals) })}. Enter to type a number.`}
          onFocus={() => {
            before.current = body.x;
          }}
          onKeyDown={onKeyDown}
          onKeyUp={rest}
          onBlur={rest}
          {...pointer}
        />
      )}
      {onBody !== null && !typing && (
        <span className="ruler-body-name" style={{ left: px + size / 2 + 5 }} aria-hidden="true">
          {label}
        </span>
      )}
      {typing && (
        <BodyField
          px={px + size / 2 + 5}
          x={body.x}
          name={body.name}
          onDone={(x) => {
            setTyping(false);
            if (x !== null) tell(x, "rest");
          }}
        />
      )}
    </>
  );
}

/** As many decimals as the stations have, more where the body stands between them; four at most. */
function decimalsOf(x: number, least: number): number {
  const needed = [0, 1, 2, 3].find((decimals) => Math.abs(Number(x.toFixed(decimals)) - x) < 1e-9) ?? 4;
  return Math.max(least, needed);
}

interface BodyFieldProps {
  readonly px: number;
  readonly x: number;
  readonly name: string;
  readonly onDone: (x: number | null) => void;
}

function BodyField({ px, x, name, onDone }: BodyFieldProps) {
  const ended = useRef(false);
  const end = (text: string | null) => {
    if (ended.current) return;
    ended.current = true;
    const number = text === null || text.trim() === "" ? Number.NaN : Number(text.replace(",", "."));
    onDone(Number.isFinite(number) ? number : null);
  };
  return (
    <input
      className="ruler-body-field"
      style={{ left: px }}
      aria-label={`Position of ${name}`}
      inputMode="decimal"
      defaultValue={x}
      ref={(field) => field?.select()}
      onBlur={(event) => end(event.currentTarget.value)}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === "Enter") end(event.currentTarget.value);
        if (event.key === "Escape") end(null);
      }}
    />
  );
}
