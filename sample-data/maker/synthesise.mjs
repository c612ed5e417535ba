import { foldedSpectrum, gaussianCoefficients, interpolatedSpectrum, signalPair } from "./gaussianSignal.mjs";
import { solvedModelSpectrum } from "./modelSpectrum.mjs";
import { integralScale, moment, oneDimensionalSpectra } from "./oneDimensionalSpectra.mjs";
import { seededRandom } from "./random.mjs";
import { skewedSignal, warpForSkewness } from "./skewedSignal.mjs";

/**
 * Velocities that a probe would record if turbulence of given one-dimensional spectra were carried past it, frozen,
 * at speed U: u(t) = U + u'(x = -U t).
 * @param {object} wish
 * @param wish.spectra k1 (rad/m, logarithmic grid) with E11, E22, E33 (m³/s², one-sided); E33 left out: as E22
 * @param wish.U mean speed, m/s
 * @param wish.step time between samples, s
 * @param wish.samples number of samples
 * @param wish.seed the same seed gives the same record
 * @param wish.skewness of ∂u/∂x, by central differences over one step to either side; 0: Gaussian
 * @returns u (with its mean), v, w: Float64Array of `samples` values, m/s. They are cut from a periodic signal at
 *          least a quarter longer, so that the end does not run on into the start; u, v and w are independent.
 */
export function synthesiseRecord({ spectra, U, step, samples, seed, skewness = 0 }) {
  const { gaussian } = seededRandom(seed);
  const spacing = U * step;
  const size = powerOfTwo(1.25 * samples);
  const signal = (E) => {
    const folded = foldedSpectrum(interpolatedSpectrum(spectra.k1, E), Math.PI / spacing);
    return gaussianCoefficients(folded, { size, spacing, gaussian });
  };
  const [v, w] = signalPair(signal(spectra.E22), signal(spectra.E33 ?? spectra.E22));
  const u =
    skewness === 0
      ? signalPair(signal(spectra.E11), new Float64Array(2 * size))[0]
      : skewedRecord(spectra, { spacing, samples, skewness, gaussian });
  return {
    u: u.slice(0, samples).map((value) => value + U),
    v: v.slice(0, samples),
    w: w.slice(0, samples),
  };
}

/** Made on a grid fine enough for the steepest gradients, then sampled: what lies above Nyquist folds by itself. */
function skewedRecord({ k1, E11 }, { spacing, samples, skewness, gaussian }) {
  const lag = oversampling({ k1, E11 }, spacing);
  const fine = spacing / lag;
  const spectrum = foldedSpectrum(interpolatedSpectrum(k1, E11), Math.PI / fine);
  // Along the stream the time runs backward: a skewness of ∂u/∂x is the opposite of that of ∂u/∂t.
  const wanted = -skewness;
  const delta = warpForSkewness(spectrum, { size: 2 ** 18, spacing: fine, lag, wanted });
  const size = powerOfTwo(1.25 * samples * lag);
  const coefficients = gaussianCoefficients(spectrum, { size, spacing: fine, gaussian });
  const signal = skewedSignal(coefficients, delta);
  return Float64Array.from({ length: samples }, (_, i) => signal[i * lag]);
}

/** Fine samples per sample, so that 99.99 % of the mean-square gradient lies below the fine Nyquist wavenumber. */
function oversampling({ k1, E11 }, spacing) {
  const whole = moment(k1, E11, 2);
  let lag = 1;
  while (lag < 64) {
    const inside = k1.findIndex((k) => k > (Math.PI * lag) / spacing);
    if (inside < 0 || moment(k1.subarray(0, inside), E11, 2) > 0.9999 * whole) break;
    lag *= 2;
  }
  return 2 * lag;
}

const powerOfTwo = (atLeast) => 2 ** Math.ceil(Math.log2(atLeast));

/**
 * A record of isotropic turbulence with the model spectrum, and the truth it was made from.
 * @param {object} wish
 * @param wish.k turbulent energy, m²/s²
 * @param wish.epsilon dissipation, m²/s³
 * @param wish.viscosity ν, m²/s
 * @param wish.U mean speed, m/s; `step` s; `samples`; `seed`; `skewness` of ∂u/∂x (0: Gaussian)
 * @returns u, v, w and `truth` in SI: uu, vv, ww, k, L11, T_int, gradient (<(∂u/∂x)²>), lambda, epsilon, eta,
 *          Re_lambda, E11 at wavenumber 0, c_L and c_η
 */
export function isotropicRecord({ k, epsilon, viscosity, U, step, samples, seed, skewness = 0 }) {
  const { spectra, truth } = isotropicTruth({ k, epsilon, viscosity });
  const record = synthesiseRecord({ spectra, U, step, samples, seed, skewness });
  return { ...record, truth: { U, ...truth, T_int: truth.L11 / U, S_dudx: skewness } };
}

const known = new Map();

/** Solved once for each energy, dissipation and viscosity: a hundred seeds share one spectrum. */
function isotropicTruth({ k, epsilon, viscosity }) {
  const key = `${k} ${epsilon} ${viscosity}`;
  const found = known.get(key);
  if (found) return found;
  const model = solvedModelSpectrum({ k, epsilon, viscosity });
  const spectra = oneDimensionalSpectra(model.energy, model.range);
  const uu = moment(spectra.k1, spectra.E11, 0);
  const gradient = moment(spectra.k1, spectra.E11, 2);
  const lambda = Math.sqrt(uu / gradient);
  const truth = {
    uu,
    vv: uu,
    ww: uu,
    k,
    L11: integralScale(spectra.k1, spectra.E11),
    gradient,
    lambda,
    epsilon,
    eta: model.eta,
    Re_lambda: (Math.sqrt(uu) * lambda) / viscosity,
    E11_0: spectra.E11[0],
    cL: model.cL,
    cEta: model.cEta,
  };
  const solved = { spectra, truth };
  known.set(key, solved);
  return solved;
}
