import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

const milli = { milli: true } as const;
const two = { digits: 2 } as const;
const byDifferences = "mean square of (∂u/∂x) by central differences, without the cut of the noise";

/** Every estimator beside the adopted one: the keys of `routes`. */
export const routeLabels: readonly Label[] = [
  label("T_int_zero-crossing", 'T_{"int"}', "to the first zero", "T", "∫ ρ dτ to the first zero of ρ", milli),
  label("T_int_one-over-e", "τ_{1/e}", "lag at 1/e", "T", "the lag at which ρ has fallen to 1/e", milli),
  label(
    "T_int_exponential",
    'T_{"exp"}',
    "exponential fit",
    "T",
    "decay time of an exponential fitted to ρ above 0.2",
    milli,
  ),
  label(
    "T_int_low-frequency",
    "T_{0}",
    "low-frequency limit",
    "T",
    "E(0)/(4 ⟨u²⟩), from ln E as a line in f² at low frequency",
    milli,
  ),
  label(
    "T_int_model",
    'T_{"model"}',
    "model spectrum",
    "T",
    "integral time of the model spectrum fitted to E₁₁",
    milli,
  ),
  label("L_v", "L_{v}", "transverse scale, v", "L", "U ∫ ρ_v dτ up to the first zero of ρ_u", milli),
  label("L_w", "L_{w}", "transverse scale, w", "L", "U ∫ ρ_w dτ up to the first zero of ρ_u", milli),
  label("lambda_f", "λ_{f}", "longitudinal Taylor microscale", "L", "λ_f = √2 λ_g", milli),
  label(
    "lambda_gradient",
    'λ_{"gradient"}',
    "Taylor microscale from gradients",
    "L",
    "u′/√⟨(∂u/∂x)²⟩, whatever route of the dissipation is adopted",
    milli,
  ),
  label(
    "eta_gradient",
    'η_{"gradient"}',
    "Kolmogorov scale from gradients",
    "L",
    "(ν³/ε)^(1/4) with ε from the gradients, whatever route is adopted",
    milli,
  ),
  label(
    "Re_lambda_gradient",
    'Re_{λ "gradient"}',
    "Taylor Reynolds number from gradients",
    "1",
    "u′ λ_g/ν with λ_g from the gradients, whatever route is adopted",
  ),
  label("gradient_u", "⟨(∂u/∂x)^{2}⟩", "gradient of u", "1/T²", "∫ k₁² E₁₁ dk₁, corrected"),
  label("gradient_v", "⟨(∂v/∂x)^{2}⟩", "gradient of v", "1/T²", "∫ k₁² E₂₂ dk₁, corrected"),
  label("gradient_w", "⟨(∂w/∂x)^{2}⟩", "gradient of w", "1/T²", "∫ k₁² E₃₃ dk₁, corrected"),
  label(
    "gradient_difference2",
    '⟨(∂u/∂x)^{2}⟩_{"2nd"}',
    "second-order differences",
    "1/T²",
    `${byDifferences}, second order`,
  ),
  label(
    "gradient_difference4",
    '⟨(∂u/∂x)^{2}⟩_{"4th"}',
    "fourth-order differences",
    "1/T²",
    `${byDifferences}, fourth order`,
  ),
  label("epsilon_u-gradient", "ε_{u}", "gradient of u alone", "L²/T³", "ε = 15 ν ⟨(∂u/∂x)²⟩"),
  label(
    "epsilon_all-gradients",
    "ε_{uvw}",
    "gradients of all components",
    "L²/T³",
    "ε = 3 ν (⟨(∂u/∂x)²⟩ + ⟨(∂v/∂x)²⟩ + ⟨(∂w/∂x)²⟩)",
  ),
  label(
    "epsilon_second-order",
    "ε_{LL}",
    "second-order structure function",
    "L²/T³",
    "largest value of (D_LL/2)^(3/2)/r, a lower bound",
  ),
  label(
    "epsilon_third-order",
    "ε_{LLL}",
    "third-order structure function",
    "L²/T³",
    "largest value of −(5/4) D_LLL/r, a lower bound",
  ),
  label("skewness_u", "S_{u}", "skewness of u", "1", "⟨u³⟩/u′³", two),
  label("skewness_v", "S_{v}", "skewness of v", "1", "⟨v³⟩/v′³", two),
  label("skewness_w", "S_{w}", "skewness of w", "1", "⟨w³⟩/w′³", two),
  label("flatness_u", "F_{u}", "flatness of u", "1", "⟨u⁴⟩/u′⁴, 3 for a Gaussian"),
  label("flatness_v", "F_{v}", "flatness of v", "1", "⟨v⁴⟩/v′⁴, 3 for a Gaussian"),
  label("flatness_w", "F_{w}", "flatness of w", "1", "⟨w⁴⟩/w′⁴, 3 for a Gaussian"),
  label("K_v", "K_{v}", "small-scale isotropy, v", "1", "2⟨(∂u/∂x)²⟩/⟨(∂v/∂x)²⟩, one if isotropic"),
  label("K_w", "K_{w}", "small-scale isotropy, w", "1", "2⟨(∂u/∂x)²⟩/⟨(∂w/∂x)²⟩, one if isotropic"),
];
