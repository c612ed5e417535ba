import { useEffect, useLayoutEffect, useRef, useState } from "react";
import type { LaneMap } from "./rulerScale.ts";

const duration = 180;
type Maps = readonly (LaneMap | null)[];

/**
 * Lane maps as they are drawn: when `key` changes the lanes slide to their new places in 180 ms, easing out;
 * every other change is taken over at once, as is any where motion is not wanted.
 */
export function useSlide(maps: Maps, key: string, still: boolean): Maps {
  const shown = useRef(maps);
  const from = useRef<Maps>(maps);
  const keyBefore = useRef(key);
  const [share, setShare] = useState(1);
  // A render with a new key still draws the old places; the slide begins in the effect below.
  const pending = keyBefore.current !== key && !still;
  const drawn = pending ? shown.current : share < 1 ? between(from.current, maps, easeOut(share)) : maps;
  useLayoutEffect(() => {
    shown.current = drawn;
  });
  useLayoutEffect(() => {
    if (keyBefore.current === key) return;
    keyBefore.current = key;
    from.current = shown.current;
    setShare(still ? 1 : 0);
  }, [key, still]);
  const sliding = share < 1;
  // biome-ignore lint/correctness/useExhaustiveDependencies: a new key during a slide starts its clock anew
  useEffect(() => {
    if (!sliding) return;
    let frame = 0;
    const begun = performance.now();
    const step = (now: number) => {
      const next = Math.min(1, Math.max(0, now - begun) / duration);
      setShare(next);
      if (next < 1) frame = requestAnimationFrame(step);
    };
    frame = requestAnimationFrame(step);
    return () => cancelAnimationFrame(frame);
  }, [sliding, key]);
  return drawn;
}

const easeOut = (share: number) => 1 - (1 - share) ** 3;

function between(from: Maps, to: Maps, share: number): Maps {
  return to.map((end, i) => {
    const begin = from[i] ?? null;
    if (end === null || begin === null) return end;
    return {
      at: begin.at + (end.at - begin.at) * share,
      perX: begin.perX + (end.perX - begin.perX) * share,
    };
  });
}
