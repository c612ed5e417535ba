import type { FigureTable } from "../figures/figureSpec.ts";

/** The numbers behind a figure as CSV (RFC 4180), full precision; what is missing is an empty field. */
export function figureCsv({ heading, rows }: FigureTable): string {
  return [heading, ...rows].map((row) => `${row.map(field).join(",")}\r\n`).join("");
}

function field(value: number | string | null): string {
  if (value === null) return "";
  if (typeof value === "number") return String(value);
  // A name must not become a formula where the file is opened as a spreadsheet.
  const plain = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(plain) ? `"${plain.replaceAll('"', '""')}"` : plain;
}
