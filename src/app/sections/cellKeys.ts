import type { FocusEvent, KeyboardEvent } from "react";

const steps: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
};

/** Arrow keys go from number to number: the table is one stop of the Tab key. */
function walkCells(event: KeyboardEvent<HTMLTableElement>): void {
  const step = steps[event.key];
  const { target } = event;
  if (step === undefined || !(target instanceof HTMLElement)) return;
  const rows = [...event.currentTarget.querySelectorAll("tbody tr")].map((row) => [
    ...row.querySelectorAll<HTMLElement>("[data-cell]"),
  ]);
  const row = rows.findIndex((cells) => cells.includes(target));
  if (row < 0) return;
  const column = rows[row].indexOf(target);
  const next = rows[row + step[0]]?.[column + step[1]];
  if (next === undefined) return;
  event.preventDefault();
  next.focus();
}

/** The first number, or the one last reached, is where the Tab key comes in. */
function stayHere(event: FocusEvent<HTMLTableElement>): void {
  if (!(event.target instanceof HTMLElement) || !("cell" in event.target.dataset)) return;
  for (const cell of event.currentTarget.querySelectorAll<HTMLElement>("[data-cell]")) cell.tabIndex = -1;
  event.target.tabIndex = 0;
}

function enterAtFirst(table: HTMLTableElement | null): void {
  if (table?.querySelector('[data-cell][tabindex="0"]')) return;
  table?.querySelector("[data-cell]")?.setAttribute("tabindex", "0");
}

/** Properties of a table whose numbers are one stop of the Tab key, with the arrow keys between them. */
export const cellKeys = { onKeyDown: walkCells, onFocus: stayHere, ref: enterAtFirst };
