import type { ProbedName, ProbeReading } from "../probeReading.ts";
import { isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";

/** Quantities of the fluctuations at a point, which need no mean velocity. */
const withoutSpeed =
  /^(?:uu|vv|ww|uv|uw|vw|k|isotropy_u[vw]|S_dudx|T_int.*|L_[vw]_ratio|skewness_[uvw]|flatness_[uvw]|K_[vw]|rho_[uv][vw]|anisotropy_.*|barycentric_.*)$/;
/** Probes whose values a reason names. */
const mostNamed = 4;

/** The quantities of a station, and those of its routes. */
type Quantities = Partial<Record<keyof StationResult, unknown>> & {
  readonly routes: Readonly<Record<string, Quantity>>;
};

/**
 * A station at whose x no larger part of the probes agrees: what they differ in, and all that rests on it, is
 * missing. Where they differ in U, the moments of the fluctuations stay; where they differ in u', U stays.
 * @param divided  in what they differ; nothing: all stays as it is
 * @param speed    the reference speed, where Tu is formed with one
 */
export function withoutDivided<T extends Quantities>(
  quantities: T,
  probes: readonly ProbeReading[],
  divided: readonly ProbedName[],
  speed: number | null,
): T {
  if (divided.length === 0) return quantities;
  const none = missing(whyDivided(probes, divided));
  const stays = (name: string) =>
    (name === "U" && !divided.includes("U")) ||
    (!divided.includes("u_rms") && (withoutSpeed.test(name) || (name === "Tu" && speed !== null)));
  // what is missing for a reason of its own keeps it
  const of = ([name, one]: [string, unknown]) => [
    name,
    isQuantity(one) && isEstimate(one) && !stays(name) ? none : one,
  ];
  const routes = Object.fromEntries(Object.entries(quantities.routes).map(of));
  return { ...(Object.fromEntries(Object.entries(quantities).map(of)) as T), routes };
}

function isQuantity(value: unknown): value is Quantity {
  return typeof value === "object" && value !== null && "value" in value;
}

function whyDivided(probes: readonly ProbeReading[], divided: readonly ProbedName[]): string {
  const what = divided.map((name) => symbols[name]).join(" and ");
  return `no larger part of the ${probes.length} probes at this x agrees in ${what}: ${probesText(probes)}`;
}

const symbols = { U: "U", u_rms: "u'" } as const;

/** U and u' of some probes, each with its place or its file. */
export function probesText(probes: readonly ProbeReading[]): string {
  const named = probes.slice(0, mostNamed).map((probe) => {
    const numbers = [`U ${digits(probe.U)}`, `u' ${digits(probe.u_rms)}`].join(", ");
    return `${placeText(probe)} ${numbers}`;
  });
  const more = probes.length - named.length;
  return named.join("; ") + (more > 0 ? `; and ${more} more` : "");
}

function placeText({ file, y, z }: ProbeReading): string {
  const place = [...(y === null ? [] : [`y = ${y}`]), ...(z === null ? [] : [`z = ${z}`])];
  return place.length > 0 ? `at ${place.join(", ")}` : `in ${file}`;
}

function digits({ value }: Quantity): string {
  return value === null ? "missing" : value.toPrecision(4);
}
