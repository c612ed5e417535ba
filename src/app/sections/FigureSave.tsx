import { useEffect, useRef, useState } from "react";
import { figureCsv } from "../../export/figureCsv.ts";
import { defaultFigureOptions, type FigureOptions, type FigureSpec } from "../../figures/figureSpec.ts";
import { printTokens } from "../../figures/tokens.ts";
import { download } from "../page/download.ts";
import { useFigureSettings } from "../page/figureSettings.ts";
import { shelve } from "../page/figureShelf.ts";
import { figurePng, figureSvg } from "../plot/exportFigure.ts";

/** Dots per inch of a saved picture. */
const dpi = 600;

/** Takes a figure along: always in the print's colours and at its printed width, whatever the screen shows. */
export function FigureSave({
  name,
  widthMm,
  build,
}: {
  /** "Figure 1": what it is called among all figures of the page. */
  name: string;
  widthMm: 86 | 178;
  build: (options: FigureOptions) => FigureSpec;
}) {
  const { axis, units, tolerance, along } = useFigureSettings();
  const [failed, setFailed] = useState<string | null>(null);
  const printed = () =>
    build({ ...defaultFigureOptions, axis, units, tolerance, along, widthMm, tokens: printTokens });
  // the archive of everything takes the figure as it is then
  const latest = useRef(printed);
  latest.current = printed;
  useEffect(() => shelve({ name, printed: () => latest.current() }), [name]);
  const save = async (make: (figure: FigureSpec) => Promise<void> | void) => {
    try {
      await make(printed());
      setFailed(null);
    } catch (error) {
      setFailed(`The figure could not be saved: ${error instanceof Error ? error.message : error}.`);
    }
  };
  const svg = async (figure: FigureSpec) =>
    download(`waneline-${figure.key}.svg`, await figureSvg(figure), "image/svg+xml");
  const png = async (figure: FigureSpec) =>
    download(`waneline-${figure.key}.png`, await figurePng(figure, dpi));
  const csv = (figure: FigureSpec) =>
    download(`waneline-${figure.key}.csv`, figureCsv(figure.table), "text/csv");
  return (
    <div className="figure-actions">
      <span>{widthMm}&nbsp;mm</span>
      <SaveAction name="SVG" run={() => save(svg)} />
      <SaveAction name="PNG" run={() => save(png)} />
      <SaveAction name="CSV" run={() => save(csv)} />
      {failed !== null && <span role="alert">{failed}</span>}
    </div>
  );
}

function SaveAction({ name, run }: { name: string; run: () => Promise<void> }) {
  return (
    <button type="button" className="action" onClick={() => void run()}>
      {name}
    </button>
  );
}
