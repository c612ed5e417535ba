import { useState } from "react";

/** The value as it is while things are settled; the last such one while they are not. */
export function useSettled<T>(value: T, settled: boolean): T {
  const [kept, keep] = useState(value);
  if (settled && kept !== value) keep(value);
  return settled ? value : kept;
}
