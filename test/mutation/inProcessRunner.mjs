import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { join, resolve } from "node:path";
import { Script } from "node:vm";
import { bundleTest, testsOf } from "./bundleTests.mjs";
import * as claims from "./claims.mjs";

const require = createRequire(import.meta.url);
const bundles = "bundles";
const costs = join(bundles, "costs.json");

/**
 * Runs test files in this very process, each as one module evaluated anew for every mutant: a mutant costs what its
 * tests cost, and what a `describe` computes is under the mutant too. A test in the report is a file here; one whose
 * body throws has failed.
 */
export class InProcessRunner {
  constructor() {
    this.files = testsOf(
      process.env.MUTATION_TESTS.split(","),
      process.env.MUTATION_WITHOUT_FILES.split(","),
    );
    this.scripts = new Map();
  }

  capabilities() {
    return { reloadEnvironment: true };
  }

  /** Bundles are kept in the copy of the tree: the process is started again whenever a mutant runs without end. */
  async init() {
    mkdirSync(bundles, { recursive: true });
    for (const [i, file] of this.files.entries()) {
      const kept = join(bundles, `${i}.cjs`);
      if (!existsSync(kept)) writeFileSync(kept, await bundleTest(file));
      const text = readFileSync(kept, "utf8");
      this.scripts.set(file, { counting: scriptOf(counting(text), kept), lean: scriptOf(lean(text), kept) });
    }
    this.costs = existsSync(costs) ? JSON.parse(readFileSync(costs, "utf8")) : {};
  }

  async dryRun() {
    const perTest = {};
    const tests = [];
    for (const file of this.files) {
      const counts = new Float64Array(mostMutants);
      const begin = performance.now();
      const failure = await this.failureOf(file, this.scripts.get(file).counting, counts);
      this.costs[file] = performance.now() - begin;
      perTest[file] = Object.fromEntries([...counts.entries()].filter(([, count]) => count > 0));
      const result = { id: file, name: file, fileName: resolve(file), timeSpentMs: this.costs[file] };
      tests.push({
        ...result,
        ...(failure === null ? { status: 0 } : { status: 1, failureMessage: failure }),
      });
    }
    writeFileSync(costs, JSON.stringify(this.costs));
    return { status: "complete", tests, mutantCoverage: { static: {}, perTest } };
  }

  async mutantRun({ activeMutant, testFilter = this.files, hitLimit = Number.POSITIVE_INFINITY }) {
    let hits = 0;
    const hit = () => {
      if (++hits > hitLimit) throw new Error("it runs in circles");
      return true;
    };
    const cheapFirst = [...testFilter].sort((a, b) => this.costs[a] - this.costs[b]);
    for (const [i, file] of cheapFirst.entries()) {
      const failure = await this.failureOf(file, this.scripts.get(file).lean, Number(activeMutant.id), hit);
      if (hits > hitLimit) return { status: "timeout", reason: "it runs in circles" };
      if (failure !== null)
        return { status: "killed", killedBy: [file], failureMessage: failure, nrOfTests: i + 1 };
    }
    return { status: "survived", nrOfTests: testFilter.length };
  }

  /** Why a file fails, by its first failure; null where all its tests pass. */
  async failureOf(file, script, ...instruments) {
    let name = "the file itself";
    try {
      const module = { exports: {} };
      const load = script.runInThisContext();
      const found = claims.claimsOf(() => load(module.exports, requireFor, module, ...instruments));
      for (const claim of found) {
        name = claim.name;
        await claim.body();
      }
      return null;
    } catch (error) {
      return `${file}, ${name}: ${String(error?.message ?? error).slice(0, 300)}`;
    }
  }
}

/** More than any folder has. */
const mostMutants = 100_000;
const requireFor = (id) => (id === "vitest" ? claims : require(id));

/** The instruments of a module: counts of each mutant's place; or the active mutant, and what tells of a hit. */
const scriptOf = (text, file) =>
  new Script(`(function (exports, require, module, instrument, hitMutant) {${text}\n})`, {
    filename: resolve(file),
  });

const coverage = /stryCov_\w+(?:\$\d+)?\(((?:"\d+"(?:, )?)+)\)/g;
const question = /stryMutAct_\w+(?:\$\d+)?\("(\d+)"\)/g;

/** Every place counts its passes, and no mutant is active. */
const counting = (text) =>
  text
    .replace(coverage, (_, ids) => `(${ids.replace(/"(\d+)"/g, "instrument[$1]++")})`)
    .replace(question, "false");

/** Nothing counts, and each question for the active mutant is a comparison of two numbers. */
const lean = (text) => text.replace(coverage, "0").replace(question, "(instrument === $1 && hitMutant())");
