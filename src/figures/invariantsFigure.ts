import { labelOf } from "../core/catalogue.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { placeCells } from "./cells.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions, FigureSpec } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { pageLine } from "./pageShapes.ts";
import { joinDecor, linearAxis, type Panel, placeX, placeY } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { type PlottedPoint, stationTrace } from "./stationTrace.ts";
import { symbolHtml } from "./symbolHtml.ts";
import { isUsed } from "./windowOf.ts";

/** Two-component turbulence, the upper side of what can be: η² = 1/27 + 2 ξ³, from ξ = −1/6 to 1/3. */
const twoComponents = (xi: number) => Math.sqrt(1 / 27 + 2 * xi ** 3);
const [disc, rod] = [-1 / 6, 1 / 3];
const sides = 40;

/**
 * Where each station's stress tensor lies among all that can be: its invariants inside the two axisymmetric sides,
 * η = ξ and η = −ξ, and the two-component one. Isotropic turbulence is the lower corner.
 * @see Pope (2000), ch. 11
 */
export function invariantsFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const cells = placeCells(1, 66, { ...options, widthMm: 86 });
  const points = cases.map(pointsOf);
  const reach = Math.max(0.02, ...points.flat().flatMap(({ y, x }) => [y ?? 0, Math.abs(x ?? 0)]));
  // near isotropy the whole triangle would hide the stations in its corner
  const whole = reach > 0.12;
  const top = whole ? 0.36 : 1.25 * reach;
  const panel: Panel = {
    box: cells.boxes[0],
    x: linearAxis(whole ? [-0.2, 0.36] : [-top, top], symbolHtml(labelOf("anisotropy_xi").symbol)),
    y: linearAxis([0, top], symbolHtml(labelOf("anisotropy_eta").symbol)),
    traces: cases.map((of, i) => stationTrace(points[i], of.mark, of.name, options)),
    letter: "",
  };
  return assembleFigure(
    {
      key: "invariants",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [panel],
      decor: joinDecor({ shapes: boundary(panel, options) }, legend(caseRows(cases), panel, options)),
      table: {
        heading: ["case", "x", "anisotropy_xi", "anisotropy_eta"],
        rows: cases.flatMap((of, i) => points[i].map(({ station, x, y }) => [of.name, station, x, y])),
      },
    },
    options,
  );
}

function pointsOf(of: FigureCase): PlottedPoint[] {
  return of.stations.flatMap(({ x, routes }) => {
    const { anisotropy_xi: xi, anisotropy_eta: eta } = routes;
    if (xi === undefined || eta === undefined) return [];
    const { value, low, high } = endsOf(eta);
    return [{ x: xi.value, y: value, low, high, used: isUsed(of, x), station: x }];
  });
}

/** The three sides as far as the frame shows them. */
function boundary(panel: Panel, options: FigureOptions) {
  const { pt } = drawingOf(options);
  const line = { color: options.tokens.ink2, width: pt(0.5) };
  const top = panel.y.range[1];
  const upper = Array.from({ length: sides + 1 }, (_, i) => disc + ((rod - disc) * i) / sides);
  const corners: (readonly [number, number])[][] = [
    [
      [0, 0],
      [Math.min(rod, top), Math.min(rod, top)],
    ],
    [
      [0, 0],
      [Math.max(disc, -top), Math.min(-disc, top)],
    ],
    upper.map((xi) => [xi, twoComponents(xi)] as const).filter(([, eta]) => eta <= top),
  ];
  return corners.flatMap((side) =>
    side.slice(1).map((to, i) => {
      const [from, end] = [side[i], to].map(([x, y]) => [placeX(panel, x), placeY(panel, y)] as const);
      return pageLine(from, end, line);
    }),
  );
}
