import { assembleFigure } from "./assembleFigure.ts";
import { placeCells, usualRoom } from "./cells.ts";
import { decayPanels } from "./decayPanels.ts";
import { decayEntries } from "./decayPoints.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { commonQuantity, intensityScale } from "./intensityScale.ts";
import { jointRegionPanel } from "./jointRegionPanel.ts";
import { caseRows, legend } from "./legend.ts";
import { levelLine } from "./pageShapes.ts";
import { joinDecor } from "./panel.ts";
import { commonAxis, streamwise } from "./streamwise.ts";

const heightMm = 80;
/** From this width on the joint regions stand beside the decay. */
const bothFrom = 120;

/**
 * The decay: k/U² against the distance from the virtual origin, law and band, residuals below; beside it
 * (or below, where panels are stacked) the joint regions of n and x0. A narrow figure is the decay alone.
 */
export function decayFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const shown = cases.filter(({ decay }) => decay !== null && decay.points.length > 0);
  const axis = commonAxis(shown, "(x-x0)/ell");
  const withRegion =
    shown.some(({ decay }) => decay?.law) && (options.stacked || options.widthMm >= bothFrom);
  const room = { ...usualRoom, right: ["k", "uu"].includes(commonQuantity(shown)) ? 10 : usualRoom.right };
  const cells = placeCells(withRegion ? 2 : 1, heightMm, options, room);
  const panels = decayPanels(shown, axis, cells.boxes[0], withRegion ? "a" : "", options);
  const [main, strip] = panels;
  const decor = joinDecor(
    intensityScale(main, commonQuantity(shown), options),
    legend(caseRows(shown), main, options),
    { shapes: strip ? levelLine(strip, 0, options, false) : [] },
  );
  const table = decayTable(shown, axis);
  const size = { key: "decay", widthMm: cells.widthMm, heightMm: cells.heightMm };
  if (!withRegion) return assembleFigure({ ...size, panels, decor, table }, options);
  const second = { ...cells.boxes[1], right: cells.boxes[1].right + room.right - usualRoom.right };
  const region = jointRegionPanel(shown, { ...second, top: second.top - 1.6 }, "b", options);
  return assembleFigure(
    { ...size, panels: [...panels, region.panel], decor: joinDecor(decor, region.decor), table },
    options,
  );
}

function decayTable(cases: readonly FigureCase[], axis: FigureOptions["axis"]): FigureTable {
  return {
    heading: ["case", "x", axis, "q", "q_low", "q_high", "residual_percent", "in_window"],
    rows: cases.flatMap((of) =>
      decayEntries(of).map((entry) => [
        of.name,
        entry.x,
        streamwise(of, entry.x, axis),
        entry.q,
        entry.low,
        entry.high,
        entry.residual,
        entry.used ? 1 : 0,
      ]),
    ),
  };
}
