import { assembleFigure } from "./assembleFigure.ts";
import { placeCells } from "./cells.ts";
import type { FigureCase, FigureOptions, FigureSpec } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { joinDecor } from "./panel.ts";
import { ratioPanel } from "./ratioPanel.ts";
import { stationTable } from "./stationPoints.ts";
import { commonAxis } from "./streamwise.ts";

/** u′/v′ and u′/w′ along the stream on the tolerance band; the second only where w was measured. */
export function isotropyFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const axis = commonAxis(cases, options.axis);
  const all = ["isotropy_uv", "isotropy_uw"] as const;
  const there = all.filter((key) =>
    cases.some((of) => of.stations.some((station) => station[key].value !== null)),
  );
  const keys = there.length > 0 ? there : all.slice(0, 1);
  const cells = placeCells(keys.length, 54, options);
  const made = keys.map((key, i) =>
    ratioPanel(cases, key, axis, cells.boxes[i], keys.length > 1 ? "ab"[i] : "", options),
  );
  return assembleFigure(
    {
      key: "isotropy",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: made.map(({ panel }) => panel),
      decor: joinDecor(...made.map(({ decor }) => decor), legend(caseRows(cases), made[0].panel, options)),
      table: stationTable(cases, all, axis),
    },
    options,
  );
}
