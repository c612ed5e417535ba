/**
 * Large arrays, lent and given back: the first touch of fresh memory costs more than the reading of what goes
 * into it. Nothing depends on what an array held before.
 */
const idle: Float64Array[] = [];
const mostIdle = 8;

/** An array of at least `length` numbers; what is in it is left over from earlier use. */
export function borrowColumn(length: number): Float64Array {
  let best = -1;
  for (let i = 0; i < idle.length; i++) {
    if (idle[i].length >= length && (best < 0 || idle[i].length < idle[best].length)) best = i;
  }
  if (best < 0) return new Float64Array(length);
  return idle.splice(best, 1)[0];
}

export function returnColumn(column: Float64Array): void {
  idle.push(column);
  if (idle.length <= mostIdle) return;
  // the smallest is the cheapest to make anew
  let least = 0;
  for (let i = 1; i < idle.length; i++) if (idle[i].length < idle[least].length) least = i;
  idle.splice(least, 1);
}
