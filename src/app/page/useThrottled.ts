import { useEffect, useRef, useState } from "react";

/**
 * A value that follows another at most once in `pause` milliseconds: at once after a rest, and always
 * up to the last change. A change that comes while one waits takes its place and not its time.
 */
export function useThrottled<T>(value: T, pause: number): T {
  const [shown, show] = useState(value);
  const newest = useRef(value);
  const last = useRef(0);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => {
    newest.current = value;
    if (timer.current !== undefined) return;
    const since = performance.now() - last.current;
    timer.current = setTimeout(
      () => {
        timer.current = undefined;
        last.current = performance.now();
        show(newest.current);
      },
      Math.max(0, pause - since),
    );
  }, [value, pause]);
  useEffect(
    () => () => {
      clearTimeout(timer.current);
      timer.current = undefined;
    },
    [],
  );
  return shown;
}
