export type OriginMove =
  | { readonly kind: "hold"; readonly x0: number }
  | { readonly kind: "free" }
  | { readonly kind: "back" };

export interface OriginPlace {
  readonly x0: number;
  /** ell, or where there is none a hundredth of the scale: what the steps are tenths of. */
  readonly length: number;
  /** The law needs its origin upstream of the first station it is fitted to. */
  readonly limit: number;
}

/**
 * What a key does to the flag: Enter holds it where it stands, arrows move it by 0.1 ell (with Shift 1 ell),
 * Delete frees it, Escape goes back. Null: the key is none of the flag's.
 */
export function originKeys(place: OriginPlace, key: string, shift: boolean): OriginMove | null {
  const step = shift ? 1 : 0.1;
  switch (key) {
    case "Enter":
      return { kind: "hold", x0: place.x0 };
    case "ArrowLeft":
    case "ArrowDown":
      return { kind: "hold", x0: originAt(place, place.x0 - step * place.length) };
    case "ArrowRight":
    case "ArrowUp":
      return { kind: "hold", x0: originAt(place, place.x0 + step * place.length) };
    case "Delete":
    case "Backspace":
      return { kind: "free" };
    case "Escape":
      return { kind: "back" };
    default:
      return null;
  }
}

/** The nearest tenth of ell that lies upstream of the limit. */
export function originAt({ length, limit }: OriginPlace, x0: number): number {
  const tenth = length / 10;
  const most = Math.ceil(limit / tenth - 1e-9) - 1;
  // Rounded to twelve digits: 32 tenths of 0.025 is 0.08, not 0.08000000000000002.
  return Number((Math.min(most, Math.round(x0 / tenth)) * tenth).toPrecision(12));
}
