import { describe, expect, it } from "vitest";
import { symbolParts } from "../../../src/app/sections/symbolParts.ts";
import { runsText } from "../../../src/export/sentences/piece.ts";

/** Symbols in brackets, raised parts in braces. */
const marked = (text: string) =>
  symbolParts(text)
    .map((part) =>
      part.kind === "symbol"
        ? `[${runsText(part.runs)}]`
        : part.kind === "raised"
          ? `{${part.text}}`
          : part.text,
    )
    .join("");

describe("the symbols in a plain text", () => {
  it.each([
    ["The spectrum of u ends in noise", "The spectrum of [u] ends in noise"],
    ["w was not measured and is taken like v.", "[w] was not measured and is taken like [v]."],
    ["lambda and eta are upper bounds", "[λ_g] and [η] are upper bounds"],
    ["2 L_v/L_u, one if isotropic", "2 [L_v]/[L_u], one if isotropic"],
    ["ε = −U dk/dx", "[ε] = −[U] [dk]/[dx]"],
    ["∫ k₁² E₁₁ dk₁", "∫ [k1]² [E11] [dk1]"],
    ["Tu = √(2k/3)/U", "[Tu] = √(2[k]/3)/[U]"],
    ["q = A ((x − x0)/ℓ)^(−n)", "[q] = [A] (([x] − [x0])/ℓ){−n}"],
    ["⟨uv⟩/(u′v′)", "⟨[uv]⟩/([u′][v′])"],
    ["The last x - x0 moves n by -2.8", "The last [x] − [x0] moves [n] by −2.8"],
    ["Student’s t with 4", "Student’s [t] with 4"],
  ])("%j", (text, expected) => expect(marked(text)).toBe(expected));

  it.each([
    "run_x0700.csv, line 48, column 3",
    "x0.3.csv and u.csv and lines/v.txt",
    "A station and a record of 3 m, 2 s and 6 m/s",
    "large-eddy simulation of run-2 in run-2.csv",
    "the beginning of the record differs from the rest",
  ])("there are none in %j", (text) => expect(marked(text)).toBe(text));
});
