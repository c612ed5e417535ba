import { figureCsv } from "../../export/figureCsv.ts";
import type { ArchiveFile } from "../../export/zipFiles.ts";
import { figurePng, figureSvg } from "../plot/exportFigure.ts";
import { shelvedFigures } from "./figureShelf.ts";

/** Dots per inch of the pictures in an archive: a figure of 178 mm is then some 2100 px wide. */
const dpi = 300;

/** Every figure that stands on the page, for print: SVG, PNG and the numbers behind it. */
export async function figureFiles(): Promise<ArchiveFile[]> {
  const files: ArchiveFile[] = [];
  // one after the other: each is drawn on its own
  for (const { name, printed } of shelvedFigures()) {
    const figure = printed();
    const path = `figures/${name.toLowerCase().replaceAll(" ", "-")}-${figure.key}`;
    const picture = new Uint8Array(await (await figurePng(figure, dpi)).arrayBuffer());
    files.push(
      { path: `${path}.svg`, content: await figureSvg(figure) },
      { path: `${path}.png`, content: picture },
      { path: `${path}.csv`, content: figureCsv(figure.table) },
    );
  }
  return files;
}
