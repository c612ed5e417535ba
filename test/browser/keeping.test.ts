import { mkdtempSync, readdirSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { writeSyntheticCase } from "../batch/syntheticCase.ts";
import { dropFiles } from "./dropFiles.ts";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { downloaded, numbersOf, picture, settled } from "./stories.ts";

const folder = join(mkdtempSync(join(tmpdir(), "waneline-keep-")), "grid");
const stations = [0.2, 0.3, 0.45, 0.7, 1, 1.5];
writeSyntheticCase(folder, { name: "grid", stations, samples: 8000, n: 1.25, x0: 0.05, seed: 5 });
const records = readdirSync(folder).map((file) => ({
  path: `grid/${file}`,
  text: readFileSync(join(folder, file), "utf8"),
}));

const numbers = async (page: Page) => {
  const press = () => page.getByRole("button", { name: "Results, JSON" }).click();
  const { bytes } = await downloaded(page, press);
  return numbersOf(JSON.parse(bytes.toString("utf8")));
};
const viscosity = async (page: Page, value: string) => {
  const field = page.getByLabel(/kinematic viscosity/).first();
  await field.fill(value);
  await field.press("Enter");
};
/** A busy machine is given time. */
const patient = { timeout: 60_000 };
/** What is kept is written once nothing has happened for a moment. */
const kept = (page: Page) => page.waitForTimeout(1500);

let browser: Browser;
let open: OpenPage;
let before: Map<string, number | null>;
let workspace: Buffer;
beforeAll(async () => {
  browser = await launchBrowser();
  open = await openPage(browser);
});
afterAll(() => browser.close());

describe("a page that was worked on", () => {
  it("comes back after a reload with the same numbers, and reads nothing again", async () => {
    const { page } = open;
    await dropFiles(page, records);
    await settled(page);
    await viscosity(page, "1.5e-5");
    await settled(page);
    before = await numbers(page);
    await kept(page);
    await page.reload();
    await settled(page);
    expect(await numbers(page)).toEqual(before);
    await expect.poll(() => page.getByRole("button", { name: "Undo" }).isEnabled(), patient).toBe(true);
  });

  it("reduces its records with other settings without another drop", async () => {
    const { page } = open;
    await viscosity(page, "1.6e-5");
    await settled(page);
    await expect
      .poll(async () => (await numbers(page)).get(".cases[0].settings.kinematicViscosity"))
      .toBe(1.6e-5);
    expect(await numbers(page)).not.toEqual(before);
    await page.getByRole("button", { name: "Undo" }).click();
    await settled(page);
    await expect.poll(() => numbers(page), patient).toEqual(before);
  });

  it("is not written over by a second tab, which says so", async () => {
    const second = await open.context.newPage();
    await second.goto(inject("pageUrl"));
    await second.getByText("open in another tab").waitFor();
    await picture(second, "second-tab-1440");
    await second.close();
    await kept(open.page);
    await open.page.reload();
    await settled(open.page);
    expect(await numbers(open.page)).toEqual(before);
  });

  it("is saved as one file", async () => {
    const saved = await downloaded(open.page, () =>
      open.page.getByRole("button", { name: "Save workspace" }).click(),
    );
    expect(saved.name).toBe("grid.workspace.json");
    workspace = saved.bytes;
  });
});

describe("a workspace file dropped on a page elsewhere", () => {
  let other: OpenPage;
  beforeAll(async () => {
    other = await openPage(browser);
  });

  it("shows the same numbers without the records", async () => {
    await dropFiles(other.page, [{ path: "grid.workspace.json", text: workspace.toString("utf8") }]);
    await settled(other.page);
    expect(await numbers(other.page)).toEqual(before);
    await picture(other.page, "workspace-opened-1440");
  });

  it("says that records are missing where they are asked for, and takes them when they are dropped", async () => {
    await viscosity(other.page, "1.7e-5");
    await other.page.getByText("are not in this browser").waitFor();
    await dropFiles(other.page, records);
    await settled(other.page);
    await expect
      .poll(async () => (await numbers(other.page)).get(".cases[0].stations[0].Re_lambda.value"), patient)
      .not.toBe(before.get(".cases[0].stations[0].Re_lambda.value"));
  });

  it("that is damaged is told, and the page stays as it is", async () => {
    const there = await numbers(other.page);
    await dropFiles(other.page, [
      { path: "cut.workspace.json", text: workspace.toString("utf8").slice(0, 5000) },
    ]);
    await other.page.getByText("The workspace file cannot be opened").waitFor();
    expect(await numbers(other.page)).toEqual(there);
    expect(other.complaints).toEqual([]);
  });
});

describe("a store that another program has spoiled", () => {
  it("is told, set aside, and the page begins anew and keeps again", async () => {
    const { page } = open;
    await page.evaluate(
      () =>
        new Promise<void>((done, fail) => {
          const request = indexedDB.open("waneline");
          request.onerror = () => fail(request.error);
          request.onsuccess = () => {
            const change = request.result.transaction("parts", "readwrite");
            change
              .objectStore("parts")
              .put({ schema: 1, history: { present: { cases: [{}, 7] }, past: [] } }, "page");
            change.oncomplete = () => done(request.result.close());
          };
        }),
    );
    await page.reload();
    await page.getByText("cannot be used").waitFor();
    await page.getByRole("button", { name: "Open the demo" }).waitFor();
    expect(open.complaints).toEqual([]);
  });
});
