import type { Comparison } from "../../core/comparison.ts";
import { isEstimate, type Quantity, scaled } from "../../core/quantity.ts";
import { about } from "./about.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, coordinate, lengthValue, position, symbolOf, valueWithInterval } from "./shownValue.ts";
import { chained, reason } from "./words.ts";

/**
 * How far the second case's origin lies from that of the first, and beside it how far apart the two stand at equal
 * intensity: both tell the stream that one of them needs more, each in its own way.
 */
export function distanceSentences(
  { extra_distance, matched_distance, matched }: Comparison,
  [first, second]: readonly [SentenceCase, SentenceCase],
): Sentence[] {
  const later = first.along === "t";
  const origin = distancePart(
    "extra_distance",
    extra_distance,
    second,
    later,
    (size, where) => say`the origin of ${caseOf(second)} lies ${size} ${where} than that of ${caseOf(first)}`,
  );
  const [at] = matched.x;
  const where = isEstimate(at)
    ? say`${coordinate(first)} = ${position(Number(at.value.toPrecision(3)), first)}`
    : [];
  const apart = distancePart(
    "matched_distance",
    matched_distance,
    second,
    later,
    (size, far) =>
      say`where ${caseOf(first)} has ${symbolOf("Tu")} = ${valueWithInterval(matched.Tu, "Tu", first.units)}, at ${where}, ${caseOf(second)} has the same ${size} ${far}`,
  );
  const parts = [...origin, ...apart];
  const none =
    matched_distance.value === null && origin.length > 0
      ? [say`No place of equal intensity is given: ${reason(matched_distance.why)}.`]
      : [];
  return parts.length === 0 ? none : [opened(chained(parts)), ...none];
}

/** A signed distance as a size and a direction; where its interval holds zero, that is said. */
function distancePart(
  key: string,
  distance: Quantity,
  of: SentenceCase,
  later: boolean,
  part: (size: Sentence, where: string) => Sentence,
): Sentence[] {
  if (!isEstimate(distance)) return [];
  const before = distance.value < 0;
  const size = about(lengthValue(scaled(distance, before ? -1 : 1), of), key, distance);
  const { low, high } = distance;
  const open = low !== null && high !== null && low < 0 && high > 0;
  const words = later ? ["earlier", "later"] : ["further upstream", "further downstream"];
  const text = part(size, before ? words[0] : words[1]);
  return [open ? say`${text} (no shift is not excluded either)` : text];
}

/** The first letter raised, a full stop at the end. */
function opened(sentence: Sentence): Sentence {
  const [start, ...rest] = sentence;
  const raised =
    start?.kind === "text"
      ? { ...start, text: start.text.charAt(0).toUpperCase() + start.text.slice(1) }
      : start;
  return say`${[raised, ...rest]}.`;
}
