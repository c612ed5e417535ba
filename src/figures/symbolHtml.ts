import type { Run } from "../core/catalogue.ts";

const escapes: Readonly<Record<string, string>> = { "&": "&amp;", "<": "&lt;", ">": "&gt;" };

/** Text as a figure may hold it: names of cases are not markup. */
export function escapeText(text: string): string {
  return text.replace(/[&<>]/g, (sign) => escapes[sign]);
}

/** A symbol in the few tags that a figure's text knows: italics, lowered and raised. */
export function symbolHtml(runs: readonly Run[]): string {
  return runs
    .map(({ text, upright, place }) => {
      const body = upright ? escapeText(text) : `<i>${escapeText(text)}</i>`;
      return place === undefined ? body : `<${place}>${body}</${place}>`;
    })
    .join("");
}
