// How often what is said of two cases side by side is right: intervals, verdicts just beside the tolerance, and the claim
// from where on they are equivalent.
import { availableParallelism } from "node:os";

const pairs = 400;
export const title = `Two cases side by side over ${pairs} synthetic pairs a row, tolerance 10 %`;

/** Most that a wrong claim may come true, and two standard deviations of counting it. */
const level = 0.05;
const slack = 2 * Math.sqrt((level * (1 - level)) / pairs);

const all = ["Tu", "L11", "lambda", "eta", "Re_lambda", "isotropy_uv"];
const usual = { error: 0.02, stations: 14, ratio: 1, of: [], upTo: null, n: 1.25 };

export async function run(tools) {
  const bundle = await tools.bundle("coverCompare");
  const ask = async (cell, i) => {
    const question = { pairs, seed: 1 + 100000 * i, cell: { ...usual, ...cell } };
    const { code, out, errors } = await tools.measured(process.execPath, [bundle, JSON.stringify(question)]);
    if (code !== 0) throw new Error(`the bundle failed: ${errors}`);
    return JSON.parse(out);
  };
  const covered = [{ error: 0.01 }, { error: 0.02 }, { error: 0.05 }, { error: 0.02, stations: 8 }];
  const verdicts = [
    { ratio: 1.001, of: all },
    { ratio: 1.095, of: ["lambda"] },
    { ratio: 1.105, of: ["lambda"] },
    { ratio: 1.105, of: ["Tu"] },
    { ratio: 1 / 1.105, of: ["L11"] },
    { ratio: 1.105, of: all },
    { ratio: 1.2, of: ["lambda"] },
  ];
  const near = [
    { ratio: 1.105, of: ["lambda"], upTo: 20 },
    { ratio: 1.3, of: ["lambda"], upTo: 20 },
    { error: 0.01, ratio: 1.105, of: ["Tu", "lambda"], upTo: 40 },
  ];
  const found = await spread([...covered, ...verdicts, ...near], ask);
  printIntervals(tools, covered, found.slice(0, covered.length));
  printVerdicts(tools, verdicts, found.slice(covered.length, covered.length + verdicts.length));
  printBeyond(tools, near, found.slice(covered.length + verdicts.length));
}

/** Asks all cells, as many at a time as there are cores. */
async function spread(cells, ask) {
  const found = new Array(cells.length);
  let next = 0;
  const work = async () => {
    while (next < cells.length) {
      const at = next++;
      found[at] = await ask(cells[at], at);
    }
  };
  await Promise.all(Array.from({ length: availableParallelism() }, work));
  return found;
}

const percent = (count) => ((100 * count) / pairs).toFixed(1);

function printIntervals(tools, cells, found) {
  console.log("Share of the 95 % intervals that hold the truth: one n for both, origins nine lengths apart");
  tools.table(
    [
      "errors",
      "stations",
      "one n kept",
      "Tu",
      "L11",
      "lambda",
      "x0 apart",
      "own n",
      "at equal Tu",
      "Tu there",
    ],
    cells.map((cell, i) => [
      `${100 * (cell.error ?? usual.error)} %`,
      String(cell.stations ?? usual.stations),
      ...["shared", "Tu", "L11", "lambda", "extra"].map((key) => percent(found[i][key])),
      ((100 * found[i].extraShared) / found[i].shared).toFixed(1),
      ...["extraOwn", "matched", "Tu_at"].map((key) => percent(found[i][key])),
    ]),
  );
}

function printVerdicts(tools, cells, found) {
  console.log(`\nVerdicts; a wrong one may come at most ${100 * level} times in 100`);
  tools.table(
    ["true ratio", "of", "equivalent", "different", "all equivalent", ""],
    cells.map(({ ratio, of }, i) => {
      const { equivalent, different, allEquivalent } = found[i];
      const outside = Math.max(ratio, 1 / ratio) > 1.1;
      const wrong = outside ? equivalent : different;
      return [
        ratio.toFixed(3),
        of.length === all.length ? "all" : of.join(", "),
        percent(equivalent),
        percent(different),
        percent(allEquivalent),
        wrong / pairs > level + slack ? "OUTSIDE" : "",
      ];
    }),
  );
}

function printBeyond(tools, cells, found) {
  console.log(
    "\nFrom where on: a near field that departs; wrong where a stretch wholly inside it is claimed",
  );
  tools.table(
    ["true ratio", "of", "up to xi", "claimed from the start", "wrong", ""],
    cells.map(({ ratio, of, upTo }, i) => [
      ratio.toFixed(3),
      of.join(", "),
      String(upTo),
      percent(found[i].beyondAll),
      percent(found[i].wrong),
      found[i].wrong / pairs > level + slack ? "OUTSIDE" : "",
    ]),
  );
}
