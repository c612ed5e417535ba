import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

const fixedOrder = "Maurer, Hothorn and Lehmacher (1995)";
const twoTests = "Schuirmann (1987); Holm (1979)";

/** What two cases side by side come to beyond their ratios and distances. */
export const compareLabels: readonly Label[] = [
  label(
    "equivalent_from",
    "(x − x_{0})/ℓ",
    "equivalent from here on",
    "1",
    "where the first of the stretches of three stations begins that all have their mean ratio within the tolerance, each at 5 %; tested from the last one upstream until one fails",
    {},
    fixedOrder,
  ),
  label(
    "p_equivalent",
    "p",
    "probability against equivalence",
    "1",
    "of a mean ratio so far inside the tolerance if the true one lay at its edge; two one-sided tests, adjusted for the number of quantities",
    { digits: 2 },
    twoTests,
  ),
  label(
    "p_different",
    "p",
    "probability against a difference",
    "1",
    "of a mean ratio so far outside the tolerance if the true one lay at its edge; adjusted for the number of quantities",
    { digits: 2 },
    twoTests,
  ),
  label(
    "matched_x",
    "x",
    "place of equal intensity",
    "L",
    "where the line of ln Tu on ln(x − x0) along the window has the Tu of the place chosen in the other case",
  ),
  label(
    "spectral_distance",
    "D",
    "rms log distance of the spectra",
    "1",
    "root mean square of ln(E_B/E_A) at equal k₁η, both E₁₁/(εν⁵)^(1/4), over bands of a tenth of a decade",
    { digits: 2 },
    "Pope (2000), section 6.5.4, for the form",
  ),
  label(
    "spectral_chance",
    "D_{0}",
    "distance by chance",
    "1",
    "the same for two spectra of one turbulence: their chi-square errors and those of both dissipations",
    { digits: 2 },
    "Satterthwaite (1946)",
  ),
  label(
    "AICc",
    'AIC_{"c"}',
    "Akaike’s criterion for short samples",
    "1",
    "the smaller one foretells new stations better",
    { digits: 3 },
    "Hurvich and Tsai (1989)",
  ),
];
