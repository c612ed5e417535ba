import type { DecayArgument } from "../core/decayArgument.ts";
import type { Quantity } from "../core/quantity.ts";
import { plainQuantity } from "./plainQuantity.ts";

/** What JSON can hold. */
export type Plain =
  | string
  | number
  | boolean
  | null
  | undefined
  | readonly Plain[]
  | { readonly [key: string]: Plain };

/** What is argued about a case, as scripts read it: under the keys of the results file. */
export interface PlainArgument {
  readonly scan: Plain;
  readonly development: Plain;
  readonly body: Plain;
  /** Keys beside the fit's own, under `decay`. */
  readonly decay: { readonly [key: string]: Plain };
}

/**
 * @param argument undefined where nothing was argued: the keys are there, and empty
 */
export function plainArgument(argument: DecayArgument | undefined): PlainArgument {
  if (argument === undefined) return { scan: {}, development: {}, body: {}, decay: {} };
  const { scan, development, body, ...rest } = argument;
  return {
    scan: plain(scan),
    development: plain(development),
    body: body === null ? {} : plain(body),
    decay: {
      growths: plain(rest.growths),
      C_epsilon: plain(rest.dissipationConstant),
      region: plain(rest.region),
      every_start: plain(rest.everyStart),
      bootstrap: plain(withoutCloud(rest.bootstrap)),
      routes: plain(rest.routes),
      disagreements: plain(rest.disagreements),
      origin_scan: plain(rest.originScan),
      local: plain(rest.local),
      narrowing: plain(rest.narrowing),
      flight: plain(rest.flight),
    },
  };
}

/** A picture's points are no result: they can be drawn again from the seed. */
function withoutCloud(bootstrap: DecayArgument["bootstrap"]) {
  if (bootstrap === null) return null;
  const { cloud: _, ...summary } = bootstrap;
  return summary;
}

/** Results as they stand, each quantity without what only the program needs. */
function plain(found: unknown): Plain {
  if (Array.isArray(found)) return found.map(plain);
  if (found === null || typeof found !== "object") return found as Plain;
  if (isQuantity(found)) return plainQuantity(found);
  return Object.fromEntries(Object.entries(found).map(([key, inner]) => [key, plain(inner)]));
}

function isQuantity(found: object): found is Quantity {
  return "value" in found && (found.value === null ? "why" in found : "low" in found && "high" in found);
}
