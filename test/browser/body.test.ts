import { execFileSync } from "node:child_process";
import { cpSync, mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { downloaded, numbersOf, openDemo, picture, settled } from "./stories.ts";

interface Results {
  readonly cases: { readonly case: string; readonly body: object; readonly development: object }[];
}

const marker = (page: Page) => page.getByRole("slider", { name: "Body" });
const placeOf = async (page: Page) => Number(await marker(page).getAttribute("aria-valuenow"));
const finding = (page: Page) => page.locator("#body .finding").innerText();

/** Changes of the page below the head since it was asked last, after so many milliseconds more. */
async function changesIn(page: Page, wait: number): Promise<number> {
  const since = await page.evaluate(takeChanges);
  if (wait === 0) return since;
  await page.waitForTimeout(wait);
  return page.evaluate(takeChanges);
}

function takeChanges(): number {
  const { seen } = globalThis as unknown as { seen: { changes: number } };
  const { changes } = seen;
  seen.changes = 0;
  return changes;
}

/** The batch command on the sheets that the page has saved, beside copies of the demo's records. */
function batchResults(sheets: ReadonlyMap<string, Buffer>): Results {
  const folder = mkdtempSync(join(tmpdir(), "waneline-body-"));
  cpSync("sample-data", folder, { recursive: true });
  const paths = [...sheets].map(([name, bytes]) => {
    const path = join(folder, `${name}.json`);
    writeFileSync(path, bytes);
    return path;
  });
  execFileSync(process.execPath, ["dist-batch/main.js", ...paths, "--out", join(folder, "out")], {
    stdio: "pipe",
  });
  return JSON.parse(readFileSync(join(folder, "out", "results.json"), "utf8")) as Results;
}

describe("the body in a real browser", () => {
  let browser: Browser;
  let open: OpenPage;
  beforeAll(async () => {
    browser = await launchBrowser();
    open = await openPage(browser);
    await openDemo(open.page);
  });
  afterAll(() => browser.close());

  it("moves by the arrow keys; its reading follows when it rests, and is taken back", async () => {
    const { page } = open;
    await page.locator("#body").scrollIntoViewIfNeeded();
    await settled(page);
    const before = [await placeOf(page), await finding(page)];
    await marker(page).focus();
    await page.keyboard.down("ArrowRight");
    await expect.poll(() => placeOf(page)).toBeGreaterThan(Number(before[0]));
    expect(await finding(page)).toBe(before[1]);
    await page.keyboard.up("ArrowRight");
    await expect.poll(() => finding(page)).not.toBe(before[1]);
    await page.keyboard.press("Control+z");
    await expect.poll(() => finding(page)).toBe(before[1]);
    expect(await placeOf(page)).toBe(before[0]);
  });

  it("is dragged without any work in the page until it is let go", async () => {
    const { page } = open;
    await page.evaluate(() => {
      const seen = { changes: 0 };
      Object.assign(globalThis, { seen });
      const main = document.querySelector("main");
      if (main)
        new MutationObserver((all) => {
          seen.changes += all.length;
        }).observe(main, { subtree: true, childList: true, characterData: true });
    });
    // figures that come near the window are still being drawn: the page is to be at rest first
    await expect.poll(() => changesIn(page, 1000), { timeout: 60_000 }).toBe(0);
    const box = await marker(page).boundingBox();
    if (!box) throw new Error("the body is not on the ruler");
    const at = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    for (let i = 1; i <= 20; i++) await page.mouse.move(at.x + i * 6, at.y);
    const changes = await changesIn(page, 0);
    expect(changes).toBe(0);
    const before = await finding(page);
    await picture(page, "body-drag", false);
    await page.mouse.up();
    await expect.poll(() => finding(page)).not.toBe(before);
  });

  it("gives the numbers of the batch command on the sheets that the page saves", async () => {
    const { page } = open;
    await marker(page).focus();
    await page.keyboard.press("Enter");
    await page.waitForFunction(() => document.activeElement instanceof HTMLInputElement);
    await page.keyboard.type("1.05");
    await page.keyboard.press("Enter");
    await settled(page);
    await expect.poll(() => finding(page)).toContain("1.05");
    const results = await downloaded(page, () => page.getByRole("button", { name: "Results, JSON" }).click());
    const here = JSON.parse(results.bytes.toString("utf8")) as Results;
    const sheets = new Map<string, Buffer>();
    for (const { case: name } of here.cases) {
      await page.locator(".case-switch").getByRole("button", { name, exact: true }).click();
      const button = page.getByRole("button", { name: `Case sheet of ${name}, JSON` });
      sheets.set(name, (await downloaded(page, () => button.click())).bytes);
    }
    const there = batchResults(sheets);
    const found = numbersOf(here.cases.map(({ body, development }) => ({ body, development })));
    const expected = numbersOf(there.cases.map(({ body, development }) => ({ body, development })));
    expect(expected.size).toBeGreaterThan(100);
    const worst = [...expected].filter(([path, value]) => {
      const one = found.get(path);
      if (value === null || one === null || one === undefined) return one !== value;
      return Math.abs(one - value) > 1e-9 * Math.abs(value);
    });
    expect(worst).toEqual([]);
  });

  it("complained of nothing", () => expect(open.complaints).toEqual([]));
});
