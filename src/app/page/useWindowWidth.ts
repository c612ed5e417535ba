import { useSyncExternalStore } from "react";

/** Measured when the window changes and not when it is asked for: asking would lay the page out anew. */
let width = 0;

const measured = () => document.documentElement.clientWidth;

/** Width of the page inside the window, px, without a scroll bar. */
export function useWindowWidth(): number {
  return useSyncExternalStore(subscribe, () => {
    if (width === 0) width = measured();
    return width;
  });
}

function subscribe(changed: () => void): () => void {
  const follow = () => {
    width = measured();
    changed();
  };
  addEventListener("resize", follow);
  return () => removeEventListener("resize", follow);
}
