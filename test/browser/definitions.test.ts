import type { Browser, Locator, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { seededRandom } from "../../src/core/signal/seededRandom.ts";
import { dropFiles, type TextFile } from "./dropFiles.ts";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { picture, settled } from "./stories.ts";

const step = 1e-3;
const samples = 20_000;
/** The flow is faster and rougher at first: for so long, s. */
const transient = 2;

/** Records of u and v that begin in a transient: two first-order processes about a mean that settles. */
function records(): TextFile[] {
  return [0.2, 0.3, 0.5, 0.8, 1.2].map((x, station) => {
    const random = seededRandom(7 + station);
    const rms = 0.4 * (x / 0.2) ** -0.6;
    const lines = ["t,u,v"];
    let [u, v] = [random.gaussian(), random.gaussian()];
    for (let i = 0; i < samples; i++) {
      u = 0.97 * u + 0.243 * random.gaussian();
      v = 0.97 * v + 0.243 * random.gaussian();
      const early = i * step < transient;
      const size = rms * (early ? 2 : 1);
      lines.push(
        [(i * step).toFixed(3), (6 + (early ? 0.4 : 0) + size * u).toFixed(5), (size * v).toFixed(5)].join(),
      );
    }
    return { path: `tunnel/x0${1000 * x}.csv`, text: `${lines.join("\n")}\n` };
  });
}

/** Opens a number's definition, gives its text and its place, and closes it again. */
async function definitionOf(page: Page, number: Locator) {
  await number.scrollIntoViewIfNeeded();
  await number.click();
  const panel = page.locator(".definition-panel:popover-open");
  await panel.waitFor();
  const [text, box] = [await panel.innerText(), await panel.boundingBox()];
  await page.keyboard.press("Escape");
  await panel.waitFor({ state: "detached" }).catch(() => panel.waitFor({ state: "hidden" }));
  return { text, box };
}

describe("records that begin in a transient", () => {
  let browser: Browser;
  let open: OpenPage;
  beforeAll(async () => {
    browser = await launchBrowser();
    open = await openPage(browser);
    await dropFiles(open.page, records());
    await settled(open.page);
  });
  afterAll(() => browser.close());
  const fold = (page: Page) => page.locator("details", { hasText: "How records begin" });

  it("show it, and leave it out by one click, which re-reduces them and can be taken back", async () => {
    const { page } = open;
    expect(await fold(page).locator("summary").innerText()).toContain("a transient in tunnel");
    await fold(page).locator("summary").click();
    await page.getByText("Means of u and").waitFor();
    await picture(page, "start-up-1440");
    const reduced = page.locator("details", { hasText: "How records were reduced" });
    await reduced.locator("summary").click();
    const count = reduced.locator(".number").first();
    const samplesShown = async () => Number((await count.innerText()).replace(/\D/g, ""));
    expect(await samplesShown()).toBe(samples);

    await fold(page)
      .getByRole("button", { name: /^Leave out/ })
      .click();
    await expect.poll(samplesShown, { timeout: 60_000 }).toBeLessThan(samples - 0.9 * (transient / step));
    await settled(page);
    expect(await fold(page).innerText()).toContain("no transient found; left out in tunnel");
    await page.getByRole("button", { name: "Undo" }).click();
    await expect.poll(samplesShown, { timeout: 60_000 }).toBe(samples);
    await settled(page);
  });

  it("carry a definition behind each number: of the head, the records, a reduction, a station", async () => {
    const { page } = open;
    const n = await definitionOf(page, page.locator(".ruler-reading .number").first());
    expect(n.text).toContain("decay exponent of the energy");
    expect(n.text).toContain("By other routes");
    const times = await definitionOf(page, page.locator("#records tbody .number").nth(3));
    expect(times.text).toContain("record length in integral times");
    expect(times.text).toContain("greatest");
    const table = page.getByRole("region", { name: "Stations", exact: true });
    // x, Tu, u'/v', L11: without a reference length there is no distance from the origin
    const columnOfL11 = 3;
    const L11 = await definitionOf(
      page,
      table.locator("tbody tr").nth(2).locator(".number").nth(columnOfL11),
    );
    expect(L11.text).toContain("integral length scale");
    expect(L11.text).toContain("spread of the routes");
    expect(L11.text).toContain("lag at 1/e");
  });

  it("keep every definition inside a window of 390 px", async () => {
    const { page } = open;
    await page.setViewportSize({ width: 390, height: 800 });
    const table = page.getByRole("region", { name: "Stations", exact: true });
    for (const number of [page.locator(".ruler-reading .number").first(), table.locator(".number").nth(1)]) {
      const { box } = await definitionOf(page, number);
      expect(box?.x).toBeGreaterThanOrEqual(0);
      expect(box?.y).toBeGreaterThanOrEqual(0);
      expect((box?.x ?? 0) + (box?.width ?? 0)).toBeLessThanOrEqual(390);
      expect((box?.y ?? 0) + (box?.height ?? 0)).toBeLessThanOrEqual(800);
    }
  });

  it("complained of nothing", () => expect(open.complaints).toEqual([]));
});
