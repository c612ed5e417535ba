import type { FigureSpec } from "../../figures/figureSpec.ts";

/** A figure that stands on the page, and how it is made for print. */
export interface ShelvedFigure {
  /** "Figure 1". */
  readonly name: string;
  readonly printed: () => FigureSpec;
}

/** The figures that stand on the page just now; a fold that is closed holds none. */
const shelf = new Set<ShelvedFigure>();

/** Puts a figure with the others; the answer takes it away again. */
export function shelve(figure: ShelvedFigure): () => void {
  shelf.add(figure);
  return () => void shelf.delete(figure);
}

/** In the order of their numbers. */
export function shelvedFigures(): readonly ShelvedFigure[] {
  return [...shelf].sort((a, b) => a.name.localeCompare(b.name, "en", { numeric: true }));
}
