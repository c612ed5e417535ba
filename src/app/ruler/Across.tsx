import { BodyMark } from "./BodyMark.tsx";
import { caughtPx } from "./DragTag.tsx";
import type { Phase, RulerBody, RulerCase } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import type { SpokenScale } from "./spokenText.ts";
import type { WindowGesture } from "./useWindowGesture.ts";

interface AcrossProps {
  readonly cases: readonly RulerCase[];
  readonly maps: readonly (LaneMap | null)[];
  readonly width: number;
  readonly height: number;
  readonly body: RulerBody | null;
  readonly onBody: ((x: number, phase: Phase) => void) | null;
  readonly hover: { readonly caseId: string; readonly x: number } | null;
  readonly gesture: WindowGesture | null;
  readonly scale: SpokenScale;
}

/** Height of the row above the lanes that the body's dot and name stand in. */
const head = 14;

/** What goes across all lanes: the body's dotted line, the line under the pointer, the line of a moving bracket. */
export function Across({ cases, maps, width, height, body, onBody, hover, gesture, scale }: AcrossProps) {
  const hoverMap = hover && maps[cases.findIndex(({ id }) => id === hover.caseId)];
  const hoverPx = hover && hoverMap ? hoverMap.at + hoverMap.perX * hover.x : null;
  const caught = caughtPx(gesture);
  const places = cases.map((_, i) =>
    body === null ? null : body.places ? (body.places[i] ?? null) : body.x,
  );
  const first = maps.find((map, i) => map !== null && places[i] !== null) ?? null;
  const foot = head + cases.length * height;
  return (
    <div className="ruler-across">
      <svg width={width} height={foot} aria-hidden="true" focusable="false">
        {body && <path className="ruler-body-line" d={bodyLine(places, maps, width, height)} />}
        {hoverPx !== null && <path className="ruler-hover" d={`M${hoverPx} ${head}V${foot}`} />}
        {caught !== null && <path className="ruler-caught" d={`M${caught} ${head}V${foot + 6}`} />}
      </svg>
      {body && first && <BodyMark body={body} map={first} width={width} scale={scale} onBody={onBody} />}
    </div>
  );
}

/** One line through all lanes; on an axis that shifts the cases, a piece in each lane at its own place. */
function bodyLine(
  places: readonly (number | null)[],
  maps: readonly (LaneMap | null)[],
  width: number,
  height: number,
): string {
  return maps
    .map((map, i) => {
      const x = places[i];
      if (map === null || x === null) return "";
      const px = map.at + map.perX * x;
      if (px < 0 || px > width) return "";
      const top = head + i * height;
      const last = i === maps.length - 1;
      return `M${px.toFixed(1)} ${i === 0 ? head - 3 : top}V${top + height + (last ? 8 : 0)}`;
    })
    .join("");
}
