// A bracket dragged over the demo in a real browser without a GPU: how far readings and figures stay behind the hand.
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { chromium } from "playwright-core";
import { build, preview } from "vite";
import { ensureBrowser } from "../browser/findBrowser.mjs";
import { watchDrag } from "./watchDrag.mjs";

const steps = 60;
export const title = `A start bracket dragged in ${steps} steps over the demo, milliseconds`;

/** Most at the median: readings and ruler, the figure in view, everything after release. */
const bars = { readings: 16, figure: 150, settled: 1000 };
/** Sections whose figure is watched while it is in view, and how far the hand goes at each step, px. */
const views = [
  { section: "decay", stride: 8 },
  { section: "scales", stride: 8 },
];
const switches = ["--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking"];

export async function run(tools) {
  const { path, advice } = ensureBrowser();
  if (!path) return void console.log(advice);
  const outDir = mkdtempSync(join(tmpdir(), "waneline-drag-"));
  const built = { configFile: join(tools.top, "vite.config.ts"), mode: "production", logLevel: "warn" };
  await build({ ...built, build: { outDir, emptyOutDir: true } });
  const server = await preview({ ...built, build: { outDir }, preview: { port: 0, open: false } });
  const browser = await chromium.launch({ executablePath: path, chromiumSandbox: false, args: switches });
  try {
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
    await page.goto(`http://localhost:${server.httpServer.address().port}/`);
    await page.getByRole("button", { name: "Open the demo" }).click();
    await page.getByRole("button", { name: "Results, JSON" }).waitFor({ timeout: 120_000 });
    await rested(page);
    const rows = [];
    for (const view of views) rows.push(...rowsOf(view.section, await dragged(page, view)));
    tools.table(["in view", "what", "median", "largest", "changes", "bar", ""], rows);
  } finally {
    await browser.close();
    await server.close();
    rmSync(outDir, { recursive: true, force: true });
  }
}

/** One drag there, with what the page itself saw of it; the change is undone afterwards. */
async function dragged(page, { section, stride }) {
  await page.evaluate((id) => document.getElementById(id).scrollIntoView(), section);
  await page.waitForTimeout(1500); // figures that came into view are drawn
  const box = await page.getByRole("slider", { name: "Start of fit window" }).first().boundingBox();
  const at = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  await page.evaluate(watchDrag, section);
  await page.mouse.move(at.x, at.y);
  await page.mouse.down();
  for (let step = 1; step <= steps; step++) {
    await page.mouse.move(at.x + step * stride, at.y);
    await page.waitForTimeout(16); // a hand's own pace: a frame a step
  }
  const seen = await page.evaluate(() => window.dragSeen);
  const released = performance.now();
  await page.mouse.up();
  await page.waitForTimeout(50); // until the page has taken notice
  await rested(page);
  const settled = performance.now() - released;
  await page.keyboard.press("Control+z");
  await rested(page);
  return { ...seen, settled };
}

const rested = (page) =>
  page.waitForFunction(
    () => document.querySelector('.reducing, main [aria-busy="true"]') === null,
    undefined,
    { timeout: 120_000 },
  );

function rowsOf(section, { readings, figure, settled }) {
  return [
    row(section, "hand to readings and sentence", readings, bars.readings),
    row(section, "hand to figure in view", figure, bars.figure),
    row(section, "release to all at rest", [settled], bars.settled),
  ];
}

function row(section, what, times, bar) {
  if (times.length === 0) return [section, what, "none seen", "", "0", String(bar), "OUTSIDE"];
  const sorted = [...times].sort((a, b) => a - b);
  const median = sorted[sorted.length >> 1];
  const largest = sorted[sorted.length - 1];
  const inside = median <= bar ? "" : "OUTSIDE";
  return [section, what, median.toFixed(0), largest.toFixed(0), String(times.length), String(bar), inside];
}
