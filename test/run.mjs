// Every check of the project in one run: types, lint, arrows, unit, component and real-browser tests.
import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { ensureBrowser } from "./browser/findBrowser.mjs";

const reports = mkdtempSync(join(tmpdir(), "waneline-test-"));
const bin = (name) => join("node_modules", ".bin", name);
let passed = 0;
let failed = 0;

function run(title, command, ...args) {
  const begin = Date.now();
  console.log(`\n== ${title}`);
  const { status } = spawnSync(command, args, { stdio: "inherit", shell: process.platform === "win32" });
  console.log(
    `== ${title}: ${status === 0 ? "passed" : "FAILED"} in ${((Date.now() - begin) / 1000).toFixed(1)} s`,
  );
  return status === 0;
}

function check(title, command, ...args) {
  if (run(title, command, ...args)) passed++;
  else failed++;
}

/** A vitest run counts its own tests; one that counted none has failed. */
function tests(title, ...projects) {
  const report = join(reports, `${projects.join("-")}.json`);
  const select = projects.flatMap((project) => ["--project", project]);
  const good = run(
    title,
    bin("vitest"),
    "run",
    ...select,
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${report}`,
  );
  try {
    const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(report, "utf8"));
    passed += numPassedTests;
    failed += numFailedTests + (numPassedTests === 0 || (!good && numFailedTests === 0) ? 1 : 0);
  } catch {
    failed++;
  }
}

check("types of core, without DOM and Node", bin("tsc"), "-p", "src/core");
check("types", bin("tsc"), "-p", ".");
check("lint and format", bin("biome"), "check");
check("arrows", process.execPath, "test/arrows.mjs");
check("batch build", bin("vite"), "build", "--mode", "batch", "--logLevel", "warn");
tests("unit and component tests", "unit", "component");
const browser = ensureBrowser();
if (browser.path) tests("browser tests", "browser");
else {
  console.error(browser.advice);
  failed++;
}

rmSync(reports, { recursive: true, force: true });
console.log(`\n${passed} passed, ${failed} failed`);
process.exit(failed > 0 ? 1 : 0);
