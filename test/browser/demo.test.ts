import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { downloaded, numbersOf, openDemo, picture } from "./stories.ts";

const axeText = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

interface Results {
  readonly cases: { readonly case: string }[];
}

/** The batch command on the same sheets, in the page's order of cases. */
function batchResults(order: readonly string[]): unknown {
  const out = mkdtempSync(join(tmpdir(), "waneline-demo-"));
  const sheets = order.map((name) => `sample-data/${name}.json`);
  execFileSync(process.execPath, ["dist-batch/main.js", ...sheets, "--out", out], { stdio: "pipe" });
  return JSON.parse(readFileSync(join(out, "results.json"), "utf8"));
}

describe("the demo in a real browser", () => {
  let browser: Browser;
  let open: OpenPage;
  beforeAll(async () => {
    browser = await launchBrowser();
    open = await openPage(browser);
    await picture(open.page, "empty-1440", false);
    await openDemo(open.page);
  });
  afterAll(() => browser.close());

  it("shows each section with its finding, and no NaN or undefined anywhere", async () => {
    for (const name of ["Records", "Intensity and decay", "Isotropy", "Length scales", "Side by side"])
      await open.page.getByRole("heading", { name }).first().waitFor();
    const text = await open.page.locator("body").innerText();
    expect(text).not.toMatch(/NaN|undefined|Infinity|\[object/);
  });

  it("gives the numbers of the batch command to a relative 1e-9", async () => {
    const { bytes } = await downloaded(open.page, () =>
      open.page.getByRole("button", { name: "Results, JSON" }).click(),
    );
    const page = JSON.parse(bytes.toString("utf8")) as Results;
    const batch = batchResults(page.cases.map((each) => each.case));
    const found = numbersOf(page);
    const expected = numbersOf(batch);
    expect(expected.size).toBeGreaterThan(2000);
    const worst = [...expected].filter(([path, value]) => {
      const here = found.get(path);
      if (value === null || here === null || here === undefined) return here !== value;
      return Math.abs(here - value) > 1e-9 * Math.abs(value);
    });
    expect(worst.slice(0, 5)).toEqual([]);
  });

  it("has no accessibility violations, in light and in dark", async () => {
    for (const dark of [false, true]) {
      await switchTheme(open.page, dark);
      await open.page.evaluate(axeText);
      const violations = await open.page.evaluate(async () => {
        const { axe } = globalThis as unknown as {
          axe: { run(): Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> };
        };
        return (await axe.run()).violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 160)}`);
      });
      expect(violations).toEqual([]);
    }
    await switchTheme(open.page, false);
  });

  it("exports a figure as SVG and PNG, and the stations as CSV", async () => {
    const section = open.page.locator("#decay");
    const svg = await downloaded(open.page, () =>
      section.getByRole("button", { name: "SVG" }).first().click(),
    );
    expect(svg.name).toMatch(/\.svg$/);
    expect(svg.bytes.toString("utf8")).toMatch(/^<svg[\s\S]*<\/svg>\s*$/);
    const png = await downloaded(open.page, () =>
      section.getByRole("button", { name: "PNG" }).first().click(),
    );
    expect(png.bytes.subarray(1, 4).toString("latin1")).toBe("PNG");
    const widthPx = png.bytes.readUInt32BE(16);
    expect([86, 178].map((mm) => Math.round((mm / 25.4) * 600))).toContain(widthPx);
    const csv = await downloaded(open.page, () =>
      open.page.getByRole("button", { name: /^Stations of .*, CSV$/ }).click(),
    );
    expect(csv.bytes.toString("utf8").split("\n").length).toBeGreaterThan(12);
  });

  it("is pictured at three widths, light and dark, without sideways scrolling", async () => {
    const { page } = open;
    for (const width of [1440, 1024, 390])
      for (const dark of [false, true]) {
        await page.setViewportSize({ width, height: 900 });
        await switchTheme(page, dark);
        await drawEverything(page);
        await picture(page, `demo-${width}-${dark ? "dark" : "light"}`);
        const overflow = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
        expect(overflow, `sideways scrolling at ${width} px`).toBeLessThanOrEqual(0);
      }
  });

  it("complained of nothing and asked no other host", () => expect(open.complaints).toEqual([]));
});

/** Under 960 px the action stands in the menu "More". */
async function switchTheme(page: Page, dark: boolean): Promise<void> {
  const wanted = page.getByRole("button", { name: dark ? "Dark" : "Light", exact: true });
  const more = page.getByRole("button", { name: "More", exact: true });
  if ((await more.isVisible()) && !(await wanted.first().isVisible())) await more.click();
  if (await wanted.first().isVisible()) await wanted.first().click();
  else if (await more.isVisible()) await more.click();
}

/** Figures draw when they come near the window: goes past all of them once. */
async function drawEverything(page: Page): Promise<void> {
  const height = await page.evaluate(() => document.body.scrollHeight);
  for (let y = 0; y < height; y += 700) {
    await page.evaluate((at) => scrollTo(0, at), y);
    await page.waitForTimeout(80);
  }
  await page.evaluate(() => scrollTo(0, 0));
  await page.waitForTimeout(200);
}
