import { type RefObject, useEffect } from "react";

/** Tells the style how high the fixed head is, so that a link to a section does not end under it. */
export function useHeadHeight(head: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    const element = head.current;
    if (!element || typeof ResizeObserver === "undefined") return;
    const observer = new ResizeObserver(() => {
      document.documentElement.style.setProperty(
        "--head-height",
        `${element.offsetHeight + Math.min(0, Number.parseFloat(getComputedStyle(element).top) || 0)}px`,
      );
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [head]);
}
