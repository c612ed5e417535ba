// Mutation testing of one folder of src/core, outside the gate:
//   npm run mutation -- signal                      every file of src/core/signal
//   npm run mutation -- decay fitDecay crossing     the files whose path holds one of these words
//   npm run mutation -- decay --share 0.3 --seed 2  a random part of the mutants
//   npm run mutation -- signal --tests core/signal,core/station   the tests that may kill (else those of the folder)
//   npm run mutation -- decay --without argueDecay,flight         test files left out, as too slow: a lower bound
// Prints a table and the survivors; keeps both, and a page to click through, in reports/mutation (ignored).
import { mkdirSync, readdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { parseArgs } from "node:util";
import { Stryker } from "@stryker-mutator/core";
import { summary } from "./summary.mjs";

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: {
    share: { type: "string" },
    seed: { type: "string" },
    tests: { type: "string" },
    without: { type: "string" },
  },
});
const [folder, ...words] = positionals;
const share = Number(values.share ?? "1");
const files = folder === undefined ? [] : filesBelow(join("src", "core", folder));
const mutated = files.filter((file) => words.length === 0 || words.some((word) => file.includes(word)));
if (mutated.length === 0 || !(share > 0 && share <= 1)) {
  console.error(
    "usage: npm run mutation -- signal|station|decay|compare [WORD ...] [--share 0..1] [--seed N]",
  );
  console.error("A word picks the files whose path holds it; no file was found, or the share is none.");
  process.exit(2);
}

/**
 * Claims about hundreds of draws are not run: each would take minutes a thousand mutants, and what it would notice the
 * claims about single numbers ought to. The score is a lower bound for it.
 */
const statistical = [
  "times in 100",
  "as often where",
  "in \\d+ draws",
  "forty profiles",
  "profile of twelve",
  "pure laws? of ten",
  "too sure of themselves",
  "one after the other with the same clock",
];
process.env.MUTATION_WITHOUT = statistical.join("|");
process.env.MUTATION_TESTS = values.tests ?? `core/${folder}`;
process.env.MUTATION_WITHOUT_FILES = values.without ?? "";
process.env.MUTATION_SHARE = String(share);
process.env.MUTATION_SEED = values.seed ?? "1";

const reports = join("reports", "mutation");
const name = [folder, ...words].join("-");
mkdirSync(reports, { recursive: true });
const results = await new Stryker({
  mutate: mutated,
  testRunner: "in-process",
  plugins: ["./test/mutation/plugins.mjs"],
  ignorers: ["prose"],
  checkers: share < 1 ? ["sample"] : [],
  coverageAnalysis: "perTest",
  // one of two cores; a mutant that loops is told by its count of hits long before the clock
  concurrency: 1,
  timeoutMS: 5_000,
  timeoutFactor: 2,
  // the bundler strips types without checking them, so nothing need be switched off in the copies
  disableTypeChecks: false,
  ignorePatterns: [
    "**",
    "!package.json",
    "!tsconfig.json",
    ...["src/core", "test/core", "test/support", "test/reference", "test/mutation", "sample-data/maker"].map(
      (path) => `!${path}/**`,
    ),
  ],
  tempDirName: join(reports, `copy-${process.pid}`),
  reporters: ["survivors", "progress-append-only", "html", "json"],
  htmlReporter: { fileName: join(reports, `${name}.html`) },
  jsonReporter: { fileName: join(reports, `${name}.json`) },
  allowConsoleColors: false,
  allowEmpty: false,
  logLevel: "warn",
  warnings: { slow: false },
}).runMutationTest();

const text = summary(results, share);
writeFileSync(join(reports, `${name}.txt`), text);
console.log(text);

function filesBelow(path) {
  return readdirSync(path, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /(?<!\.d)\.ts$/.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name).split("\\").join("/"))
    .sort();
}
