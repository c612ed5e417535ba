import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

const batchelor = "Batchelor and Townsend (1948)";
const mohamed = "Mohamed and LaRue (1990)";

/** What is argued about a law beyond its fit. */
export const argumentLabels: readonly Label[] = [
  label(
    "dn/dx0",
    '"d"n/"d"x_{0}',
    "sensitivity of n to x0",
    "1",
    "−n/(x_c − x0) for a reference length: how far n moves when x0 is moved downstream by one, x_c the geometric centre of the window",
    { digits: 2 },
    mohamed,
  ),
  label(
    "local_exponent",
    '−"d ln" q/"d ln"(x − x_{0})',
    "local exponent",
    "1",
    "slope of ln q in ln(x − x0) over a station and its two neighbours, x0 as adopted",
    {},
    mohamed,
  ),
  label(
    "compensated",
    "q((x − x_{0})/ℓ)^{n}/A",
    "compensated energy",
    "1",
    "energy over its law: one wherever the law holds",
    {},
    "Krogstad and Davidson (2010)",
  ),
  label(
    "m_lambda",
    "m_{λ}",
    "growth exponent of lambda",
    "1",
    "λ_g = B ((x − x0)/ℓ)^m; any n asks for 1/2",
    {},
    batchelor,
  ),
  label(
    "m_Re_lambda",
    'm_{"Re"}',
    "growth exponent of Re_lambda",
    "1",
    "Re_λ = B ((x − x0)/ℓ)^m; n asks for (1 − n)/2",
    {},
    batchelor,
  ),
  label(
    "condition_place",
    "x",
    "place from which a condition holds",
    "L",
    "the station from which on (up to which, for an end) a condition holds at every station; its interval by drawing all stations anew by their own errors",
    {},
    mohamed,
  ),
  label(
    "AICc",
    '"AICc"',
    "Akaike's criterion for short samples",
    "1",
    "χ² (N ln of the mean square where the scatter tells the errors) + 2 k + 2 k (k + 1)/(N − k − 1), with k numbers fitted to N stations; the smaller is preferred",
    { digits: 4 },
    "Hurvich and Tsai (1989)",
  ),
];
