import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { openDemo, picture, settled } from "./stories.ts";

const startBracket = (page: Page) => page.getByRole("slider", { name: "Start of fit window, screen" });
const lawSentence = (page: Page) => page.locator("#decay .finding").first();

describe("the ruler in a real browser", () => {
  let browser: Browser;
  let open: OpenPage;
  beforeAll(async () => {
    browser = await launchBrowser();
    open = await openPage(browser);
    await openDemo(open.page);
  });
  afterAll(() => browser.close());

  it("moves a bracket by the arrow keys, and the law's sentence follows", async () => {
    const { page } = open;
    const bracket = startBracket(page);
    await bracket.focus();
    const before = [await bracket.getAttribute("aria-valuetext"), await lawSentence(page).innerText()];
    await page.keyboard.press("ArrowRight");
    await page.keyboard.press("ArrowRight");
    expect(await bracket.getAttribute("aria-valuetext")).not.toBe(before[0]);
    await expect.poll(() => lawSentence(page).innerText()).not.toBe(before[1]);
    await picture(page, "ruler-keyboard", false);
    await page.keyboard.press("a");
    await settled(page);
    expect(await bracket.getAttribute("aria-valuetext")).toBe(before[0]);
    await expect.poll(() => lawSentence(page).innerText()).toBe(before[1]);
  });

  it("drags a bracket by the mouse and undoes it", async () => {
    const { page } = open;
    const bracket = startBracket(page);
    const before = await bracket.getAttribute("aria-valuetext");
    const box = await bracket.boundingBox();
    if (!box) throw new Error("the bracket is not on the page");
    const at = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    for (let i = 1; i <= 12; i++) await page.mouse.move(at.x + i * 12, at.y);
    await picture(page, "ruler-drag", false);
    await page.mouse.up();
    expect(await bracket.getAttribute("aria-valuetext")).not.toBe(before);
    await page.getByRole("button", { name: "Undo" }).click();
    await settled(page);
    expect(await bracket.getAttribute("aria-valuetext")).toBe(before);
  });

  it("switches its axis to distance from the virtual origin", async () => {
    const { page } = open;
    const choices = page.getByRole("radiogroup").getByRole("radio");
    await choices.last().click();
    await expect.poll(() => choices.last().isChecked()).toBe(true);
    await picture(page, "ruler-origin", false);
    await choices.first().click();
  });

  it("complained of nothing", () => expect(open.complaints).toEqual([]));
});
