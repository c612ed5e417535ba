import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { join, resolve } from "node:path";
import { Script } from "node:vm";
import { bundleTest, testsOf } from "./bundleTests.mjs";
import * as claims from "./claims.mjs";

const require = createRequire(import.meta.url);
const bundles = "bundles";

/**
 * Runs test files in this very process, each as one module evaluated anew for every mutant: a mutant costs what its
 * tests cost, and what a `describe` computes is under the mutant too. A test in the report is a file here; one whose
 * body throws has failed.
 */
export class InProcessRunner {
  constructor() {
    this.files = testsOf(process.env.MUTATION_TESTS.split(","));
    this.scripts = new Map();
    globalThis.__stryker__ ??= {};
    this.state = globalThis.__stryker__;
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
      const text = `(function (exports, require, module) {${readFileSync(kept, "utf8")}\n})`;
      this.scripts.set(file, new Script(text, { filename: resolve(kept) }));
    }
    this.costs = existsSync(costs) ? JSON.parse(readFileSync(costs, "utf8")) : {};
  }

  async dryRun() {
    Object.assign(this.state, { covering: true, activeMutant: undefined });
    this.state.mutantCoverage = { static: {}, perTest: {} };
    const tests = [];
    for (const file of this.files) {
      this.state.currentTestId = file;
      const begin = performance.now();
      const failure = await this.failureOf(file);
      this.costs[file] = performance.now() - begin;
      const result = { id: file, name: file, fileName: resolve(file), timeSpentMs: this.costs[file] };
      tests.push({
        ...result,
        ...(failure === null ? { status: 0 } : { status: 1, failureMessage: failure }),
      });
    }
    this.state.covering = false;
    writeFileSync(costs, JSON.stringify(this.costs));
    return { status: "complete", tests, mutantCoverage: this.state.mutantCoverage };
  }

  async mutantRun({ activeMutant, testFilter = this.files, hitLimit }) {
    Object.assign(this.state, { activeMutant: activeMutant.id, hitCount: 0, hitLimit });
    const cheapFirst = [...testFilter].sort((a, b) => this.costs[a] - this.costs[b]);
    for (const [i, file] of cheapFirst.entries()) {
      const failure = await this.failureOf(file);
      if (this.state.hitCount > hitLimit) return { status: "timeout", reason: "it runs in circles" };
      if (failure !== null)
        return { status: "killed", killedBy: [file], failureMessage: failure, nrOfTests: i + 1 };
    }
    return { status: "survived", nrOfTests: testFilter.length };
  }

  /** Why a file fails, by its first failure; null where all its tests pass. */
  async failureOf(file) {
    let name = "the file itself";
    try {
      const module = { exports: {} };
      const load = this.scripts.get(file).runInThisContext();
      const found = claims.claimsOf(() => load(module.exports, requireFor, module));
      for (const claim of found) {
        name = claim.name;
        await claim.body();
      }
      return null;
    } catch (error) {
      return `${name}: ${String(error?.message ?? error).slice(0, 300)}`;
    }
  }
}

const costs = join(bundles, "costs.json");
const requireFor = (id) => (id === "vitest" ? claims : require(id));
