import { execFileSync } from "node:child_process";
import { mkdtempSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { writeSyntheticCase } from "../batch/syntheticCase.ts";
import { dropFiles, type TextFile } from "./dropFiles.ts";
import { launchBrowser, type OpenPage, openPage } from "./openPage.ts";
import { downloaded, numbersOf, picture, settled } from "./stories.ts";

const stations = [0.2, 0.3, 0.45, 0.7, 1, 1.5];

const disk = mkdtempSync(join(tmpdir(), "waneline-drop-"));

/** A folder of velocity records without any sheet, as a stranger has them; it stands on disk as well. */
function records(name: string, seed: number): TextFile[] {
  const folder = join(disk, name);
  writeSyntheticCase(folder, { name, stations, samples: 12_000, n: 1.25, x0: 0.05, seed });
  return readdirSync(folder)
    .filter((file) => file.endsWith(".csv"))
    .map((file) => ({ path: `${name}/${file}`, text: readFileSync(join(folder, file), "utf8") }));
}

const bad: TextFile[] = [
  { path: "grid/empty.csv", text: "" },
  { path: "grid/x0800.csv", text: "t,u,v,w\n" },
  { path: "grid/x0900.csv", text: "t,temperature\n0,21\n1,22\n" },
  { path: "grid/x0950.csv", text: `t,u,v,w\n${"0,6,0,0\n1,6.1.4,0,0\n".repeat(40)}` },
  { path: "grid/notes.txt", text: "Fan restarted after lunch.\n" },
];

describe("folders dropped without a sheet", () => {
  let browser: Browser;
  let open: OpenPage;
  beforeAll(async () => {
    browser = await launchBrowser();
    open = await openPage(browser);
  });
  afterAll(() => browser.close());

  it("become cases named after the folders, read and fitted", async () => {
    await dropFiles(open.page, [...records("grid", 3), ...records("inflow", 4)]);
    await settled(open.page);
    const text = await open.page.locator("#records").innerText();
    expect(text).toContain("grid");
    expect(text).toContain("inflow");
    await picture(open.page, "dropped-1440");
  });

  it("ask for the viscosity, use the answer, and save it all as a case sheet", async () => {
    const field = open.page.getByLabel(/kinematic viscosity/).first();
    await field.fill("1.5e-5");
    await field.press("Enter");
    await settled(open.page);
    const { bytes } = await downloaded(open.page, () =>
      open.page.getByRole("button", { name: "Case sheet of grid, JSON" }).click(),
    );
    const sheet = JSON.parse(bytes.toString("utf8")) as {
      case: string;
      kinematicViscosity: number;
      files: unknown[];
    };
    expect(sheet.case).toBe("grid");
    expect(sheet.kinematicViscosity).toBe(1.5e-5);
    expect(sheet.files).toHaveLength(stations.length);
    // Its paths are relative to the folder of the records: it belongs beside them.
    writeFileSync(join(disk, "grid", "grid.json"), bytes);
  });

  it("give the page's numbers when the batch is handed the saved sheet", async () => {
    execFileSync(
      process.execPath,
      ["dist-batch/main.js", join(disk, "grid", "grid.json"), "--out", join(disk, "out")],
      {
        stdio: "pipe",
      },
    );
    const { bytes } = await downloaded(open.page, () =>
      open.page.getByRole("button", { name: "Results, JSON" }).click(),
    );
    const [batch, page] = [readFileSync(join(disk, "out", "results.json")), bytes].map(
      (each) => (JSON.parse(each.toString("utf8")) as { cases: { case: string; stations: unknown }[] }).cases,
    );
    const found = numbersOf(page.find((each) => each.case === "grid")?.stations);
    const expected = numbersOf(batch[0].stations);
    expect(expected.size).toBeGreaterThan(300);
    for (const [path, value] of expected) {
      const here = found.get(path) ?? null;
      if (value === null || here === null) expect(here, path).toBe(value);
      else expect(Math.abs(here - value), path).toBeLessThanOrEqual(1e-9 * Math.abs(value));
    }
  });

  it("name what is wrong with bad files, and lose nothing that was read", async () => {
    const before = await open.page.locator("#decay .finding").first().innerText();
    await dropFiles(open.page, bad);
    await expect
      .poll(() => open.page.locator("main").innerText(), { timeout: 60_000 })
      .toContain("empty.csv");
    await settled(open.page);
    const text = await open.page.locator("main").innerText();
    for (const { path } of bad) expect(text, path).toContain(path.split("/")[1]);
    expect(text).toContain("6.1.4");
    expect(text).toMatch(/line[\s  ]3/);
    expect(text).not.toMatch(/\bat .*\.(js|ts):\d+/);
    expect(await open.page.locator("#decay .finding").first().innerText()).toContain(before.slice(0, 30));
    await picture(open.page, "bad-files-1440");
  });

  it("complained of nothing", () => expect(open.complaints).toEqual([]));
});
