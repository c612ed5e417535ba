import type { Annotations, Data, Shape } from "plotly.js";
import { isNotHeld } from "../core/decay/notHeld.ts";
import type { Criterion } from "../core/decayArgument.ts";
import { symbolRuns } from "../core/symbolRuns.ts";
import { arguedOf } from "./arguedOf.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { streamwiseRange } from "./axisRange.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { pageNote } from "./pageNote.ts";
import { pageLine } from "./pageShapes.ts";
import { joinDecor, linearAxis, type Panel } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, loneMarker } from "./stationTrace.ts";
import { commonAxis, streamwise, streamwiseTitle } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

const rowMm = 3.6;
const [leftMm, rightMm, topMm, bottomMm] = [25, 2.2, 2.4, 10.2];
const readings = ["notContradicted", "inside"] as const;
type Reading = (typeof readings)[number];

/** What is asked, in a word or two: the caption and the table say it in full. */
const shortWords: Readonly<Record<string, string>> = {
  isotropy_uv: 'u′/v′ "near one"',
  isotropy_uv_settled: 'u′/v′ "settled"',
  isotropy_uw: 'u′/w′ "near one"',
  isotropy_uw_settled: 'u′/w′ "settled"',
  S_dudx: 'S "skewed"',
  balance: '"balance"',
  window: '"law holds"',
};

/** One line of the figure: a criterion in a case. */
interface Line {
  readonly of: FigureCase;
  readonly criterion: Criterion;
  /** From the top, rows; the middle of the line. */
  readonly row: number;
}

/** From where each criterion of a developed flow holds, a line a case, in both readings with their intervals. */
export function developmentFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const shown = cases.filter((of) => criteriaOf(of).length > 0);
  const axis = commonAxis(shown, options.axis);
  const keys = [...new Set(shown.flatMap((of) => criteriaOf(of).map(({ key }) => key)))];
  const perKey = shown.length + 0.6;
  const lines = keys.flatMap((key, k) =>
    shown.flatMap((of, i): Line[] => {
      const criterion = criteriaOf(of).find((each) => each.key === key);
      return criterion === undefined ? [] : [{ of, criterion, row: k * perKey + 0.3 + i + 0.5 }];
    }),
  );
  const rows = Math.max(keys.length * perKey, 1);
  const heightMm = rows * rowMm + topMm + bottomMm;
  const at = (of: FigureCase, x: number | null) => (x === null ? null : streamwise(of, x, axis));
  const range = streamwiseRange(shown.flatMap((of) => of.stations.map(({ x }) => at(of, x))));
  const panel: Panel = {
    box: { left: leftMm, right: options.widthMm - rightMm, bottom: bottomMm, top: heightMm - topMm },
    x: linearAxis(range, streamwiseTitle(shown, axis, options)),
    y: {
      log: false,
      range: [rows, 0],
      ticks: { major: [], text: [], minor: [] },
      title: "",
      labels: false,
      mirrored: true,
    },
    traces: lines.flatMap((line) => lineTraces(line, at, range[1], options)),
    letter: "",
  };
  const top = panel.box.top;
  return assembleFigure(
    {
      key: "development",
      widthMm: options.widthMm,
      heightMm,
      panels: [panel],
      decor: joinDecor({
        shapes: ruleShapes(keys.length, perKey, panel, options),
        notes: [
          ...keys.map((key, k) => nameNote(key, top - (k + 0.5) * perKey * rowMm, panel, options)),
          ...lines.flatMap((line) => noneNotes(line, panel, options)),
        ],
      }),
      table: developmentTable(shown),
    },
    options,
  );
}

function criteriaOf(of: FigureCase): readonly Criterion[] {
  return arguedOf(of)?.argument.development.criteria ?? [];
}

/** The stretch between the readings, the interval of each just above and below it (open: to the edge), and their markers. */
function lineTraces(
  { of, criterion, row }: Line,
  at: (of: FigureCase, x: number | null) => number | null,
  never: number,
  options: FigureOptions,
): Partial<Data>[] {
  const found = readings.map((reading) => {
    const { value, low, high } = endsOf(criterion[reading]);
    return { reading, value: at(of, value), low: at(of, low), high: at(of, high) };
  });
  const values = found.flatMap(({ value }) => value ?? []);
  const thin = { weightPt: 0.6, dashed: false };
  return [
    ...(values.length < 2
      ? []
      : [caseLine(values, [row, row], of.mark, options, { weightPt: 0.95, dashed: true })]),
    ...found.flatMap(({ reading, low, high }) => {
      if (low === null || low === high) return [];
      const beside = row + (reading === "inside" ? 0.22 : -0.22);
      return [caseLine([low, high ?? never], [beside, beside], of.mark, options, thin)];
    }),
    ...found.flatMap(({ reading, value }) =>
      value === null ? [] : [marker(value, row, of, reading, options)],
    ),
  ];
}

/** Open: no interval contradicts it; filled: every interval lies inside. */
function marker(
  x: number,
  y: number,
  { mark, name }: FigureCase,
  reading: Reading,
  options: FigureOptions,
): Partial<Data> {
  const full = loneMarker({ x, y }, mark, options, reading === "inside" ? 1.5 : 2);
  const look = "marker" in full ? full.marker : {};
  return {
    ...full,
    name,
    marker: reading === "inside" ? look : { ...look, color: options.tokens.paper },
  } as Partial<Data>;
}

function ruleShapes(keys: number, perKey: number, { box }: Panel, options: FigureOptions): Partial<Shape>[] {
  const line = { color: options.tokens.rule, width: drawingOf(options).pt(0.5) };
  return Array.from({ length: Math.max(keys - 1, 0) }, (_, k) => {
    const y = box.top - (k + 1) * perKey * rowMm;
    return pageLine([0, y], [box.right, y], line);
  });
}

function nameNote(key: string, y: number, { box }: Panel, options: FigureOptions): Partial<Annotations> {
  const { numeral } = drawingOf(options);
  const words = shortWords[key];
  const text = words === undefined ? key : symbolHtml(symbolRuns(words));
  return pageNote(text, box.left - 2, y, { xanchor: "right", yanchor: "middle", font: numeral });
}

/** A reading that has no place is said in its line. */
function noneNotes({ criterion, row }: Line, panel: Panel, options: FigureOptions): Partial<Annotations>[] {
  const { numeral } = drawingOf(options);
  const { notContradicted, inside } = criterion;
  const text =
    notContradicted.value === null
      ? isNotHeld(notContradicted)
        ? "not held"
        : "not judged"
      : inside.value === null
        ? "open to the last station"
        : "";
  if (text === "") return [];
  const y = panel.box.top - row * rowMm;
  const look = { yanchor: "middle", font: { ...numeral, color: options.tokens.ink2 } } as const;
  return [
    notContradicted.value === null
      ? pageNote(text, panel.box.left + 1.6, y, { ...look, xanchor: "left" })
      : pageNote(text, panel.box.right - 1.6, y, { ...look, xanchor: "right" }),
  ];
}

function developmentTable(cases: readonly FigureCase[]): FigureTable {
  const columns = readings.flatMap((reading) => {
    const name = reading === "inside" ? "inside" : "not_contradicted";
    return [`x_${name}`, `x_${name}_low`, `x_${name}_high`];
  });
  return {
    heading: ["case", "criterion", "tolerance", ...columns, "reference_length", "L11_inflow", "why"],
    rows: cases.flatMap((of) => {
      const development = arguedOf(of)?.argument.development;
      if (development === undefined) return [];
      const { tolerance, criteria, length, inflowL11 } = development;
      return criteria.map((criterion) => [
        ...[of.name, criterion.key, tolerance],
        ...readings.flatMap((reading) => {
          const { value, low, high } = endsOf(criterion[reading]);
          return [value, low, high];
        }),
        ...[
          length,
          inflowL11.value,
          criterion.notContradicted.value === null ? criterion.notContradicted.why : null,
        ],
      ]);
    }),
  };
}
