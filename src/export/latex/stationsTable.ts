import { labelOf } from "../../core/catalogue.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatPosition } from "../../figures/formatNumber.ts";
import { type StationColumn, stationColumn, tableKeys } from "../stationColumns.ts";
import type { TableSettings } from "../stationsCsv.ts";
import { texSymbol, texText } from "./texText.ts";

/**
 * The stations of one case as a LaTeX table (package booktabs): a row each, in order of x; value and half of the 95 %
 * interval of a quantity are set around one sign, with the same decimals throughout a column.
 * @param name     of the case
 * @param stations in order of x
 * @param window   first and last x of the fit; rows outside are said to be so in the caption's note
 * @returns        a `table` environment that compiles by itself in a document
 */
export function stationsTable(
  name: string,
  stations: readonly StationResult[],
  settings: TableSettings,
  window: readonly [number, number] | null,
): string {
  const place = settings.along === "t" ? "t" : "x";
  const placeUnit = unitOf(settings.along === "t" ? "T" : "L", settings.units);
  const columns = tableKeys
    .map((key) => stationColumn(stations, key, settings.units))
    .filter(({ why }) => why === null);
  const outside = ({ x }: StationResult) => window !== null && (x < window[0] || x > window[1]);
  const rows = stations.map((station, i) => {
    const at = `${texText(formatPosition(station.x))}${outside(station) ? "\\rlap{$^{*}$}" : ""}`;
    return `${[at, ...columns.map((column) => cells(column, i))].join(" & ")} \\\\`;
  });
  return [
    "% needs \\usepackage{booktabs}",
    "\\begin{table}",
    "\\centering\\footnotesize\\setlength{\\tabcolsep}{2.5pt}",
    `\\caption{Turbulence of ${texText(name)} along the stream. Half-widths of 95\\,\\% intervals after $\\pm$${
      stations.some(outside) ? "; $^{*}$ outside the fit window" : ""
    }.}`,
    `\\begin{tabular}{r${columns.map(() => "r@{$\\,\\pm\\,$}l").join("")}}`,
    "\\toprule",
    `${[`$${place}$${inBrackets(placeUnit)}`, ...columns.map(head)].join(" & ")} \\\\`,
    "\\midrule",
    ...rows,
    "\\bottomrule",
    "\\end{tabular}",
    "\\end{table}",
    "",
  ].join("\n");
}

function head({ key, unit }: StationColumn): string {
  return `\\multicolumn{2}{c}{${texSymbol(labelOf(key).symbol)}${inBrackets(unit)}}`;
}

const inBrackets = (unit: string) => (unit === "" ? "" : ` [${texText(unit)}]`);

function cells({ cells: all }: StationColumn, row: number): string {
  const { value, error } = all[row];
  if (error === null || !error.startsWith("±")) return `\\multicolumn{2}{c}{${texText(value)}}`;
  return `${texText(value)} & ${texText(error.replace(/^±\s*/, ""))}`;
}
