import { formatCount } from "../../figures/formatNumber.ts";
import { type Piece, type Sentence, say } from "./piece.ts";

const small = ["no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten"];

/** Numbers of things up to ten in words. */
export function countWord(count: number): string {
  return small[count] ?? formatCount(count);
}

/** "one record", "four records"; the plural is given where it is not an s. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${countWord(count)} ${count === 1 ? one : many}`;
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** "a", "a and b", "a, b and c". */
export function listed(items: readonly (Piece | Sentence | string)[]): Sentence {
  return items.flatMap((item, i) => {
    const joint = i === 0 ? "" : i === items.length - 1 ? " and " : ", ";
    return say`${joint}${item}`;
  });
}

/** Parts of one sentence with semicolons between; the first letter is the caller's. */
export function chained(parts: readonly Sentence[]): Sentence {
  return parts.flatMap((part, i) => (i === 0 ? part : say`; ${part}`));
}

/** A reason as others wrote it, without a full stop at its end. */
export function reason(why: string): string {
  return why.replace(/\.\s*$/, "");
}
