import { useCallback, useState } from "react";

/** Width of an element in px, followed as it changes; `initial` until it has been laid out. */
export function useWidth(initial: number): readonly [(element: HTMLElement | null) => () => void, number] {
  const [width, setWidth] = useState(initial);
  const follow = useCallback((element: HTMLElement | null) => {
    if (element === null) return () => {};
    const measure = () => setWidth((before) => Math.round(element.clientWidth) || before);
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [follow, width];
}
