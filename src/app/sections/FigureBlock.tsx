import { type ReactNode, useDeferredValue, useMemo } from "react";
import type { FigureOptions, FigureSpec } from "../../figures/figureSpec.ts";
import { useFigureSettings } from "../page/figureSettings.ts";
import { Plot } from "../plot/Plot.tsx";
import { FigureSave } from "./FigureSave.tsx";

/** A figure, its caption, and what can be taken from it. */
export function FigureBlock({
  name,
  title,
  widthMm,
  build,
  caption,
}: {
  /** "Figure 1". */
  name: string;
  /** What it shows, in a few words. */
  title: string;
  widthMm: 86 | 178;
  build: (options: FigureOptions) => FigureSpec;
  caption: ReactNode;
}) {
  const settings = useFigureSettings();
  // sentences and readings come first: the figure is built in a pass of its own behind them
  const drawn = useDeferredValue(build);
  const figure = useMemo(
    () => drawn({ ...settings, widthMm: settings.stacked ? 86 : widthMm }),
    [drawn, settings, widthMm],
  );
  return (
    <div className="figure-block">
      <div className="figure-frame">
        <Plot figure={figure} label={`${name}. ${title}`} />
      </div>
      <div className="figure-foot">
        <p className="caption">
          <b>{name}</b> {caption}
        </p>
        <FigureSave name={name} widthMm={widthMm} build={build} />
      </div>
    </div>
  );
}
