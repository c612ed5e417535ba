// How mutants are run, and what is left out: prose, and whatever a seeded sample does not draw.
import { InProcessRunner } from "./inProcessRunner.mjs";
import { Sample } from "./sample.mjs";
import { survivor } from "./summary.mjs";

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

/** Survivors as they are found: a run may take long. */
class Survivors {
  onMutantTested(mutant) {
    if (mutant.status === "Survived" || mutant.status === "NoCoverage") console.log(survivor(mutant));
  }
}

export const strykerPlugins = [
  { kind: "Ignore", name: "prose", value: prose },
  { kind: "TestRunner", name: "in-process", injectableClass: InProcessRunner },
  { kind: "Reporter", name: "survivors", injectableClass: Survivors },
  { kind: "Checker", name: "sample", injectableClass: Sample },
];
