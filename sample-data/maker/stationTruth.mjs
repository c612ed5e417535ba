import { solvedModelSpectrum } from "./modelSpectrum.mjs";
import { integralScale, moment, oneDimensionalSpectra } from "./oneDimensionalSpectra.mjs";
import { mesh, viscosity } from "./scenario.mjs";

/**
 * What is true at one station of a case: its stresses from the law, its dissipation from the decay of k, and spectra
 * that hold both.
 * @returns {{ truth: object, spectra: object }} SI. `truth` has the keys of the results file; epsilon is -U dk/dx,
 *          which from the window's start on is n U k/(x - x0). epsilon_gradient is what the gradients hold of it:
 *          all, except where a grid has filtered them.
 */
export function stationTruth(flow, x) {
  const { U } = flow.law;
  const k = energyAt(flow, x);
  const [uOverV, wOverV] = flow.isotropy(x);
  const vv = (2 * k) / (uOverV ** 2 + 1 + wOverV ** 2);
  const stresses = [uOverV ** 2 * vv, vv, wOverV ** 2 * vv];
  const [uu, , ww] = stresses;
  const epsilon = dissipationAt(flow, x);
  const spectra = anisotropicSpectra({ stresses, epsilon, filterWidth: flow.filterWidth });
  const [gradient, gradientV, gradientW] = spectra.all.map((E) => moment(spectra.k1, E, 2));
  const L11 = integralScale(spectra.k1, spectra.E11);
  // A grid's resolved gradients are no measure of lambda: there it follows from the decay.
  const lambda = flow.kind === "les" ? Math.sqrt((15 * viscosity * uu) / epsilon) : Math.sqrt(uu / gradient);
  const truth = {
    x,
    U,
    uu,
    vv,
    ww,
    k,
    Tu: Math.sqrt((2 * k) / 3) / U,
    isotropy_uv: uOverV,
    isotropy_uw: uOverV / wOverV,
    T_int: L11 / U,
    L11,
    lambda,
    gradient,
    epsilon,
    epsilon_gradient: 3 * viscosity * (gradient + gradientV + gradientW),
    eta: (viscosity ** 3 / epsilon) ** 0.25,
    Re_lambda: (Math.sqrt(uu) * lambda) / viscosity,
    S_dudx: flow.skewness(x),
  };
  return { truth, spectra };
}

/** k, m²/s², with the departure from the law upstream of the window. */
function energyAt({ law, departure }, x) {
  return law.U ** 2 * law.A * ((x - law.x0) / mesh) ** -law.n * (1 + departure(x));
}

/** -U dk/dx, m²/s³: n U k/(x - x0) less what the departure changes of the slope. */
function dissipationAt(flow, x) {
  const { law, departure } = flow;
  const h = 1e-7; // forward: a station at the very start of the window belongs to the law
  const slope = (departure(x + h) - departure(x)) / h / (1 + departure(x));
  return law.U * energyAt(flow, x) * (law.n / (x - law.x0) - slope);
}

/**
 * Spectra with given stresses and dissipation: the small scales are those of Pope's isotropic model spectrum, the
 * large ones are raised or lowered by component, E_ii = E_ii,iso (1 + a_i / (1 + (k1 L11/2)²)). The energy and
 * dissipation of the model are moved until the sums hold: 3ν Σ<(∂u_i/∂x)²> = ε before the filter, as if isotropic.
 */
function anisotropicSpectra({ stresses, epsilon, filterWidth }) {
  const k = stresses.reduce((sum, stress) => sum + stress, 0) / 2;
  const cutoff = filterWidth > 0 ? Math.PI / filterWidth : Number.POSITIVE_INFINITY;
  const base = { k, epsilon };
  for (let iteration = 0; iteration < 60; iteration++) {
    const model = solvedModelSpectrum({ ...base, viscosity });
    const filtered = (kappa) => model.energy(kappa) * Math.exp(-((kappa / cutoff) ** 4));
    const whole = oneDimensionalSpectra(model.energy, model.range);
    const kept = filterWidth > 0 ? oneDimensionalSpectra(filtered, model.range) : whole;
    const factors = componentFactors(kept, stresses);
    const shaped = (from) => [from.E11, from.E22, from.E22].map((E, i) => E.map((e, j) => e * factors[i][j]));
    const gradients = shaped(whole).map((E) => moment(whole.k1, E, 2));
    const energyRatio = k / (1.5 * moment(kept.k1, kept.E11, 0));
    const dissipationRatio = epsilon / (3 * viscosity * gradients.reduce((sum, g) => sum + g, 0));
    if (Math.abs(energyRatio - 1) + Math.abs(dissipationRatio - 1) < 1e-7) {
      const all = shaped(kept);
      return { k1: kept.k1, all, E11: all[0], E22: all[1], E33: all[2] };
    }
    base.k *= energyRatio;
    base.epsilon *= dissipationRatio;
  }
  throw new Error("no spectrum holds the wanted stresses and dissipation");
}

/** 1 + a_i / (1 + (k1 L11/2)²) for each component, a_i such that its variance is the wanted stress. */
function componentFactors({ k1, E11, E22 }, stresses) {
  const L11 = integralScale(k1, E11);
  const large = k1.map((k) => 1 / (1 + ((k * L11) / 2) ** 2));
  return [E11, E22, E22].map((E, i) => {
    const share = moment(
      k1,
      E.map((e, j) => e * large[j]),
      0,
    );
    const a = (stresses[i] - moment(k1, E, 0)) / share;
    return large.map((value) => 1 + a * value);
  });
}
