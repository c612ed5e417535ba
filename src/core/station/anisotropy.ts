/** The Reynolds-stress tensor without its size: how far from isotropy, and of which kind. */
export interface Anisotropy {
  /** Third invariant, ξ: from -1/6 (two equal large axes) to 1/3 (one). */
  readonly xi: number;
  /** Second invariant, η: 0 if isotropic, at most 1/3. */
  readonly eta: number;
  /** Barycentric weights of the one-, two- and three-component limits; they add up to 1, none is negative. */
  readonly weights: readonly [number, number, number];
}

/**
 * Invariants and barycentric position of the anisotropy tensor b_ij = <u_i u_j>/(2k) - δ_ij/3,
 *     6 η² = b_ij b_ij,   6 ξ³ = b_ij b_jk b_ki,
 *     C1 = λ1 - λ2,  C2 = 2 (λ2 - λ3),  C3 = 3 λ3 + 1,   λ1 ≥ λ2 ≥ λ3 the eigenvalues of b.
 * A trace of zero leaves λ³ - 3 η² λ - 2 ξ³ = 0, whose roots are 2 η cos φ with cos 3φ = (ξ/η)³.
 * @param uu,vv,ww,uv,uw,vw  stresses, (unit of u)²
 * @returns NaN throughout where a stress is not known. C3 < 0: no velocities can have these stresses
 * @see   Pope (2000) §11.3.2; Banerjee et al. (2007), J. Turbulence 8, N32
 */
export function anisotropy(
  uu: number,
  vv: number,
  ww: number,
  uv: number,
  uw: number,
  vw: number,
): Anisotropy {
  const trace = uu + vv + ww;
  const [a, b, c] = [uu, vv, ww].map((stress) => stress / trace - 1 / 3);
  const [d, e, f] = [uv, uw, vw].map((stress) => stress / trace);
  const second = a * a + b * b + c * c + 2 * (d * d + e * e + f * f);
  // trace b³ = 3 det b where the trace of b is zero
  const third = 3 * (a * (b * c - f * f) - d * (d * c - f * e) + e * (d * f - b * e));
  const eta = Math.sqrt(second / 6);
  const xi = Math.cbrt(third / 6);
  const angle = eta > 0 ? Math.acos(Math.min(1, Math.max(-1, (xi / eta) ** 3))) / 3 : eta;
  const [l1, l3, l2] = [0, 1, 2].map((turn) => 2 * eta * Math.cos(angle + (2 * Math.PI * turn) / 3));
  return { xi, eta, weights: [l1 - l2, 2 * (l2 - l3), 3 * l3 + 1] };
}
