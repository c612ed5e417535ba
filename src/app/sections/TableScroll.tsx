import { type ReactNode, useEffect, useRef, useState } from "react";

/** A table that scrolls sideways where it must: then, and only then, it can be reached and moved by keys. */
export function TableScroll({ label, children }: { label: string; children: ReactNode }) {
  const box = useRef<HTMLElement>(null);
  const [wide, setWide] = useState(false);
  useEffect(() => {
    const element = box.current;
    if (!element || typeof ResizeObserver === "undefined") return;
    const observer = new ResizeObserver(() => setWide(element.scrollWidth > element.clientWidth + 1));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return (
    <section className="table-scroll" aria-label={label} ref={box} {...(wide ? { tabIndex: 0 } : {})}>
      {children}
    </section>
  );
}
