const pope = "Pope (2000)";
const common = "common practice, no source";
const own = "a definition of this program";
const kolmogorov = "Kolmogorov (1941); Pope (2000)";
const gradients = "Pope (2000); Lumley (1965); Wyngaard and Clifford (1977)";
const banerjee = "Banerjee, Krahl, Durst and Zenger (2007)";

/** Who says so, where it is not Pope (2000): the keys of the labels, by source. */
const bySource: readonly (readonly [source: string, keys: readonly string[]])[] = [
  [
    common,
    [
      ...["x", "t", "ell", "nu", "samples", "duration", "step", "q", "U", "uu", "vv", "ww", "uv", "uw", "vw"],
      ...["Tu", "isotropy_uv", "isotropy_uw", "T_int_one-over-e", "T_int_exponential", "lag", "local_slope"],
      ...["skewness_u", "skewness_v", "skewness_w", "flatness_u", "flatness_v", "flatness_w"],
      ...["rho_uv", "rho_uw", "rho_vw", "gradient_difference2", "gradient_difference4", "k/U2", "uu/U2"],
      ...["x/ell", "(x-x0)/ell", "x-x0", "(t-t0)/ell", "t-t0", "t/ell", "length", "length/ell", "residual"],
      ...["correlation_n_x0", "chi2_reduced", "p", "common_n", "m"],
    ],
  ],
  [
    own,
    [
      ...["gradient_difference2_expected", "gradient_difference4_expected", "balance", "largest"],
      ...[
        "extra_distance",
        "matched_distance",
        "matched_x",
        "(s-s0)/ell",
        "s-s0",
        "block_mean",
        "block_variance",
      ],
      ...["lambda_gradient", "eta_gradient", "Re_lambda_gradient", "L_v_ratio", "L_w_ratio"],
    ],
  ],
  [kolmogorov, ["epsilon_second-order", "epsilon_third-order"]],
  [gradients, ["gradient_u", "gradient_v", "gradient_w"]],
  [banerjee, ["barycentric_1", "barycentric_2", "barycentric_3"]],
  ["von Karman (1948)", ["T_int_model"]],
  ["Pope (2000); Welch (1967)", ["E11"]],
  ["Bendat and Piersol (2010)", ["E12_premultiplied"]],
];

/** Every key that has a source of its own here. */
export const sourcedKeys: readonly string[] = bySource.flatMap(([, keys]) => keys);

const sources = new Map(bySource.flatMap(([source, keys]) => keys.map((key) => [key, source] as const)));

/** The source of a label that names none itself. */
export function sourceOf(key: string): string {
  return sources.get(key) ?? pope;
}
