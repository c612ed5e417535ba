import { mkdtempSync, readdirSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { strFromU8, unzipSync } from "fflate";
import Papa from "papaparse";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { writeSyntheticCase } from "../batch/syntheticCase.ts";
import { dropFiles } from "./dropFiles.ts";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { downloaded, picture, settled } from "./stories.ts";

const folder = join(mkdtempSync(join(tmpdir(), "waneline-take-")), "grid");
const stations = [0.2, 0.3, 0.45, 0.7, 1];
writeSyntheticCase(folder, { name: "grid", stations, samples: 6000, n: 1.25, x0: 0.05, seed: 7 });

let browser: Browser;
let open: OpenPage;
let files: Record<string, Uint8Array>;
beforeAll(async () => {
  browser = await launchBrowser();
  open = await openPage(browser);
  const { page } = open;
  await page.getByRole("button", { name: "Open the demo" }).waitFor();
  await dropFiles(
    page,
    readdirSync(folder).map((file) => ({
      path: `grid/${file}`,
      text: readFileSync(join(folder, file), "utf8"),
    })),
  );
  await settled(page);
  const field = page.getByLabel(/kinematic viscosity/).first();
  await field.fill("1.5e-5");
  await field.press("Enter");
  await settled(page);
  const { name, bytes } = await downloaded(page, () =>
    page.getByRole("button", { name: "Everything, zip" }).click(),
  );
  expect(name).toBe("waneline.zip");
  files = unzipSync(bytes);
  await picture(page, "table-and-methods-1440");
}, 180_000);
afterAll(() => browser.close());

const text = (name: string) => strFromU8(files[name] ?? new Uint8Array());

describe("the archive of everything", () => {
  it("holds tables, fits, methods, sources, sheet, results, the page and its figures", () => {
    const names = Object.keys(files);
    for (const name of [
      "grid.json",
      "grid-stations.csv",
      "grid-stations.tex",
      "fits.tex",
      "methods.txt",
      "sources.bib",
      "results.json",
      "page.workspace.json",
    ])
      expect(names).toContain(name);
    expect(names.filter((name) => /^figures\/figure-\d+.*\.svg$/.test(name)).length).toBeGreaterThanOrEqual(
      4,
    );
  });

  it("has the results' numbers in the table of stations", () => {
    const found = JSON.parse(text("results.json")).cases[0].stations;
    const { data } = Papa.parse<Record<string, string>>(text("grid-stations.csv").trimEnd(), {
      header: true,
    });
    expect(data.map((row) => Number(row["uu [m2/s2]"]))).toEqual(
      found.map(({ uu }: { uu: { value: number } }) => uu.value),
    );
  });

  it("has figures that are whole SVG of their printed width, with fonts inside and nothing of the network", () => {
    const svg = Object.keys(files).filter((name) => name.endsWith(".svg"));
    for (const name of svg) {
      const figure = text(name);
      expect(figure, name).toMatch(/^<svg[^>]* width="(86|178)mm"/);
      expect(figure.trimEnd().endsWith("</svg>"), name).toBe(true);
      expect(figure).toContain("@font-face");
      expect(figure.match(/(href|url)\W+https?:/g)).toBeNull();
      expect(figure).not.toMatch(/NaN|undefined/);
    }
  });

  it("has pictures of 300 dots to the inch (PNG specification, chunk pHYs: 11811 a metre)", () => {
    for (const name of Object.keys(files).filter((each) => each.endsWith(".png"))) {
      const bytes = Buffer.from(files[name]);
      expect(bytes.subarray(1, 4).toString("latin1")).toBe("PNG");
      const at = bytes.indexOf("pHYs");
      expect(bytes.readUInt32BE(at + 4)).toBe(11811);
      const width = bytes.readUInt32BE(16);
      expect([1016, 2102]).toContain(width); // 86 and 178 mm
    }
  });

  it("tells the methods of this page, and shows the same on it", async () => {
    const [first] = text("methods.txt").split("\n\n");
    expect(first).toContain("grid: 5 stations from x = 0.20 to 1.00");
    expect(await open.page.locator(".methods-text").innerText()).toContain(first);
    expect(text("methods.txt")).not.toMatch(/NaN|undefined|null/);
    expect(open.complaints).toEqual([]);
  });
});
