import type { Flag } from "../../flag.ts";
import { lineComponents } from "./lineFields.ts";
import { lineHomogeneity } from "./lineHomogeneity.ts";
import { type LineMaterial, lineLength } from "./lineMaterial.ts";
import { fewestSnapshots } from "./lineSampling.ts";

/** Integral scales that a line should hold: in a shorter one the largest eddies are missing. */
const shortestBox = 8;
const resolved = 0.9;

/** All doubts about one station on lines, one a code. */
export function lineFlags(material: LineMaterial, k1max_eta: number | null): Flag[] {
  const flags = [
    ...material.lines.parts.flatMap((part) => part.flags),
    ...lengthFlags(material),
    ...componentFlags(material),
    ...spectrumFlags(material, k1max_eta),
    ...homogeneityFlags(material),
  ];
  return flags.filter((flag, i) => flags.findIndex((other) => other.code === flag.code) === i);
}

function lengthFlags(material: LineMaterial): Flag[] {
  const { sampling, scales, lines, spectra } = material;
  const flags: Flag[] = [];
  if (sampling.independent < fewestSnapshots) {
    const text = `The lines make ${sampling.independent.toPrecision(2)} independent snapshots: an interval needs ${fewestSnapshots}.`;
    flags.push({ code: "short-record", text, value: sampling.independent });
  }
  const length = lineLength(lines, spectra);
  const scale = scales.scale ?? scales.least ?? null;
  if (length !== null && scale !== null && length < shortestBox * scale) {
    const ratio = length / scale;
    const text = `The line is ${ratio.toPrecision(2)} integral scales long: with fewer than ${shortestBox} the largest eddies are missing or held down, and with them part of the energy and of L11.`;
    flags.push({ code: "short-box", text, value: ratio });
  }
  if (
    spectra !== null &&
    lines.components.includes(lineComponents(lines.along)[0]) &&
    scales.tauStar === null
  ) {
    const text =
      "The correlation along the line does not fall to zero within half of it: only a lower bound of the integral scale is known.";
    flags.push({ code: "no-zero-crossing", text });
  }
  if (scales.toHalf === true) {
    const text =
      "The correlation along the line does not cross zero: it is next to nothing at half the length and integrated up to there.";
    flags.push({ code: "no-zero-crossing", text });
  }
  if (lines.spacing === null && lines.points.length > 1) {
    const text =
      "The points are not equally spaced along the line: moments count, spectra and gradients are not formed.";
    flags.push({ code: "unequal-steps", text });
  }
  return flags;
}

function componentFlags({ lines, settings }: LineMaterial): Flag[] {
  const flags: Flag[] = [];
  if (lines.components.length === 1)
    flags.push({ code: "isotropy-assumed", text: "u alone is there: isotropy is assumed, not tested." });
  if (lines.components.length === 2) {
    const other = lines.components.includes("v") ? "w" : "v";
    const text = `${other} is not there and is taken like the other lateral component.`;
    flags.push({ code: "axisymmetry-assumed", text });
  }
  if (settings.kinematicViscosity === null) {
    const text =
      "No kinematic viscosity is given: dissipation, Kolmogorov scales and Reynolds numbers are missing.";
    flags.push({ code: "no-viscosity", text });
  }
  if (settings.kind === "les") {
    const text = "Large-eddy simulation: scales from gradients are those of the resolved motion.";
    flags.push({ code: "resolved-scales", text });
  }
  return flags;
}

function spectrumFlags({ gradients }: LineMaterial, k1max_eta: number | null): Flag[] {
  const flags: Flag[] = [];
  const cut = gradients.find(({ rule }) => rule !== null && rule.cut > 0);
  if (cut?.rule) {
    const percent = (100 * cut.rule.shareBeyond).toPrecision(2);
    const text = `The spectrum of ${cut.name} along the line ends in noise: it is cut there, and some ${percent} % of the gradient lie beyond.`;
    flags.push({ code: "noise-floor", text, value: cut.rule.shareBeyond });
  }
  if (k1max_eta !== null && k1max_eta < resolved) {
    const text = `The highest usable wavenumber times eta is ${k1max_eta.toPrecision(2)}: lambda and eta from gradients are upper bounds, the dissipation from them is a lower one.`;
    flags.push({ code: "resolution", text, value: k1max_eta });
  }
  return flags;
}

function homogeneityFlags(material: LineMaterial): Flag[] {
  const p = lineHomogeneity(material);
  if (p === null || p >= 0.01) return [];
  const text =
    "The mean of u varies along the line by more than its sampling error: the flow is not homogeneous there, and part of the variance is that of the mean.";
  return [{ code: "inhomogeneous", text, value: p }];
}
