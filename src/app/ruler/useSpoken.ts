import { useCallback, useEffect, useRef, useState } from "react";

/** Ms after the last change before it is spoken. */
const pause = 400;

/**
 * Text of the ruler's one live region. `say` is called at each change and speaks once, when nothing has changed
 * for 400 ms; `text` returns null while the numbers are still being made, and is asked again.
 */
export function useSpoken(text: (caseId: string) => string | null) {
  const [spoken, setSpoken] = useState("");
  const timer = useRef<number | undefined>(undefined);
  const say = useCallback(
    (caseId: string) => {
      window.clearTimeout(timer.current);
      const speak = () => {
        const now = text(caseId);
        if (now === null) timer.current = window.setTimeout(speak, pause);
        else setSpoken(now);
      };
      timer.current = window.setTimeout(speak, pause);
    },
    [text],
  );
  useEffect(() => () => window.clearTimeout(timer.current), []);
  return { spoken, say };
}
