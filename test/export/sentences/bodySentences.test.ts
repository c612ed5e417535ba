import { describe, expect, it } from "vitest";
import {
  beyondTargetSentences,
  bodySentences,
  leastMissPlace,
  noBodySentence,
} from "../../../src/export/sentences/bodySentences.ts";
import { developmentSentences } from "../../../src/export/sentences/developmentSentences.ts";
import { bestPlans, narrowingSentences } from "../../../src/export/sentences/narrowingSentences.ts";
import { plainText, type Sentence } from "../../../src/export/sentences/piece.ts";
import { arguedCase, screenLaw } from "../../support/arguedCase.ts";
import { known } from "../../support/lawStations.ts";

/** Narrow spaces as plain ones, so that a line can be read here. */
const read = (sentences: readonly Sentence[]) => sentences.map(plainText).join(" ").replaceAll("\u202f", " ");
const body = { x: 0.9, chord: 0.02, Tu: 0.025, L11: 1.2 };
/** By the law itself: √(2 A/3) ((0.9 m − 3 M)/M)^(−n/2) = 2.249 %, 5 mm ((0.9 m − 3 M)/M)^0.375 = 18.55 mm. */
const screen = arguedCase({ settings: { body } });
const further = arguedCase({
  name: "simulation",
  mark: 1,
  law: { ...screenLaw, A: 0.09, x0: -0.07 },
  settings: { body: { ...body, Tu: 0.015 } },
});

describe("the sentence at the body", () => {
  it("gives intensity and length there with their intervals, and where each target is met", () => {
    expect(read(bodySentences([screen]))).toMatch(
      /^At the body, x = 0\.90 m, Tu is 2\.249 % \(2\.2\d+ to 2\.2\d+\) and L11\/c 0\.928 \(0\.\d+ to 0\.\d+\) in screen\. The target Tu = 2\.5 % is met at 0\.77\d* m \(.*\) in screen\. The target L11\/c = 1\.2 is met at 1\.71\d* m \(.*\) in screen\.$/,
    );
  });
  it("says why a target is met nowhere", () => {
    expect(read(bodySentences([screen, further]))).toContain(
      "The target Tu = 1.5 % is met nowhere in simulation: the intensity is 1.03 times the target at the last station still.",
    );
  });
  it("gives the length in millimetres where there is no chord", () => {
    const plain = arguedCase({ settings: { body: { x: 0.9, chord: null, Tu: null, L11: null } } });
    expect(read(bodySentences([plain]))).toMatch(/and L11 18\.5\d mm \(.*\) in screen\.$/);
  });
  it("says once for all cases that the place lies beyond the stations", () => {
    const beyond = { ...body, x: 3, Tu: null, L11: null };
    const cases = [
      arguedCase({ settings: { body: beyond } }),
      arguedCase({ name: "b", settings: { body: beyond } }),
    ];
    expect(read(bodySentences(cases))).toBe(
      "Tu and L11 cannot be given at x = 3.00 m in screen and b: the place lies beyond the last station that carries it.",
    );
  });
  it("gives the place of the smallest miss, and the intensity at the inflow as extrapolated", () => {
    const text = read(beyondTargetSentences([screen]));
    expect(text).toMatch(
      /missed least in screen at 1\.0\d m, where Tu is 0\.8\d+ times and L11\/c 0\.8\d+ times/,
    );
    // the law of the same n and x0 that gives 2.5 % at 0.9 m has 2.5 % ((0.9 m - x0)/(0.2 m - x0))^(n/2) at 0.2 m
    const needed = 2.5 * ((0.9 - 0.075) / (0.2 - 0.075)) ** (1.25 / 2);
    expect(text).toMatch(
      new RegExp(`inflow would need ${needed.toFixed(1)}\\d* % .* at x = 0\\.20 m in screen`),
    );
    expect(text).toContain("extrapolated");
    expect(leastMissPlace(1.03549)).toBe(1.04);
  });
  it("says what to set where no body is placed", () => {
    expect(read([noBodySentence(screen, 1.8)])).toBe(
      "No body is placed: type where it stands, or take the last station, x = 1.80 m, and move it on the ruler.",
    );
    expect(bodySentences([arguedCase()])).toEqual([]);
  });
});

describe("the sentence of development", () => {
  /** u'/v' falls to one; S is there or is not. */
  const settling = (error: number, S: number | null = null) =>
    arguedCase({
      edit: ({ x }) => ({
        isotropy_uv: known(1 + 0.4 * Math.exp(-(x - 0.2) / 0.15), error),
        ...(S === null ? {} : { S_dudx: { value: S, low: S - 0.02, high: S + 0.02 } }),
      }),
    });
  it("gives both readings, and what holds last", () => {
    const text = read(developmentSentences([settling(0.01, -0.4)]));
    expect(text).toMatch(
      /^In screen all that is asked is contradicted by no interval from 0\.\d+ m .*on, and borne out by every interval from 0\.\d+ m .*on, u′\/v′ within 10 % of one last\.$/,
    );
  });
  it("says what the last station contradicts, and what cannot be judged", () => {
    expect(read(developmentSentences([settling(0.01, -0.1)]))).toContain(
      "In screen S below −0.3 does not hold at the last station. The rest is contradicted by no interval from",
    );
    expect(read(developmentSentences([settling(0.01)]))).toContain(
      "In screen S below −0.3 cannot be judged:",
    );
  });
  it("says what wide intervals never bear out", () => {
    expect(read(developmentSentences([settling(0.2, -0.4)]))).toMatch(
      /u′\/v′ within 10 % of one.* borne out by every interval nowhere/,
    );
  });
});

describe("the sentence of what would narrow the intervals", () => {
  it("names the best new station and the best longer record, with what they gain", () => {
    expect(read(narrowingSentences([screen]))).toMatch(
      /^In screen one more station at x = \d\.\d+ m would narrow the interval of n by \d+ % and of x0 by \d\.\d %; a record twice as long at x = \d\.\d+ m would narrow/,
    );
  });
  it("takes the first of each kind: the list is in the order of the gain", () => {
    const plan = (kind: "station" | "record", x: number) => ({ kind, x, n: 0.9, x0: 0.9 });
    expect(bestPlans([plan("record", 1), plan("record", 2), plan("station", 3)])).toEqual([
      plan("station", 3),
      plan("record", 1),
    ]);
  });
});
