import { formatCount } from "../../figures/formatNumber.ts";
import { type Source, sources } from "../bibliography.ts";
import type { MethodsPart } from "../methodsText.ts";
import type { MethodsCase } from "./methodsCase.ts";

const routes = {
  "zero-crossing": "the autocorrelation of u integrated to its first zero",
  "one-over-e": "the lag at which the autocorrelation of u has fallen to 1/e",
  exponential: "the decay time of an exponential fitted to the autocorrelation of u above 0.2",
  "low-frequency": "the limit of the spectrum of u at low frequency",
  model: "von Kármán's form fitted to the spectrum of u",
} as const;

/** How records became numbers: moments, scales, spectra, gradients, dissipation, intervals. */
export function stationMethods({ settings, stations }: MethodsCase): MethodsPart {
  if (settings.layout === "profile" || stations.length === 0) return { text: "", sources: [] };
  const onLines = stations.some(({ facts }) => facts.lines);
  const parts = [
    moments(settings, onLines),
    integralScale(settings, onLines),
    spectra({ settings, stations }, onLines),
    gradients(settings, onLines),
    dissipation({ settings, stations }),
    intervals(stations, onLines),
  ];
  return { text: parts.map(({ text }) => text).join(" "), sources: parts.flatMap((part) => part.sources) };
}

/** A sentence ends in a full stop. */
const ended = (text: string) => (text.endsWith(".") ? text : `${text}.`);

type Settings = MethodsCase["settings"];
type Reduced = Pick<MethodsCase, "settings" | "stations">;

function moments({ reference }: Settings, onLines: boolean): MethodsPart {
  const over = onLines ? "lines and snapshots" : "time";
  const speed = reference.speed === null ? "the local mean velocity" : "one reference speed";
  return {
    text: `Moments are averages over ${over} about the mean of the record; the intensity Tu = ((⟨u²⟩ + ⟨v²⟩ + ⟨w²⟩)/3)^(1/2) refers to ${speed}.`,
    sources: [],
  };
}

function integralScale({ reduce }: Settings, onLines: boolean): MethodsPart {
  const sums =
    reduce.correlation === "unbiased" ? "divided by the number of pairs" : "divided by the number of samples";
  const scale = onLines ? "along the line" : "times the local mean velocity (Taylor's hypothesis)";
  return {
    text: `The integral scale L11 is ${routes[reduce.integralScale]}, ${scale}; correlations are ${onLines ? "taken over pairs of points" : sums}.`,
    sources: [sources.pope, ...(reduce.integralScale === "model" ? [sources.karman] : [])],
  };
}

function spectra({ settings: { reduce }, stations }: Reduced, onLines: boolean): MethodsPart {
  const sizes = [...new Set(stations.flatMap(({ facts }) => facts.segment ?? []))].sort((a, b) => a - b);
  const size =
    sizes.length === 0
      ? ""
      : ` of ${sizes.length === 1 ? formatCount(sizes[0]) : `${formatCount(sizes[0])} to ${formatCount(sizes[sizes.length - 1])}`} samples`;
  const chosen = reduce.segment === null ? ", at least 50 integral times where the record allows" : "";
  const removed = reduce.detrend === "mean" ? "the mean of the record removed" : "a straight line removed";
  if (onLines)
    return { text: "Spectra are those of the lines, of periodic ones without a window.", sources: [] };
  return {
    text: `Spectra are Welch estimates (Hann window, half overlap, segments${size}${chosen}, ${removed}), one-sided in k1 = 2πf/U.`,
    sources: [sources.welch],
  };
}

function gradients({ reduce }: Settings, onLines: boolean): MethodsPart {
  const below =
    "Where the spectrum ends in noise, its floor is subtracted up to the first band below twice the floor, and the part beyond is added from an exponential fitted to the octave below.";
  if (onLines) return { text: `Gradients are spatial. ${below}`, sources: [] };
  return {
    text: `Mean squares of gradients are integrals of k1² E(k1)${reduce.taylorCorrection ? ", corrected component by component for the fluctuating convection speed" : ", without a correction for the fluctuating convection speed"}. ${below}`,
    sources: reduce.taylorCorrection ? [sources.lumley, sources.wyngaard] : [],
  };
}

function dissipation({ stations }: Reduced): MethodsPart {
  const reasons = [...new Set(stations.flatMap(({ facts }) => facts.dissipationReason ?? []))];
  return {
    text: reasons.length === 0 ? "" : `Dissipation: ${ended(reasons.join("; "))}`,
    sources: [sources.pope],
  };
}

function intervals(stations: MethodsCase["stations"], onLines: boolean): MethodsPart {
  const groups = stations.map(({ facts }) => facts.groups).filter((count) => count > 0);
  if (groups.length === 0)
    return { text: "No record is long enough for an interval.", sources: [sources.lenschow] };
  const [least, most] = [Math.min(...groups), Math.max(...groups)];
  const count = least === most ? String(least) : `${least} to ${most}`;
  const blocks = onLines ? "groups of whole snapshots" : "blocks of at least 20 integral times";
  const used: Source[] = [sources.kuensch, sources.lenschow];
  return {
    text: `Intervals are at 95 %, from a jackknife over ${count} ${blocks}, in the logarithm for what is positive; that of L11 from the length of the record in integral times.`,
    sources: used,
  };
}
