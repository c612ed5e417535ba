import { cellIntegrals, logarithmicGrid } from "./quadrature.mjs";

/**
 * One-dimensional spectra of isotropic turbulence from its energy spectrum, one-sided (∫ E11 dk1 = u'²):
 *     E11(k1) = ∫_{k1}^∞ (E/κ)(1 - k1²/κ²) dκ,   E22(k1) = ½ ∫_{k1}^∞ (E/κ)(1 + k1²/κ²) dκ
 * @param {(kappa: number) => number} energy E(κ), m³/s²
 * @param {[number, number]} range first and last wavenumber, rad/m, outside which E is nothing
 * @returns k1 (rad/m, ascending, logarithmic, 200 a decade), E11 and E22 there (m³/s²), both flat below the first k1
 * @see Pope (2000) eqs. 6.216-6.218
 */
export function oneDimensionalSpectra(energy, [first, last]) {
  const count = Math.ceil(200 * Math.log10(last / first));
  const k1 = logarithmicGrid(first, last, count);
  const [plain, steep] = cellIntegrals((kappa) => {
    const value = energy(kappa) / kappa;
    return [value, value / (kappa * kappa)];
  }, k1);
  const E11 = new Float64Array(count + 1);
  const E22 = new Float64Array(count + 1);
  let above = 0;
  let aboveSteep = 0;
  for (let i = count - 1; i >= 0; i--) {
    above += plain[i];
    aboveSteep += steep[i];
    E11[i] = Math.max(0, above - k1[i] ** 2 * aboveSteep);
    E22[i] = (above + k1[i] ** 2 * aboveSteep) / 2;
  }
  return { k1, E11, E22 };
}

/**
 * ∫ k1^power E dk1 of a tabulated spectrum, from 0 on (flat below the first k1), by the trapezoid in ln k1.
 * @param {Float64Array} k1 logarithmic grid
 * @param {Float64Array} E values on it
 * @param {number} power 0 for the variance, 2 for the mean-square gradient
 */
export function moment(k1, E, power) {
  let sum = (E[0] * k1[0] ** (power + 1)) / (power + 1);
  for (let i = 1; i < k1.length; i++) {
    const step = Math.log(k1[i] / k1[i - 1]);
    sum += ((E[i - 1] * k1[i - 1] ** (power + 1) + E[i] * k1[i] ** (power + 1)) / 2) * step;
  }
  return sum;
}

/** Integral scale from the spectrum's low end, L11 = π E11(0) / (2 u'²); Pope (2000) eqs. 6.213-6.214. */
export function integralScale(k1, E11) {
  return (Math.PI * E11[0]) / (2 * moment(k1, E11, 0));
}
