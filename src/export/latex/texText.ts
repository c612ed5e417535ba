import type { Run } from "../../core/catalogue.ts";

const special: Readonly<Record<string, string>> = {
  "\\": "\\textbackslash{}",
  "{": "\\{",
  "}": "\\}",
  $: "\\$",
  "&": "\\&",
  "#": "\\#",
  "%": "\\%",
  _: "\\_",
  "^": "\\textasciicircum{}",
  "~": "\\textasciitilde{}",
  "\u2212": "$-$",
  "\u202f": "\\,",
  "\u00a0": "~",
  "\u2013": "--",
  "\u00b1": "$\\pm$",
  "\u00d7": "$\\times$",
};
const raised = "\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079";

/** Text as LaTeX: what would be a command is a letter, signs of the trade are set as mathematics. */
export function texText(text: string): string {
  return text
    .replace(/[\\{}$&#%_^~\u2212\u202f\u00a0\u2013\u00b1\u00d7]/g, (sign) => special[sign])
    .replace(/\u207b?[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]+/g, (power) => `$^{${plainPower(power)}}$`)
    .replace(
      /[\u0391-\u03c9\u2113\u2032\u2202\u27e8\u27e9\u2248\u2264\u2265\u221d\u222b\u2192\u03d1]/g,
      (sign) => `$${texSign(sign)}$`,
    );
}

function plainPower(power: string): string {
  return [...power].map((sign) => (sign === "\u207b" ? "-" : String(raised.indexOf(sign)))).join("");
}

const greek: Readonly<Record<string, string>> = {
  α: "\\alpha",
  β: "\\beta",
  γ: "\\gamma",
  δ: "\\delta",
  Δ: "\\Delta",
  ε: "\\varepsilon",
  η: "\\eta",
  θ: "\\theta",
  κ: "\\kappa",
  λ: "\\lambda",
  Λ: "\\Lambda",
  μ: "\\mu",
  ν: "\\nu",
  ξ: "\\xi",
  π: "\\pi",
  ρ: "\\rho",
  σ: "\\sigma",
  τ: "\\tau",
  φ: "\\varphi",
  χ: "\\chi",
  ψ: "\\psi",
  ω: "\\omega",
  Ω: "\\Omega",
  ℓ: "\\ell",
  "′": "'",
  "∂": "\\partial",
  "⟨": "\\langle ",
  "⟩": "\\rangle ",
  "≈": "\\approx",
  "≤": "\\le",
  "≥": "\\ge",
  "∝": "\\propto",
  "∫": "\\int",
  "→": "\\to",
};

function texSign(sign: string): string {
  return greek[sign] ?? `\\mathrm{${sign}}`;
}

/** A symbol of the catalogue as mathematics: `$Re_{\lambda}$` with the letters of a name set as one word. */
export function texSymbol(runs: readonly Run[]): string {
  return `$${runs.map(texRun).join("")}$`;
}

function texRun({ text, upright, place }: Run): string {
  const signs = [...text];
  const inner =
    signs.length > 1 && signs.every((sign) => /[A-Za-z0-9]/.test(sign))
      ? `\\${upright ? "mathrm" : "mathit"}{${text}}`
      : signs.map((sign) => mathSign(sign, upright === true)).join("");
  if (place === undefined) return inner;
  return `${place === "sub" ? "_" : "^"}{${inner}}`;
}

function mathSign(sign: string, upright: boolean): string {
  if (greek[sign] !== undefined)
    return `${greek[sign]}${greek[sign].endsWith(" ") || greek[sign] === "'" ? "" : " "}`;
  if (sign === "\u2212") return "-";
  if (/\s/.test(sign)) return "\\,";
  if (special[sign]?.startsWith("\\")) return sign === "\\" ? "\\backslash " : special[sign];
  return upright && /[A-Za-z]/.test(sign) ? `\\mathrm{${sign}}` : sign;
}
