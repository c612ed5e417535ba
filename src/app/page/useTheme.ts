import { useEffect, useState } from "react";

export type Mode = "light" | "dark";
const key = "waneline-mode";

/** Light or dark: as the system asks until the reader chooses; the choice is kept. */
export function useTheme(): readonly [Mode, () => void] {
  const system = useMediaQuery("(prefers-color-scheme: dark)") ? "dark" : "light";
  const [chosen, choose] = useState<Mode | null>(readChoice);
  const mode = chosen ?? system;
  useEffect(() => {
    document.documentElement.dataset.theme = mode;
  }, [mode]);
  const toggle = () => {
    const next = mode === "dark" ? "light" : "dark";
    choose(next);
    try {
      localStorage.setItem(key, next);
    } catch {
      // a browser that keeps nothing still shows the mode for this visit
    }
  };
  return [mode, toggle];
}

/** Whether a media query holds, followed as it changes. */
export function useMediaQuery(query: string): boolean {
  const [holds, setHolds] = useState(() => matchMedia(query).matches);
  useEffect(() => {
    const list = matchMedia(query);
    const follow = () => setHolds(list.matches);
    follow();
    list.addEventListener("change", follow);
    return () => list.removeEventListener("change", follow);
  }, [query]);
  return holds;
}

function readChoice(): Mode | null {
  try {
    const kept = localStorage.getItem(key);
    return kept === "light" || kept === "dark" ? kept : null;
  } catch {
    return null;
  }
}
