import { mkdirSync, readFileSync } from "node:fs";
import type { Download, Page } from "playwright-core";

/** Pictures for a person to look at; the folder is ignored by git. */
export async function picture(page: Page, name: string, fullPage = true): Promise<void> {
  mkdirSync("test/pictures", { recursive: true });
  await page.screenshot({ path: `test/pictures/${name}.png`, fullPage });
}

/** Presses "Open the demo" and waits until all of the argument stands. */
export async function openDemo(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Open the demo" }).click();
  await settled(page);
}

/** Until every case is reduced and compared. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Results, JSON" }).waitFor({ timeout: 90_000 });
  await page.waitForFunction(
    () => document.querySelector('.reducing, main [aria-busy="true"]') === null,
    undefined,
    {
      timeout: 90_000,
    },
  );
}

/** The text of what a click downloads. */
export async function downloaded(
  page: Page,
  click: () => Promise<unknown>,
): Promise<{ name: string; bytes: Buffer }> {
  const [download]: [Download, unknown] = await Promise.all([page.waitForEvent("download"), click()]);
  return { name: download.suggestedFilename(), bytes: readFileSync(await download.path()) };
}

/** Every number of a results file by its path, for comparison. */
export function numbersOf(value: unknown, path = ""): Map<string, number | null> {
  const found = new Map<string, number | null>();
  const walk = (at: unknown, where: string): void => {
    if (typeof at === "number" || at === null) found.set(where, at);
    else if (Array.isArray(at)) for (const [i, each] of at.entries()) walk(each, `${where}[${i}]`);
    else if (typeof at === "object")
      for (const [key, each] of Object.entries(at)) walk(each, `${where}.${key}`);
  };
  walk(value, path);
  return found;
}
