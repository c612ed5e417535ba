import { type Missing, missing, type Quantity } from "../quantity.ts";

const opening = "not held at the";

/** Why a criterion has no place: the station that it must hold at does not hold it. */
export function notHeld(end: "first" | "last"): Missing {
  return missing(`${opening} ${end} station that carries it`);
}

/** Whether a criterion could be judged and is not met, rather than not judged at all. */
export function isNotHeld(place: Quantity): boolean {
  return place.value === null && place.why.startsWith(opening);
}
