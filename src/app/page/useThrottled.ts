import { useEffect, useRef, useState } from "react";

/**
 * A value that follows another at most once in `pause` milliseconds: at once after a rest, and always
 * up to the last change.
 */
export function useThrottled<T>(value: T, pause: number): T {
  const [shown, show] = useState(value);
  const last = useRef(0);
  useEffect(() => {
    const since = performance.now() - last.current;
    const timer = setTimeout(
      () => {
        last.current = performance.now();
        show(value);
      },
      Math.max(0, pause - since),
    );
    return () => clearTimeout(timer);
  }, [value, pause]);
  return shown;
}
