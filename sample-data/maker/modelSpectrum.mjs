import { cellIntegrals, logarithmicGrid } from "./quadrature.mjs";

const C = 1.5;
const beta = 5.2;
const p0 = 2;

/**
 * Model spectrum of isotropic turbulence with its two constants solved for, so that it holds exactly the wanted
 * energy and dissipation:
 *     E(κ) = C ε^(2/3) κ^(-5/3) f_L(κL) f_η(κη),   L = k^(3/2)/ε,   η = (ν³/ε)^(1/4)
 *     f_L = [κL / ((κL)² + c_L)^(1/2)]^(5/3 + p0),   f_η = exp{-β ([(κη)⁴ + c_η⁴]^(1/4) - c_η)}
 *     ∫ E dκ = k,   2ν ∫ κ² E dκ = ε
 * @param {{ k: number, epsilon: number, viscosity: number }} wanted turbulent energy (m²/s²), dissipation (m²/s³), ν (m²/s)
 * @returns c_L and c_η (1), E as a function of κ (rad/m → m³/s²), L and η (m), and the range of κ that holds it all
 * @see Pope (2000), Turbulent Flows, eqs. 6.246-6.248
 */
export function solvedModelSpectrum({ k, epsilon, viscosity }) {
  const L = k ** 1.5 / epsilon;
  const eta = (viscosity ** 3 / epsilon) ** 0.25;
  const { cL, cEta } = solvedConstants(L / eta);
  return {
    cL,
    cEta,
    L,
    eta,
    energy: (kappa) => C * epsilon ** (2 / 3) * kappa ** (-5 / 3) * shape(kappa, { L, eta, cL, cEta }),
    range: [1e-4 / L, 12 / eta],
  };
}

function shape(kappa, { L, eta, cL, cEta }) {
  const large = kappa * L;
  const small = kappa * eta;
  const containing = (large / Math.sqrt(large * large + cL)) ** (5 / 3 + p0);
  return containing * Math.exp(-beta * ((small ** 4 + cEta ** 4) ** 0.25 - cEta));
}

/** c_L and c_η by Newton's method in their logarithms, in units where L = ε = 1 (so k = 1, ν = η^(4/3)). */
function solvedConstants(scaleRatio) {
  const eta = 1 / scaleRatio;
  const grid = logarithmicGrid(1e-4, 12 / eta, 240);
  const residuals = ([lnL, lnEta]) => {
    const constants = { L: 1, eta, cL: Math.exp(lnL), cEta: Math.exp(lnEta) };
    const spectrum = (kappa) => C * kappa ** (-5 / 3) * shape(kappa, constants);
    const sums = cellIntegrals((kappa) => [spectrum(kappa), kappa * kappa * spectrum(kappa)], grid);
    const [energy, dissipation] = sums.map((cells) => cells.reduce((sum, cell) => sum + cell, 0));
    return [Math.log(energy), Math.log(2 * eta ** (4 / 3) * dissipation)];
  };
  let point = [Math.log(6.78), Math.log(0.4)];
  for (let iteration = 0; iteration < 60; iteration++) {
    const step = newtonStep(residuals, point);
    const length = Math.max(...step.map(Math.abs));
    const damping = Math.min(1, 0.4 / length);
    point = point.map((value, i) => value + damping * step[i]);
    if (length < 1e-11) return { cL: Math.exp(point[0]), cEta: Math.exp(point[1]) };
  }
  throw new Error(`no model spectrum has L/eta = ${scaleRatio}: the Reynolds number is too low`);
}

function newtonStep(residuals, point) {
  const [f, g] = residuals(point);
  const delta = 1e-6;
  const [fa, ga] = residuals([point[0] + delta, point[1]]).map((value, i) => (value - [f, g][i]) / delta);
  const [fb, gb] = residuals([point[0], point[1] + delta]).map((value, i) => (value - [f, g][i]) / delta);
  const determinant = fa * gb - fb * ga;
  return [(-f * gb + g * fb) / determinant, (-g * fa + f * ga) / determinant];
}
