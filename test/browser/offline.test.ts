import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { openDemo } from "./stories.ts";

let browser: Browser;
let open: OpenPage;
beforeAll(async () => {
  browser = await launchBrowser();
  open = await openPage(browser);
});
afterAll(() => browser.close());

it("the page that was opened once opens, reads and draws without the network", async () => {
  const { page, context } = open;
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
  await page.reload(); // from now on the copy answers
  await page
    .evaluate(() => fetch("demo/files.json").then((answer) => answer.json()))
    .then((names) =>
      page.evaluate(
        (all) => Promise.all(all.map((name: string) => fetch(`demo/${name}`))),
        names as string[],
      ),
    );
  await context.setOffline(true);
  await page.reload();
  await openDemo(page);
  await page.locator("#decay .plot svg.main-svg").first().waitFor();
  await page.getByRole("heading", { name: "Side by side" }).first().waitFor();
  expect(open.complaints).toEqual([]);
});
