// What a test of core imports from vitest, without its runner: the tests of one file as a list, and the same `expect`.
import {
  ASYMMETRIC_MATCHERS_OBJECT,
  JestAsymmetricMatchers,
  JestChaiExpect,
  JestExtend,
  setState,
} from "@vitest/expect";
import * as chai from "chai";

for (const plugin of [JestExtend, JestChaiExpect, JestAsymmetricMatchers]) chai.use(plugin);
export const { expect } = chai;
Object.assign(expect, globalThis[ASYMMETRIC_MATCHERS_OBJECT]);
setState({ assertionCalls: 0, isExpectingAssertions: false, environment: "node", testPath: "" }, expect);

const leftOut = new RegExp(process.env.MUTATION_WITHOUT || "^\\b$");
let claims = [];

/** The tests declared while `load` runs, as name and body. */
export function claimsOf(load) {
  claims = [];
  load();
  return claims;
}

const bodyOf = (a, b) => (typeof a === "function" ? a : b);
const each = (cases, run) => {
  for (const one of cases) run(Array.isArray(one) ? one : [one]);
};

export function it(name, a, b) {
  if (!leftOut.test(name)) claims.push({ name, body: bodyOf(a, b) });
}
it.each = (cases) => (name, a, b) =>
  each(cases, (args) => it(`${name} ${args[0]}`, () => bodyOf(a, b)(...args)));

export function describe(_name, a, b) {
  bodyOf(a, b)();
}
describe.each = (cases) => (_name, a, b) => each(cases, (args) => bodyOf(a, b)(...args));
