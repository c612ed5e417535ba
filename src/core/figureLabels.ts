import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

/** Axes of the figures that are not quantities of a result. */
export const figureLabels: readonly Label[] = [
  label("t", "t", "time", "T", "time of a flow that decays in time"),
  label("ell", "ℓ", "reference length", "L", "mesh, diameter or chord that lengths are divided by"),
  label("nu", "ν", "kinematic viscosity", "L²/T", "viscosity over density"),
  label("x/ell", "x/ℓ", "position over reference length", "1", "streamwise position over reference length"),
  label(
    "(x-x0)/ell",
    "(x − x_{0})/ℓ",
    "distance from the origin",
    "1",
    "distance from the virtual origin over ℓ",
  ),
  label("x-x0", "x − x_{0}", "distance from the virtual origin", "L", "distance from the virtual origin"),
  label("(t-t0)/ell", "(t − t_{0})/ℓ", "time from the origin", "1", "time from the virtual origin over ℓ"),
  label("t-t0", "t − t_{0}", "time from the origin", "T", "time from the virtual origin"),
  label("t/ell", "t/ℓ", "time over reference", "1", "time over its reference"),
  label("k/U2", "k/U^{2}", "energy over mean speed squared", "1", "k over the square of one speed per case"),
  label(
    "uu/U2",
    "⟨u^{2}⟩/U^{2}",
    "variance over mean speed squared",
    "1",
    "⟨u²⟩ over the square of one speed",
  ),
  label("length", '"length"', "length scales", "L", "integral, Taylor and Kolmogorov lengths", {
    milli: true,
  }),
  label(
    "length/ell",
    '"length"/ℓ',
    "length scales over reference length",
    "1",
    "lengths over reference length",
  ),
  label("residual", '"residual"', "residual from the law", "1", "value over law, less one", {
    percent: true,
  }),
  label("k1", "k_{1}", "streamwise wavenumber", "1/L", "k₁ = 2π f/U"),
  label("k1_eta", "k_{1}η", "wavenumber in Kolmogorov units", "1", "k₁ times η, with ε by the route adopted"),
  label("E11", "E_{11}", "one-sided spectrum of u", "L³/T²", "∫ E₁₁ dk₁ from zero to infinity is ⟨u²⟩"),
  label(
    "E11_compensated",
    "k_{1}^{5/3}E_{11}/ε^{2/3}",
    "compensated spectrum of u",
    "1",
    "level C₁ = 0.49 in an inertial range",
  ),
  label(
    "E11_kolmogorov",
    "E_{11}/(εν^{5})^{1/4}",
    "spectrum of u in Kolmogorov units",
    "1",
    "one curve for all flows at the dissipating end",
  ),
  label("rho", "ρ_{uu}", "autocorrelation of u", "1", "⟨u(t) u(t + τ)⟩/⟨u²⟩"),
  label("lag", "τ", "time lag", "T", "time between the two factors of the correlation"),
  label("k1_L11", "k_{1}L_{11}", "wavenumber in integral scales", "1", "k₁ times L₁₁"),
  label(
    "E11_premultiplied",
    "k_{1}E_{11}/⟨u^{2}⟩",
    "premultiplied spectrum of u",
    "1",
    "equal areas over ln k₁ carry equal shares of the variance",
  ),
  label(
    "local_slope",
    "d ln E_{11}/d ln k_{1}",
    "local slope of the spectrum",
    "1",
    "d ln E₁₁/d ln k₁ over bands",
  ),
  label(
    "E22_over_isotropic",
    'E_{22}/E_{22,"isotropic"}',
    "isotropy scale by scale",
    "1",
    "E₂₂ over (E₁₁ − k₁ dE₁₁/dk₁)/2, one if isotropic",
  ),
  label("r/L11", "r/L_{11}", "separation over integral scale", "1", "r = U τ over the integral length"),
];
