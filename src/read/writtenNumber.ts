/**
 * A number as people write it in a comment, with a point or a comma before its decimals: the source of a regular
 * expression. It never takes the first half of one: `0,2` is not 0, and `1.2.3` is no number.
 */
export const writtenNumber = "[+-]?(?:\\d+(?:\\.\\d*|,\\d+)?|[.,]\\d+)(?:[eE][+-]?\\d+)?(?![.,]?\\d)";

/**
 * The value of such a number; null for `10,000`, which is ten or ten thousand.
 * @param text what the expression found
 */
export function valueOfWritten(text: string): number | null {
  if (/^[+-]?0*[1-9]\d*,\d{3}$/.test(text)) return null;
  return Number(text.replace(",", "."));
}
