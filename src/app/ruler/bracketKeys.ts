import { type Edge, edgeRange, edgeStation, moveEdge, type StationWindow } from "./snapWindow.ts";

export type BracketMove =
  | { readonly kind: "move"; readonly window: StationWindow }
  | { readonly kind: "automatic" }
  | { readonly kind: "back" };

/**
 * What a key does to a bracket: arrows one station, with Shift five, Home and End as far as it may go,
 * A to automatic, Escape back. Null: the key is none of the bracket's.
 */
export function bracketKeys(
  stations: readonly number[],
  window: StationWindow,
  edge: Edge,
  key: string,
  shift: boolean,
): BracketMove | null {
  const at = edgeStation(stations, window, edge);
  const [least, most] = edgeRange(stations, window, edge);
  const to = (station: number): BracketMove => ({
    kind: "move",
    window: moveEdge(stations, window, edge, station),
  });
  const step = shift ? 5 : 1;
  switch (key) {
    case "ArrowLeft":
    case "ArrowDown":
      return to(at - step);
    case "ArrowRight":
    case "ArrowUp":
      return to(at + step);
    case "PageDown":
      return to(at - 5);
    case "PageUp":
      return to(at + 5);
    case "Home":
      return to(least);
    case "End":
      return to(most);
    case "a":
    case "A":
      return { kind: "automatic" };
    case "Escape":
      return { kind: "back" };
    default:
      return null;
  }
}
