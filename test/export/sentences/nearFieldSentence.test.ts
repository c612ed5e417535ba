import { describe, expect, it } from "vitest";
import type { DissipationConstant } from "../../../src/core/decayArgument.ts";
import { dissipationConstantSentence } from "../../../src/export/sentences/dissipationConstantSentence.ts";
import { plainText, type Sentence } from "../../../src/export/sentences/piece.ts";
import { scanSentences } from "../../../src/export/sentences/scanSentences.ts";
import type { SentenceCase } from "../../../src/export/sentences/sentenceCase.ts";
import { arguedCases } from "../../support/arguedCases.ts";

const read = (sentences: readonly Sentence[]) => sentences.map(plainText).join(" ").replaceAll("\u202f", " ");
const screen: SentenceCase = { ...arguedCases({}, 0.01)[0], units: "SI" };
const { decay } = screen;
if (!decay?.argument) throw new Error("the case is not argued");
const { argument } = decay;

describe("the sentence of a suspected near field", () => {
  const text = "It dies out gradually.";
  it("gives n over every start that leaves five stations", () => {
    const flagged = { ...decay, flags: [{ code: "near-field" as const, text }] };
    expect(read(scanSentences({ ...screen, decay: flagged }))).toMatch(
      /A rest of a near field may hide in the window: over all eight starts that leave five stations n is \d\.\d+ \(\d\.\d+ to \d\.\d+\)\./,
    );
  });
  it("is not said without the flag", () => {
    const clean = { ...decay, flags: [] };
    expect(read(scanSentences({ ...screen, decay: clean }))).not.toContain("near field");
  });
});

describe("the sentence of C_epsilon", () => {
  const withConstant = (dissipationConstant: DissipationConstant) =>
    read(
      dissipationConstantSentence({
        ...screen,
        decay: { ...decay, argument: { ...argument, dissipationConstant } },
      }),
    );
  const mean = { value: 1.06, low: 0.99, high: 1.14 };

  it("says that it stays where the interval of its exponent holds zero", () => {
    const exponent = { value: 0.07, low: -0.05, high: 0.19 };
    expect(withConstant({ mean, exponent, constant: true, p: 0.95 })).toBe(
      "In screen C_ε = 1.06 (0.99 to 1.14) all along the window (scatter about it: p = 0.95): no exponent but zero is asked for.",
    );
  });
  it("says which way it goes where it does not", () => {
    const exponent = { value: -0.2, low: -0.25, high: -0.15 };
    expect(withConstant({ mean, exponent, constant: false, p: 0.001 })).toContain(
      "C_ε falls along the window",
    );
  });
  it("is not said where no station carries it", () => {
    const none = { value: null, why: "no viscosity" } as const;
    expect(withConstant({ mean: none, exponent: none, constant: null, p: null })).toBe("");
  });
});
