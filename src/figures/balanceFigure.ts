import { assembleFigure } from "./assembleFigure.ts";
import { placeCells } from "./cells.ts";
import type { FigureCase, FigureOptions, FigureSpec } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { joinDecor } from "./panel.ts";
import { ratioPanel } from "./ratioPanel.ts";
import { stationTable } from "./stationPoints.ts";
import { commonAxis } from "./streamwise.ts";

/** Dissipation that the decay asks for over the one that the gradients carry, along the stream. */
export function balanceFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const axis = commonAxis(cases, options.axis);
  const cells = placeCells(1, 54, options);
  const { panel, decor } = ratioPanel(cases, "balance", axis, cells.boxes[0], "", options);
  return assembleFigure(
    {
      key: "balance",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [panel],
      decor: joinDecor(decor, legend(caseRows(cases), panel, options)),
      table: stationTable(cases, ["epsilon_decay", "epsilon_gradient", "balance"], axis),
    },
    options,
  );
}
