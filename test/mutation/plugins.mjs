// What the mutation run leaves out: prose, and whatever a seeded sample does not draw.
import { createHash } from "node:crypto";

/**
 * Text that a person reads (the reason a number is missing, the message of a flag or an assertion): it has a blank
 * between words. Its wording is nobody's claim, so a test that held it would only restate it. Codes, keys and kinds
 * have no blank and are mutated.
 */
const prose = {
  shouldIgnore(path) {
    if (path.isStringLiteral() && /\S\s+\S/.test(path.node.value)) return "prose";
    if (path.isTemplateLiteral() && path.node.quasis.some(({ value }) => /\S\s|\s\S/.test(value.raw)))
      return "prose";
    return undefined;
  },
};

/** The same mutant is drawn or not whatever else is in the run: the draw is a hash of the seed and the mutant. */
class Sample {
  constructor() {
    this.share = Number(process.env.MUTATION_SHARE ?? "1");
    this.seed = process.env.MUTATION_SEED ?? "1";
  }
  init() {}
  group(mutants) {
    return [mutants.map(({ id }) => id)];
  }
  check(mutants) {
    return Object.fromEntries(
      mutants.map((mutant) => [
        mutant.id,
        this.draws(mutant) ? { status: "passed" } : { status: "compileError", reason: notDrawn },
      ]),
    );
  }
  draws({ fileName, mutatorName, replacement, location: { start, end } }) {
    const place = [start.line, start.column, end.line, end.column].join(":");
    const name = fileName.split(/[\\/]/).slice(-2).join("/");
    const hash = createHash("sha256").update(`${this.seed}|${name}|${place}|${mutatorName}|${replacement}`);
    return hash.digest().readUInt32BE(0) / 2 ** 32 < this.share;
  }
}

export const notDrawn = "not drawn";

export const strykerPlugins = [
  { kind: "Ignore", name: "prose", value: prose },
  { kind: "Checker", name: "sample", injectableClass: Sample },
];
