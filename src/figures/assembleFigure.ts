import type { Annotations, Data, Layout, LayoutAxis } from "plotly.js";
import { type Drawing, drawingOf } from "./drawing.ts";
import type { FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { letterCorner } from "./letterCorner.ts";
import { pageNote } from "./pageNote.ts";
import type { Decor, Panel, PanelAxis } from "./panel.ts";

export interface FigureParts {
  readonly key: string;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly panels: readonly Panel[];
  readonly decor: Decor;
  readonly table: FigureTable;
}

/** From the frame to the middle of the title below it, mm. */
const titleBelow = 7.2;

/**
 * Panels and what stands around them as one description. The first pair of axes is the page itself, in mm,
 * so that titles, legends and second scales are placed as on paper; each panel has a pair of its own.
 */
export function assembleFigure(parts: FigureParts, options: FigureOptions): FigureSpec {
  const { key, widthMm, panels, decor, table } = parts;
  const below = decor.belowMm ?? 0;
  const heightMm = parts.heightMm + below;
  const drawing = drawingOf(options);
  const { mm } = drawing;
  const page = { fixedrange: true, visible: false, autorange: false } as const;
  const layout: Partial<Layout> = {
    width: mm(widthMm),
    height: mm(heightMm),
    margin: { l: 0, r: 0, t: 0, b: 0, pad: 0 },
    paper_bgcolor: options.tokens.paper,
    plot_bgcolor: "rgba(0,0,0,0)",
    showlegend: false,
    hovermode: "closest",
    dragmode: false,
    font: drawing.numeral,
    xaxis: { ...page, domain: [0, 1], range: [0, widthMm] },
    yaxis: { ...page, domain: [0, 1], range: [-below, parts.heightMm] },
    shapes: [...decor.shapes],
    annotations: [
      ...decor.notes,
      ...panels.flatMap((panel) => panelNotes(panel, titleLeft(panel, panels), drawing)),
    ],
  };
  panels.forEach(({ box, x, y }, i) => {
    const across: [number, number] = [box.left / widthMm, box.right / widthMm];
    const up: [number, number] = [(box.bottom + below) / heightMm, (box.top + below) / heightMm];
    Object.assign(layout, {
      [`xaxis${i + 2}`]: { ...axisLayout(x, drawing), domain: across, anchor: `y${i + 2}` },
      [`yaxis${i + 2}`]: { ...axisLayout(y, drawing), domain: up, anchor: `x${i + 2}` },
    });
  });
  const traces: Partial<Data>[] = [
    ...panels.flatMap((panel, i) =>
      panel.traces.map((trace) => ({ ...trace, xaxis: `x${i + 2}`, yaxis: `y${i + 2}` })),
    ),
    ...decor.traces,
  ];
  return { key, widthMm, heightMm, traces, layout, table };
}

function axisLayout(axis: PanelAxis, { mm, pt, numeral }: Drawing): Partial<LayoutAxis> {
  const line = { linecolor: numeral.color, linewidth: pt(0.5), tickcolor: numeral.color, tickwidth: pt(0.5) };
  const minor = { ticks: "inside", tickmode: "array", tickvals: [...axis.ticks.minor], ticklen: mm(0.7) };
  return {
    ...line,
    type: axis.log ? "log" : "linear",
    range: axis.log ? axis.range.map(Math.log10) : [...axis.range],
    autorange: false,
    fixedrange: true,
    showgrid: false,
    zeroline: false,
    showline: true,
    mirror: axis.mirrored ? "ticks" : true,
    ticks: "inside",
    ticklen: mm(1.2),
    tickmode: "array",
    tickvals: [...axis.ticks.major],
    ticktext: [...axis.ticks.text],
    tickangle: 0,
    tickfont: numeral,
    showticklabels: axis.labels,
    ticklabeloverflow: "allow", // else every label's box is measured at every drawing: a fifth of its time
    minor: { ...minor, tickcolor: numeral.color, tickwidth: pt(0.5) },
  } as Partial<LayoutAxis>;
}

/** Axis titles and the panel's letter. */
function panelNotes(panel: Panel, left: number, { symbol }: Drawing): Partial<Annotations>[] {
  const { box, x, y, letter } = panel;
  const notes: Partial<Annotations>[] = [];
  const middle = { xanchor: "center", yanchor: "middle", font: symbol } as const;
  if (x.title !== "")
    notes.push(pageNote(x.title, (box.left + box.right) / 2, box.bottom - titleBelow, middle));
  if (y.title !== "")
    notes.push(
      pageNote(y.title, box.left - left, (box.bottom + box.top) / 2, { ...middle, textangle: "-90" }),
    );
  if (letter !== "") {
    const corner = letterCorner(panel);
    notes.push(pageNote(`(<i>${letter}</i>)`, corner.x, corner.y, { ...middle, xanchor: "left" }));
  }
  return notes;
}

/** From the frame to the middle of the title at its left: clear of the widest number of all panels above one another. */
function titleLeft({ box }: Panel, panels: readonly Panel[]): number {
  const beside = panels.filter((panel) => panel.box.left === box.left && panel.y.labels);
  return 4.2 + Math.max(...beside.flatMap(({ y }) => y.ticks.text.map(tickWidth)), 0);
}

/** About the width of a tick's text, mm; raised digits are smaller. */
function tickWidth(text: string): number {
  const raised = /<sup>(.*)<\/sup>/.exec(text)?.[1].length ?? 0;
  return 1.35 * text.replace(/<sup>.*<\/sup>/, "").length + 0.95 * raised;
}
