import { useCallback, useLayoutEffect, useRef } from "react";

/** The same function for the component's life, which always calls the latest one: keeps memoised lanes still. */
export function useStable<Args extends unknown[], Result>(
  latest: (...args: Args) => Result,
): (...args: Args) => Result {
  const current = useRef(latest);
  useLayoutEffect(() => {
    current.current = latest;
  });
  return useCallback((...args: Args) => current.current(...args), []);
}
