import { useSyncExternalStore } from "react";

/** Width of the page inside the window, px, without a scroll bar. */
export function useWindowWidth(): number {
  return useSyncExternalStore(subscribe, () => document.documentElement.clientWidth);
}

function subscribe(changed: () => void): () => void {
  addEventListener("resize", changed);
  return () => removeEventListener("resize", changed);
}
