import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { labelOf } from "../../src/core/catalogue.ts";
import { bare, estimate, missing } from "../../src/core/quantity.ts";
import { formatBytes } from "../../src/figures/formatBytes.ts";
import {
  formatCount,
  formatDigits,
  formatNumber,
  formatPosition,
  formatProbability,
} from "../../src/figures/formatNumber.ts";
import { formatQuantity, formatScaled, quantityText } from "../../src/figures/formatQuantity.ts";

const thin = "\u202f";

describe("numbers as they are printed", () => {
  it("have a true minus sign, and none where they round to zero", () => {
    expect(formatNumber(-2.94, 1)).toBe("\u22122.9");
    expect(formatNumber(-0.004, 2)).toBe("0.00");
  });
  it("are grouped by threes from a thousand up, but not behind the point", () => {
    expect(formatCount(48213)).toBe(`48${thin}213`);
    expect(formatCount(999)).toBe("999");
    expect(formatNumber(1234567.12345, 5)).toBe(`1${thin}234${thin}567.12345`);
  });
  it("turn to powers of ten below a thousandth", () => {
    expect(formatDigits(1.51e-5, 3)).toBe(`1.51${thin}×${thin}10⁻⁵`);
    expect(formatDigits(0.00151, 3)).toBe("0.00151");
  });
  it("go to the next power where rounding carries them there", () => {
    expect(formatDigits(0.000997, 2)).toBe("0.0010");
    expect(formatDigits(9.97e-5, 2)).toBe(`1.0${thin}×${thin}10⁻⁴`);
    expect(formatDigits(-9.97e-5, 2)).toBe(`\u22121.0${thin}×${thin}10⁻⁴`);
  });
  it("give positions two decimals below ten and no more digits than they have", () => {
    expect(["0.3", "1.85", "0.0254", "40", "12.5"].map(Number).map(formatPosition)).toEqual([
      "0.30",
      "1.85",
      "0.0254",
      "40",
      "12.5",
    ]);
  });
  it("never print a probability as zero", () => {
    expect(formatProbability(0.0000012)).toContain("0.001");
    expect(formatProbability(0.81)).toBe("0.81");
  });
  it("print sizes in powers of a thousand", () => {
    expect(formatBytes(2.5e9)).toBe(`2.5${thin}GB`);
    expect(formatBytes(40_960)).toBe(`41${thin}kB`);
    expect(formatBytes(12)).toBe(`12${thin}B`);
  });
});

describe("a quantity with its interval", () => {
  it("shares decimals with it: two leading digits of its width", () => {
    const shown = formatQuantity(estimate(1.2537, 1.2012, 1.3088), labelOf("n"), "SI");
    expect([shown.value, shown.interval]).toEqual(["1.25", "1.20 to 1.31"]);
  });
  it("is shown in per cent or in millimetres where the catalogue says so", () => {
    expect(quantityText(formatQuantity(estimate(0.0334, 0.0324, 0.0345), labelOf("Tu"), "SI"))).toBe(
      `3.34${thin}% (3.24 to 3.45)`,
    );
    expect(quantityText(formatQuantity(estimate(0.0132, 0.0125, 0.0139), labelOf("L11"), "SI"))).toBe(
      `13.2${thin}mm (12.5 to 13.9)`,
    );
  });
  it("has no unit in a non-dimensional case", () => {
    expect(quantityText(formatQuantity(estimate(0.53, 0.5, 0.56), labelOf("L11"), "nondimensional"))).toBe(
      "0.530 (0.500 to 0.560)",
    );
  });
  it("says that one side is open", () => {
    const open = formatScaled(estimate(3.2, 1.1, Number.POSITIVE_INFINITY), { factor: 1, unit: "" });
    expect(open.interval).toBe("above 1.1");
    expect(open.why).toBe("no upper limit");
  });
  it("shows significant digits and the reason where there is no interval", () => {
    const shown = formatQuantity(bare(69.1234, "too short"), labelOf("Re_lambda"), "SI");
    expect([shown.value, shown.interval, shown.why]).toEqual(["69.1", null, "too short"]);
  });
  it("is a dash with its reason where it is missing", () => {
    const shown = formatQuantity(missing("no viscosity"), labelOf("eta"), "SI");
    expect([quantityText(shown), shown.why]).toEqual(["–", "no viscosity"]);
  });
  it("writes value and interval with one power of ten", () => {
    expect(quantityText(formatScaled(estimate(1.51e-5, 1.49e-5, 1.53e-5), { factor: 1, unit: "m²/s" }))).toBe(
      `1.510${thin}×${thin}10⁻⁵${thin}m²/s (1.490 to 1.530)`,
    );
  });
});

describe("printed values and intervals", () => {
  it("lose no more than a twentieth of the interval's width to rounding", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 1000, noNaN: true }),
        fc.double({ min: 0.001, max: 0.9, noNaN: true }),
        (value, share) => {
          const [low, high] = [value * (1 - share), value * (1 + share)];
          const { value: text } = formatScaled(estimate(value, low, high), { factor: 1, unit: "" });
          const printed = Number(text.replaceAll(thin, "").replace("\u2212", "-"));
          return Math.abs(printed - value) <= 0.05 * (high - low) + 1e-12 * value || high - low > 10;
        },
      ),
      { seed: 7, numRuns: 400 },
    );
  });
});
