// How often intervals and verdicts of two cases side by side are right, over synthetic pairs: node bundle.mjs ASK
// ASK is JSON: {"pairs", "seed", "cell"}. Prints one line of JSON: how often each thing came true.
import { compareCases } from "../../src/core/compare/compareCases.ts";
import {
  type CaseInput,
  type ComparedQuantity,
  type Comparison,
  comparedQuantities,
} from "../../src/core/comparison.ts";
import { deriveStations } from "../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../src/core/decay/fitDecay.ts";
import { isEstimate, type Quantity } from "../../src/core/quantity.ts";
import { type SeededRandom, seededRandom } from "../../src/core/signal/seededRandom.ts";
import { known, lawStations, plainSettings, spacedFrom } from "../support/lawStations.ts";

/** One kind of pair: the second case is the first one nine lengths farther downstream, its quantities times a ratio. */
interface Cell {
  /** Standard error of ln q, and of every other quantity. */
  readonly error: number;
  readonly stations: number;
  /** True ratio of every quantity, or of those named. */
  readonly ratio: number;
  readonly of: readonly ComparedQuantity[];
  /** The ratio holds upstream of this xi alone; null: everywhere. */
  readonly upTo: number | null;
  readonly n: number;
}

const base = { A: 0.06, x0: 3, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.2, m: 0.375 };
const shift = 9;
const settings = { ...plainSettings, referenceLength: 1, window: [0, 500] as const };
/** Tu of the law at the chosen place; k = 3 uu/2. */
const chosen = 40;
const intensity = Math.sqrt((2 / 3) * base.A * (chosen - base.x0) ** -base.n);

function madeCase(name: string, cell: Cell, second: boolean, random: SeededRandom): CaseInput {
  const law = second ? { ...base, x0: base.x0 + shift, n: cell.n } : base;
  const places = spacedFrom(law.x0, law.x0 + 8, law.x0 + 100, cell.stations);
  const { error } = cell;
  const factor = (quantity: ComparedQuantity, x: number) =>
    second && cell.of.includes(quantity) && (cell.upTo === null || x - law.x0 < cell.upTo) ? cell.ratio : 1;
  const exact = lawStations(law, places, error);
  const made = lawStations(law, places, error, () => Math.exp(error * random.gaussian())).map(
    (station, i) => {
      // each by its own error alone: what follows the energy of the draw is Tu
      const moved = (quantity: ComparedQuantity, own: number) => {
        const value = (exact[i][quantity].value ?? 1) * factor(quantity, station.x);
        return known(value * Math.exp(own * random.gaussian()), own);
      };
      const Tu = factor("Tu", station.x);
      const k = (station.k.value ?? 1) * Tu * Tu;
      return {
        ...station,
        k: known(k, error),
        Tu: known((station.Tu.value ?? 1) * Tu, error / 2),
        L11: moved("L11", error),
        lambda: moved("lambda", error),
        eta: moved("eta", error),
        Re_lambda: moved("Re_lambda", error),
        isotropy_uv: moved("isotropy_uv", error),
      };
    },
  );
  const decay = fitDecay(made, settings);
  return { name, stations: deriveStations(made, decay, settings), decay, decaySettings: settings };
}

function holds(quantity: Quantity, truth: number): boolean {
  if (!isEstimate(quantity) || quantity.low === null || quantity.high === null) return false;
  return quantity.low <= truth && truth <= quantity.high;
}

/** What is counted of one pair. */
function counted(found: Comparison, cell: Cell): Record<string, boolean> {
  const truth = (quantity: ComparedQuantity) => (cell.of.includes(quantity) ? cell.ratio : 1);
  const verdicts = comparedQuantities.map((quantity) => found.quantities[quantity].verdict);
  const said = (verdict: string, which: readonly ComparedQuantity[]) =>
    which.some((quantity) => found.quantities[quantity].verdict === verdict);
  const beyond = found.equivalent_beyond.from;
  // stretches that lie wholly in the near field are wrong to claim
  const wrong = found.equivalent_beyond.stretches.some(
    ({ from, to }) => beyond !== null && from >= beyond && cell.upTo !== null && to <= cell.upTo,
  );
  return {
    shared: found.aligned_with === "common n",
    Tu: holds(found.quantities.Tu.ratio, truth("Tu")),
    L11: holds(found.quantities.L11.ratio, truth("L11")),
    lambda: holds(found.quantities.lambda.ratio, truth("lambda")),
    extra: holds(found.extra_distance, shift),
    extraShared: found.aligned_with === "common n" && holds(found.extra_distance, shift),
    extraOwn: holds(found.origins.own?.extra_distance ?? found.extra_distance, shift),
    matched: holds(found.matched_distance, shift),
    Tu_at: holds(found.matched.Tu, intensity),
    equivalent: said("equivalent", cell.of),
    different: said("different", cell.of),
    allEquivalent: verdicts.every((verdict) => verdict === "equivalent"),
    beyondAll: beyond !== null && Math.abs(beyond / (found.overlap?.[0] ?? 0) - 1) < 1e-6,
    wrong,
  };
}

function cover({ pairs, seed, cell }: { pairs: number; seed: number; cell: Cell }) {
  const tally: Record<string, number> = {};
  for (let pair = 0; pair < pairs; pair++) {
    const random = seededRandom(seed + pair);
    const cases = [madeCase("a", cell, false, random), madeCase("b", cell, true, random)];
    const [found] = compareCases(cases, { align: "x0", tolerance: 0.1, at: chosen });
    for (const [key, true_] of Object.entries(counted(found, cell))) tally[key] = (tally[key] ?? 0) + +true_;
  }
  return tally;
}

console.log(JSON.stringify(cover(JSON.parse(process.argv[2]))));
