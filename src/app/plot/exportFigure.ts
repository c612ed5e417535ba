import type { Data } from "plotly.js";
import type { FigureSpec } from "../../figures/figureSpec.ts";
import { embeddedFonts } from "./embeddedFonts.ts";
import { loadPlotly } from "./loadPlotly.ts";
import { plotConfig } from "./plotConfig.ts";
import { withResolution } from "./pngResolution.ts";
import { readyFonts } from "./readyFonts.ts";

const mmPerInch = 25.4;

/**
 * A figure as SVG text, of its printed size in mm and with its fonts inside.
 * @param spec made with the print tokens: the file has a white ground whatever the page's colours
 */
export async function figureSvg(spec: FigureSpec): Promise<string> {
  const [Plotly] = await Promise.all([loadPlotly(), readyFonts()]);
  const { width = 0, height = 0 } = spec.layout;
  const figure = {
    data: [...spec.traces] as Data[],
    layout: spec.layout,
    config: { ...plotConfig, staticPlot: true },
  };
  const address = await Plotly.toImage(figure, { format: "svg", width, height });
  const text = decodeURIComponent(address.slice(address.indexOf(",") + 1));
  const fonts = await embeddedFonts(text);
  return sized(text, spec).replace(/(<svg[^>]*>)/, `$1<style>${fonts}</style>`);
}

/** A figure as PNG at so many dots per inch of its printed width; the file says its resolution. */
export async function figurePng(spec: FigureSpec, dpi: 300 | 600): Promise<Blob> {
  const svg = await figureSvg(spec);
  const address = URL.createObjectURL(new Blob([svg], { type: "image/svg+xml" }));
  try {
    const image = new Image();
    image.src = address;
    await image.decode();
    const canvas = document.createElement("canvas");
    canvas.width = Math.round((spec.widthMm / mmPerInch) * dpi);
    canvas.height = Math.round((spec.heightMm / mmPerInch) * dpi);
    const context = canvas.getContext("2d");
    if (!context) throw new Error("this browser gives no canvas to draw on");
    context.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await withResolution(await pngOf(canvas), dpi);
  } finally {
    URL.revokeObjectURL(address);
  }
}

/** Width and height in mm; the drawing's own px stay as its view box. */
function sized(svg: string, { widthMm, heightMm, layout }: FigureSpec): string {
  return svg.replace(/<svg[^>]*>/, (open) => {
    const plain = open.replace(/ (width|height|viewBox)="[^"]*"/g, "");
    const box = `viewBox="0 0 ${layout.width} ${layout.height}"`;
    return plain.replace("<svg", `<svg width="${widthMm}mm" height="${heightMm}mm" ${box}`);
  });
}

function pngOf(canvas: HTMLCanvasElement): Promise<Blob> {
  return new Promise((resolve, reject) => {
    canvas.toBlob((blob) => {
      if (blob) resolve(blob);
      else reject(new Error("the picture is too large for this browser's canvas"));
    }, "image/png");
  });
}
