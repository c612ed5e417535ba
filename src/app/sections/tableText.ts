import type { FigureTable } from "../../figures/figureSpec.ts";

/** A figure's numbers as CSV: full precision, an empty cell where there is none, text quoted where it must be. */
export function tableText({ heading, rows }: FigureTable): string {
  const line = (cells: readonly (number | string | null)[]) => cells.map(cellText).join(",");
  return `${[heading, ...rows].map(line).join("\n")}\n`;
}

function cellText(cell: number | string | null): string {
  if (cell === null) return "";
  const text = String(cell);
  return /[",\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
