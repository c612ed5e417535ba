import { mkdtempSync, readdirSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { writeSyntheticCase } from "../batch/syntheticCase.ts";
import { dropFiles } from "./dropFiles.ts";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { settled } from "./stories.ts";

const folder = join(mkdtempSync(join(tmpdir(), "waneline-offline-")), "grid");
writeSyntheticCase(folder, {
  name: "grid",
  stations: [0.2, 0.3, 0.45, 0.7, 1],
  samples: 6000,
  n: 1.25,
  x0: 0.05,
  seed: 6,
});
const records = readdirSync(folder).map((file) => ({
  path: `grid/${file}`,
  text: readFileSync(join(folder, file), "utf8"),
}));

let browser: Browser;
let open: OpenPage;
beforeAll(async () => {
  browser = await launchBrowser();
  open = await openPage(browser);
});
afterAll(() => browser.close());

it("a page that was opened once opens, reads and draws without the network; so does the demo once it was fetched", async () => {
  const { page, context } = open;
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
  await page.reload(); // from now on the copy answers
  const demo = () => page.evaluate(async () => (await fetch("demo/screen.json")).text());
  const sheet = await demo();
  await context.setOffline(true);
  await page.reload();
  await page.getByRole("button", { name: "Open the demo" }).waitFor();
  await dropFiles(page, records);
  await settled(page);
  await page.locator("#decay .plot svg.main-svg").first().waitFor({ timeout: 60_000 });
  expect(await page.locator("#decay .finding").first().innerText()).toContain("n =");
  expect(await demo()).toBe(sheet);
  expect(open.complaints).toEqual([]);
});
