import type { CaseInput, Comparison } from "../core/comparison.ts";
import type { DecayResult } from "../core/decayResult.ts";
import type { Flag } from "../core/flag.ts";
import { program } from "../core/program.ts";
import type { Quantity } from "../core/quantity.ts";
import type { SourceNote } from "../core/records.ts";
import type { StationResult } from "../core/stationResult.ts";
import type { Units } from "../core/unitText.ts";
import { plainArgument } from "./plainArgument.ts";
import { plainComparison } from "./plainComparison.ts";
import { type PlainQuantity, plainQuantity } from "./plainQuantity.ts";
import { plainRecord } from "./plainRecord.ts";
import type { SentenceCase } from "./sentences/sentenceCase.ts";

/** One case on its way into the results file. */
export interface ResultCase {
  readonly argued: CaseInput;
  /** The case sheet with every default filled in. */
  readonly settings: object & { readonly units?: Units; readonly reference?: { readonly symbol: string } };
  readonly sources: readonly SourceNote[];
  /** Doubts about the case as a whole, beside those of its decay. */
  readonly flags: readonly Flag[];
}

export type ResultsFile = ReturnType<typeof resultsFile>;

/** Every quantity of a station, in the order in which files and tables give them. */
export const stationQuantities = [
  "U",
  "uu",
  "vv",
  "ww",
  "uv",
  "uw",
  "vw",
  "k",
  "Tu",
  "isotropy_uv",
  "isotropy_uw",
  "T_int",
  "L11",
  "lambda",
  "gradient",
  "epsilon",
  "epsilon_gradient",
  "epsilon_decay",
  "epsilon_inertial",
  "eta",
  "Re_lambda",
  "Re_L",
  "C_epsilon",
  "S_dudx",
  "balance",
  "q",
] as const satisfies readonly (keyof StationResult)[];

/**
 * Everything that was found, for scripts: one object per case, one per comparison.
 * `scan`, `development` and `body` are empty objects where nothing was asked for or found.
 * @param cases       in the order of the sheets
 * @param comparisons every other case against the one chosen, or the first
 */
export function resultsFile(cases: readonly ResultCase[], comparisons: readonly Comparison[]) {
  const named = cases.map(sentenceCase);
  return {
    program: program.name,
    version: program.version,
    schema: program.schema,
    cases: cases.map(plainCase),
    comparisons: comparisons.map((comparison) => {
      const [first, second] = comparison.cases.map((name) => named.find((each) => each.name === name));
      return plainComparison(comparison, first && second ? [first, second] : null);
    }),
  };
}

/** The results file as text: JSON, numbers with all their digits. */
export function resultsText(file: ResultsFile): string {
  return `${JSON.stringify(file, null, 1)}\n`;
}

function plainCase({ argued, settings, sources, flags }: ResultCase) {
  const further = plainArgument(argued.decay.argument);
  return {
    case: argued.name,
    settings,
    sources: sources.map(({ name, bytes, x, position }) => ({ name, bytes, x, position })),
    stations: argued.stations.map(plainStation),
    decay: { ...plainDecay(argued.decay), ...further.decay },
    scan: further.scan,
    development: further.development,
    body: further.body,
    flags: [...flags, ...argued.decay.flags].map(plainFlag),
  };
}

function plainStation(station: StationResult) {
  const { x, samples, duration, routes, flags, facts } = station;
  const quantities = Object.fromEntries(
    stationQuantities.map((key) => [key, plainQuantity(station[key])]),
  ) as Record<(typeof stationQuantities)[number], PlainQuantity>;
  return {
    x,
    samples,
    duration,
    ...quantities,
    routes: plainEach(routes),
    flags: flags.map(plainFlag),
    ...plainRecord(station),
    facts,
  };
}

function plainDecay(decay: DecayResult) {
  return {
    quantity: decay.quantity,
    assumption: decay.assumption,
    residuals: decay.residuals,
    weights: decay.weights,
    window: decay.window,
    window_chosen: decay.windowChosen,
    window_reason: decay.windowReason,
    stations: decay.stations,
    speed: decay.speed,
    coordinate: decay.coordinate ?? "x",
    near_field: decay.near_field ?? null,
    n: plainQuantity(decay.n),
    x0: plainQuantity(decay.x0),
    A: plainQuantity(decay.A),
    correlation_n_x0: decay.correlation_n_x0,
    covariance: decay.law === null ? null : { of: ["ln A", "x0", "n"], rows: rowsOf(decay.law.covariance) },
    chi2_reduced: decay.chi2_reduced,
    p: decay.p,
    given_window: plainEach(decay.given_window),
    lambda_route: plainEach(decay.lambda_route),
    epsilon_route: plainEach(decay.epsilon_route),
    growth: plainEach(decay.growth),
    hypotheses: decay.hypotheses.map(({ name, n, p, test = null }) => ({ name, n, p, test })),
    together: decay.together ?? null,
  };
}

/** A case as sentences name it. */
function sentenceCase({ argued, settings }: ResultCase, mark: number): SentenceCase {
  const { name, stations, decay, decaySettings } = argued;
  const { units = "SI", reference } = settings;
  return {
    name,
    mark,
    stations,
    decay,
    length: decaySettings.referenceLength,
    symbol: reference?.symbol ?? "ℓ",
    units,
    along: decaySettings.along,
  };
}

/** A row-major 3 × 3 as its rows. */
function rowsOf(matrix: readonly number[]): (readonly number[])[] {
  return [0, 3, 6].map((at) => matrix.slice(at, at + 3));
}

function plainEach<K extends string>(quantities: Readonly<Record<K, Quantity>>): Record<K, PlainQuantity> {
  const entries = Object.entries<Quantity>(quantities).map(([key, each]) => [key, plainQuantity(each)]);
  return Object.fromEntries(entries) as Record<K, PlainQuantity>;
}

function plainFlag({ code, text, value }: Flag) {
  return value === undefined ? { code, text } : { code, text, value };
}
