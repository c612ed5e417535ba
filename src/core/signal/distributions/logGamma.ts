/** Lanczos's coefficients for g = 7, nine terms. */
const lanczos = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

/**
 * Logarithm of the gamma function,
 *     ln Γ(a) = ln √(2π) + (a - ½) ln t - t + ln Σ c_i/(a - 1 + i),   t = a + 6.5
 * @param a  > 0
 * @returns  ln Γ(a), good to some 15 digits
 * @see      Lanczos (1964), SIAM J. Numer. Anal. B 1, 86
 */
export function logGamma(a: number): number {
  if (a < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * a)) - logGamma(1 - a);
  const z = a - 1;
  let sum = lanczos[0];
  for (let i = 1; i < lanczos.length; i++) sum += lanczos[i] / (z + i);
  const t = z + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (z + 0.5) * Math.log(t) - t + Math.log(sum);
}
