import { describe, expect, it } from "vitest";
import { missing } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { balanceSentences } from "../../../src/export/sentences/balanceSentences.ts";
import { compareSentences } from "../../../src/export/sentences/compareSentences.ts";
import {
  decaySentences,
  exponentText,
  hypothesisSentence,
} from "../../../src/export/sentences/decaySentences.ts";
import { isotropySentences, settledFrom } from "../../../src/export/sentences/isotropySentences.ts";
import { plainText, type Sentence, say } from "../../../src/export/sentences/piece.ts";
import {
  cancelWords,
  failureSentence,
  readingSentence,
} from "../../../src/export/sentences/progressSentences.ts";
import { recordSentences } from "../../../src/export/sentences/recordSentences.ts";
import { scaleSentences } from "../../../src/export/sentences/scaleSentences.ts";
import type { SentenceCase } from "../../../src/export/sentences/sentenceCase.ts";
import { spectrumSentences } from "../../../src/export/sentences/spectrumSentences.ts";
import { madeComparison } from "../../figures/madeComparison.ts";
import { madePair } from "../../figures/powerLawCase.ts";

const cases: readonly SentenceCase[] = madePair.map((of) => ({ ...of, units: "SI" }));
const [screen, simulation] = cases;
/** Narrow spaces as plain ones, so that a line can be read here. */
const read = (sentences: readonly Sentence[]) => sentences.map(plainText).join(" ").replaceAll("\u202f", " ");
const change = (of: SentenceCase, edit: (station: StationResult, i: number) => Partial<StationResult>) => ({
  ...of,
  stations: of.stations.map((station, i) => ({ ...station, ...edit(station, i) })),
});

describe("the sentence of the decay", () => {
  const text = read(decaySentences(cases, madeComparison));
  it("gives exponent and origin of every case with intervals, and the window", () => {
    expect(text).toMatch(
      /^In screen the energy decays with exponent n = 1\.25 \(\d\.\d\d to \d\.\d\d\) from a virtual origin x0 = 3\.2 M \(\d\.\d to \d\.\d\), fitted over x = 0\.30 to 1\.80 m; in simulation with exponent n = 1\.27/,
    );
  });
  it("says that a common exponent is not excluded, never that it is confirmed", () => {
    expect(text).toContain("One exponent for both cases, 1.26 (1.21 to 1.31), is not excluded (p = 0.81).");
    const apart = { ...madeComparison, common_n: { ...madeComparison.common_n, p: 0.0002 } };
    expect(read(decaySentences(cases, apart))).toContain(
      "is excluded by these data in these windows (p < 0.001)",
    );
  });
  it("gives the reason where no law is given", () => {
    const decay = screen.decay && {
      ...screen.decay,
      law: null,
      n: missing("three stations lie in the window."),
    };
    expect(read(decaySentences([{ ...screen, decay }]))).toBe(
      "No law is given for screen: three stations lie in the window.",
    );
  });
  it("names what was taken for granted of components that were not measured", () => {
    const decay = screen.decay && { ...screen.decay, assumption: "axisymmetric" as const };
    expect(read(decaySentences([{ ...screen, decay }]))).toContain("the energy (axisymmetry assumed) decays");
  });
  it("gives the origin in metres where there is no reference length", () => {
    expect(read(decaySentences([{ ...screen, length: null }]))).toMatch(/x0 = 0\.08\d* m/);
  });
  it("says of each hypothesis whether these data exclude it", () => {
    expect(read([hypothesisSentence(screen)])).toBe(
      "In screen n = 6/5 (Saffman, p = 0.06) is not excluded; 10/7 (Loitsyansky, p < 0.001) is excluded by these data in this window.",
    );
  });
  it("writes theoretical exponents as fractions", () => {
    expect([6 / 5, 10 / 7, 1, 5 / 2, 1.234].map(exponentText)).toEqual(["6/5", "10/7", "1", "5/2", "1.23"]);
  });
});

describe("the sentence of the records", () => {
  it("counts stations, files and what lies outside the windows", () => {
    expect(read(recordSentences(cases, { files: 33, failed: 0 }))).toBe(
      "33 stations were read from 33 files. Four stations of screen and five of simulation lie outside the fit windows.",
    );
  });
  it("says how many files could not be used", () => {
    expect(read(recordSentences(cases, { files: 35, failed: 2 }))).toMatch(
      /^33 of 35 files were read.* Two could not be used\./,
    );
  });
  it("says that records without an interval are left out of the fit", () => {
    const flagged = change(screen, ({ x }) => ({
      flags: x === 1.6 ? [{ code: "short-record", text: "short" }] : [],
    }));
    expect(read(recordSentences([flagged], { files: 16, failed: 0 }))).toContain(
      "One record is too short for an interval and is left out of the fit.",
    );
  });
});

describe("the sentence of the isotropy", () => {
  it("gives the ratio with its interval and from where it stays within the tolerance", () => {
    expect(read(isotropySentences([screen], 0.1))).toMatch(
      /^In screen u′\/v′ is 1\.0\d+ \(.*\) at 1\.80 m and stays within 10 % of one from 0\.40 m on\.$/,
    );
  });
  it("does not call settled what leaves the tolerance again downstream", () => {
    const strayed = change(screen, (_, i) =>
      i === 15 ? { isotropy_uv: { value: 1.3, low: 1.2, high: 1.4 } } : {},
    );
    expect(settledFrom(strayed.stations, "isotropy_uv", 0.1)).toBeNull();
  });
  it("gives the reason where v was not measured", () => {
    const alone = change(screen, () => ({ isotropy_uv: missing("v was not measured") }));
    expect(read(isotropySentences([alone], 0.1))).toBe(
      "u′/v′ cannot be given for screen: v was not measured.",
    );
  });
});

describe("the sentences of scales and spectra", () => {
  it("give the scales in millimetres at the last station of the window", () => {
    expect(read(scaleSentences([screen]))).toMatch(
      /L11 = 17\.\d mm \(.*\), λ_g = \d\.\d\d mm .* at 1\.80 m\./,
    );
  });
  it("compare the growth of L11 with what a constant C_epsilon asks for", () => {
    expect(read(scaleSentences([screen]))).toContain("asks for 1 − n/2 = 0.38.");
  });
  it("say that a viscosity is missing", () => {
    const inviscid = change(screen, () => ({ lambda: missing("the viscosity is not known") }));
    expect(read(scaleSentences([inviscid]))).toContain(
      "λ_g, η and Re_λ cannot be given for screen: the viscosity is not known.",
    );
  });
  it("claim no inertial range without its dissipation", () => {
    const picked = [{ of: screen, station: screen.stations[5], letter: "a" }];
    expect(read(spectrumSentences(picked))).toContain("No inertial range is claimed: Re_λ is below 100.");
  });
});

describe("the sentence of the spectra", () => {
  it("gives once what several stations lack", () => {
    const picked = ["a", "b"].map((letter, i) => ({
      of: screen,
      station: {
        ...screen.stations[5 + i],
        epsilon_inertial: missing(`Re_lambda is ${56 + i}.4: an inertial range needs more than 100`),
      },
      letter,
    }));
    expect(read(spectrumSentences(picked))).toContain(
      "No inertial range is claimed at any of them; in Re_λ an inertial range needs more than 100.",
    );
  });
});

describe("the sentence of the balance", () => {
  it("does not count a station without an interval as open", () => {
    const bare = change(screen, () => ({
      balance: { value: 0.97, low: null, high: null, why_low: "a profile", why_high: "a profile" },
    }));
    expect(read(balanceSentences([bare], 0.1))).toContain("no interval can be given.");
  });
  it("says at how many stations the interval holds one", () => {
    expect(read(balanceSentences([screen], 0.1))).toContain("its interval holds one at all 12 stations.");
  });
  it("says what a shortfall of the gradients means", () => {
    expect(read(balanceSentences([simulation], 0.1))).toContain(
      "carry 70 % of the dissipation that the decay asks for: λ_g, η and Re_λ from gradients are upper bounds.",
    );
  });
});

describe("the sentence of a balance below one", () => {
  it("says what gradients mean that carry more than the decay asks for", () => {
    const noisy = change(screen, () => ({ balance: { value: 0.8, low: 0.78, high: 0.82 } }));
    expect(read(balanceSentences([noisy], 0.1))).toContain(
      "The gradients of screen carry 1.25 times the dissipation that the decay asks for: noise taken for gradients",
    );
    const within = change(screen, () => ({ balance: { value: 0.93, low: 0.9, high: 0.96 } }));
    expect(read(balanceSentences([within], 0.1))).not.toContain("times the dissipation");
  });
});

describe("the sentences of two cases side by side", () => {
  const text = read(compareSentences(madeComparison, [screen, simulation]));
  it("give each verdict in words, with what was not compared", () => {
    expect(text).toContain("the cases are equivalent within 10 % in Tu and u′/v′.");
    expect(text).toContain("λ_g is different: 15.0 % (11.0 to 19.0) larger in simulation.");
    expect(text).toContain("L11 and Re_λ are undecided: the data are too few for 10 %.");
    expect(text).toContain("η is not compared: the viscosity of the simulation is not known.");
  });
  it("open with the place from which on all chosen quantities agree, and with what the second case needs", () => {
    expect(text).toMatch(
      /^Beyond \(x − x0\)\/M = 24 screen and simulation are equivalent within 10 % in Tu and L11, and simulation needs 6\.1 M \(3\.2 to 9\.2\) less, with one exponent for all\./,
    );
  });
  it("say that the whole common range agrees, or from no place on, with the reason", () => {
    const beyond = madeComparison.equivalent_beyond;
    const said = (equivalent_beyond: typeof beyond) =>
      read(compareSentences({ ...madeComparison, equivalent_beyond }, [screen, simulation]));
    expect(said({ ...beyond, from: 13, why: null })).toMatch(
      /^Over the whole common range, \(x − x0\)\/M = 13 to 67, screen and simulation are equivalent/,
    );
    expect(
      said({ ...beyond, from: null, why: "the stretch before departs by more than the tolerance" }),
    ).toMatch(
      /^From no place on are screen and simulation shown to be equivalent within 10 % in Tu and L11 at once: the stretch/,
    );
  });
  it("give the shift of the origin with its direction, and beside it the distance at equal intensity", () => {
    expect(text).toContain(
      "The origin of simulation lies 6.1 M (3.2 to 9.2) further upstream than that of screen; where screen has Tu = 3.20 % (3.10 to 3.30), at x = 0.60 m, simulation has the same 6.0 M (3.6 to 8.8) further upstream.",
    );
  });
  it("hold the spectra of the middle pair against chance, and count the pairs beyond it", () => {
    expect(text).toContain(
      "the spectra at (x − x0)/M = 37 lie D = 0.090 apart, no more than chance makes of two spectra of one turbulence (0.10, p = 0.60); of two such pairs of stations one lies farther apart",
    );
  });
  it("say that no shift is not excluded where the interval holds zero", () => {
    const unsure = { ...madeComparison, extra_distance: { value: -0.01, low: -0.1, high: 0.08 } };
    expect(read(compareSentences(unsure, [screen, simulation]))).toContain(
      "further upstream than that of screen (no shift is not excluded either)",
    );
  });
  it("count a smaller value in the direction of the change", () => {
    const { lambda } = madeComparison.quantities;
    const smaller = { ...lambda, ratio: { value: 0.85, low: 0.81, high: 0.89 } };
    const fewer = { ...madeComparison, quantities: { ...madeComparison.quantities, lambda: smaller } };
    expect(read(compareSentences(fewer, [screen, simulation]))).toContain(
      "λ_g is different: 15.0 % (11.0 to 19.0) smaller in simulation.",
    );
  });
  it("give the reason where nothing can be compared", () => {
    const none = { ...madeComparison, why: "the windows do not overlap" };
    expect(read(compareSentences(none, [screen, simulation]))).toMatch(
      /^screen and simulation cannot be compared: the windows do not overlap\./,
    );
  });
});

describe("lines about files", () => {
  it("give place, fact and remedy, and set the file's own text apart", () => {
    const line = failureSentence({
      code: "not-a-number",
      message: "`6.1.4` is not a number",
      remedy: "Leave the line out or mend it.",
      where: { file: "run_x0700.csv", line: 48213, column: 3 },
    });
    expect(read([line])).toBe(
      "run_x0700.csv line 48 213, column 3: 6.1.4 is not a number. Leave the line out or mend it.",
    );
    expect(line.filter(({ kind }) => kind === "verbatim")).toHaveLength(2);
  });
  it("say how far reading has come", () => {
    const progress = { filesDone: 14, files: 33, bytesDone: 2.5e9, bytes: 5.4e9 };
    expect(read([readingSentence(progress)])).toMatch(/^14 of 33 files are reduced, 2\.5 GB of 5\.4 GB\./);
    expect(cancelWords(progress)).toBe("Cancel, keep the 14");
  });
});

describe("every sentence", () => {
  it("keeps a symbol and its value on one line", () => {
    const [law] = decaySentences([screen]);
    const held = law.filter((piece) => piece.kind === "together");
    expect(held.map((piece) => plainText([piece]).replaceAll("\u202f", " "))).toEqual([
      "n = 1.25",
      "x0 = 3.2 M",
    ]);
  });
  it("names a case by its mark, so that the page can draw it", () => {
    const [law] = decaySentences(cases);
    expect(law.filter((piece) => piece.kind === "case")).toEqual([
      { kind: "case", mark: 0, name: "screen" },
      { kind: "case", mark: 1, name: "simulation" },
    ]);
  });
  it("holds no word that claims more than was tested", () => {
    const all = read([
      ...decaySentences(cases, madeComparison),
      ...isotropySentences(cases, 0.1),
      ...scaleSentences(cases),
      ...balanceSentences(cases, 0.1),
      ...compareSentences(madeComparison, [screen, simulation]),
    ]);
    expect(all).not.toMatch(/significant|confirm|prove|success|!|NaN|undefined|null/i);
  });
  it("puts strings, pieces and sentences into a template in order", () => {
    expect(plainText(say`a ${"b"} ${{ kind: "strong", text: "c" }} ${say`d`}.`)).toBe("a b c d.");
  });
});
