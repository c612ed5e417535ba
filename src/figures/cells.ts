import type { FigureOptions } from "./figureSpec.ts";
import type { Box } from "./panel.ts";

/** Room around the frame of a panel, mm. */
export interface Room {
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly top: number;
}
export const usualRoom: Room = { left: 13.6, right: 2.2, bottom: 10.2, top: 2.4 };

const gap = 6;
/** Under this width two panels stand one above the other. */
const sideBySideFrom = 120;

export interface Cells {
  readonly widthMm: number;
  readonly heightMm: number;
  /** The frame of each panel, in order. */
  readonly boxes: readonly Box[];
}

/** Places panels of one height side by side, or one above the other where the figure is narrow or stacked. */
export function placeCells(
  count: number,
  panelHeight: number,
  options: FigureOptions,
  room: Room = usualRoom,
): Cells {
  const { widthMm } = options;
  const beside = count > 1 && !options.stacked && widthMm >= sideBySideFrom;
  const width = beside ? (widthMm - gap * (count - 1)) / count : widthMm;
  const heightMm = beside ? panelHeight : panelHeight * count;
  const boxes = Array.from({ length: count }, (_, i): Box => {
    const left = beside ? i * (width + gap) : 0;
    const top = beside ? heightMm : heightMm - i * panelHeight;
    return {
      left: left + room.left,
      right: left + width - room.right,
      bottom: top - panelHeight + room.bottom,
      top: top - room.top,
    };
  });
  return { widthMm, heightMm, boxes };
}
