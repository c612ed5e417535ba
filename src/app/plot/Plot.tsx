import type { Data } from "plotly.js";
import { useEffect, useRef, useState } from "react";
import type { FigureSpec } from "../../figures/figureSpec.ts";
import { dropDraw, queueDraw } from "./drawQueue.ts";
import { loadPlotly } from "./loadPlotly.ts";
import { plotConfig } from "./plotConfig.ts";
import { readyFonts } from "./readyFonts.ts";
import { useNearView } from "./useNearView.ts";

/** Figures away from the screen are drawn when nothing has changed for this long, ms. */
const restMs = 600;

export interface PlotProps {
  readonly figure: FigureSpec;
  /** Names the figure where it does not stand inside one that is named already. */
  readonly label?: string;
  readonly onReady?: () => void;
}

/** A figure: its place is reserved at once, its drawing follows when it comes near the screen. */
export function Plot({ figure, label, onReady }: PlotProps) {
  const host = useRef<HTMLDivElement>(null);
  const drawn = useRef<FigureSpec>(null);
  const near = useNearView(host);
  const [failed, setFailed] = useState(false);

  useEffect(() => {
    const element = host.current;
    if (!element || drawn.current === figure) return;
    let live = true;
    const draw = async () => {
      try {
        const [Plotly] = await Promise.all([loadPlotly(), readyFonts()]);
        if (!live || !element.isConnected) return;
        await Plotly.react(element, [...figure.traces] as Data[], figure.layout, plotConfig);
        drawn.current = figure;
        setFailed(false);
        onReady?.();
      } catch {
        if (live) setFailed(true);
      }
    };
    const timer = near ? undefined : setTimeout(() => queueDraw(element, draw), restMs);
    if (near) queueDraw(element, draw);
    // paper has no scrolling: what was not drawn yet is drawn before the page is set
    const print = () => {
      clearTimeout(timer);
      dropDraw(element);
      void draw();
    };
    window.addEventListener("beforeprint", print);
    return () => {
      live = false;
      window.removeEventListener("beforeprint", print);
      clearTimeout(timer);
      dropDraw(element);
    };
  }, [figure, near, onReady]);

  useEffect(() => {
    const element = host.current;
    // In development an effect is undone and redone at once: only what has left the page is cleared.
    return () => {
      queueMicrotask(() => {
        if (element && !element.isConnected) void loadPlotly().then((Plotly) => Plotly.purge(element));
      });
    };
  }, []);

  const { width, height } = figure.layout;
  const body = (
    <>
      {failed && <p>The part of the page that draws could not be loaded. Reload the page to try again.</p>}
      <div ref={host} style={{ width, height }} />
    </>
  );
  const frame = { className: "plot", style: { width, height, margin: 0 }, "data-figure": figure.key };
  return label === undefined ? (
    <div {...frame}>{body}</div>
  ) : (
    <figure {...frame} aria-label={label}>
      {body}
    </figure>
  );
}
