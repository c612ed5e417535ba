// How often the 95 % intervals of the decay law hold the truth, and how long refits take beside SciPy's curve_fit.
import { mkdirSync, writeFileSync } from "node:fs";
import { availableParallelism } from "node:os";
import { join } from "node:path";

const profiles = 2000;
export const title = `Coverage of the 95 % intervals of n and x0 over ${profiles} synthetic profiles a cell`;

/** Least and largest share that is right, from this span on. */
const bar = [0.93, 0.97];
const barFromSpan = 4;
const unionBar = 0.95;
/** Most that 2000 refits may take, CPU milliseconds and share of the peer. */
const refitBars = { milliseconds: 30, share: 0.12 };

/** The first is the pure law; two are as a grid was designed; the others die out more slowly or otherwise. */
const nearFields = [
  { form: "exp(-(x - 6)/6)", excess: 0 },
  { form: "exp(-(x - 6)/6)", excess: 0.3 },
  { form: "exp(-(x - 6)/6)", excess: 1 },
  { form: "exp(-(x - 6)/6)", excess: 0.03 },
  { form: "exp(-(x - 6)/6)", excess: 0.1 },
  { form: "(x/6)^-3", excess: 0.3 },
  { form: "(x/6)^-3", excess: 1 },
  { form: "exp(-(x - 6)/15)", excess: 0.3 },
  { form: "exp(-(x - 6)/15)", excess: 1 },
];

export async function run(tools) {
  const bundle = await tools.bundle("coverDecay");
  const ask = async (question) => {
    const { code, out, errors } = await tools.measured(process.execPath, [bundle, JSON.stringify(question)]);
    if (code !== 0) throw new Error(`the bundle failed: ${errors}`);
    return JSON.parse(out);
  };
  await printCells(tools, ask);
  await printWindows(tools, ask);
  await printTogether(tools, ask);
  await printTimes(tools, ask);
}

async function printCells(tools, ask) {
  const cells = [];
  for (const known of [true, false])
    for (const scatter of [0.02, 0.05])
      for (const span of [2, 4, 8, 16])
        for (const stations of [6, 10, 20]) cells.push({ scatter, span, stations, known });
  // dealt out in turn, so that each core has its share of the slow cells
  const parts = availableParallelism();
  const tallies = new Array(cells.length);
  await Promise.all(
    Array.from({ length: parts }, async (_, part) => {
      const own = cells.map((_, i) => i).filter((i) => i % parts === part);
      const answers = await ask({
        kind: "cells",
        profiles,
        seeds: own.map((i) => 1 + 1000 * i),
        cells: own.map((i) => cells[i]),
      });
      own.forEach((i, at) => {
        tallies[i] = answers[at];
      });
    }),
  );
  console.log(
    `Bar ${100 * bar[0]} to ${100 * bar[1]} % from a span of ${barFromSpan} on; below it, printed.`,
  );
  tools.table(
    ["errors", "scatter", "span", "stations", "n %", "x0 %", "", "open %", "no law %"],
    cells.map((cell, i) => cellRow(cell, tallies[i])),
  );
}

function cellRow({ scatter, span, stations, known }, { n, x0, open, refused }) {
  // a profile without a law gives no interval; it is told apart in its own column
  const fitted = profiles - refused;
  const inside = [n, x0].every((held) => held / fitted >= bar[0] && held / fitted <= bar[1]);
  return [
    known ? "known" : "from scatter",
    `${(100 * scatter).toFixed(0)} %`,
    String(span),
    String(stations),
    percent(n / fitted),
    percent(x0 / fitted),
    span < barFromSpan ? "no bar" : inside ? "" : "OUTSIDE",
    percent(open / profiles),
    percent(refused / profiles),
  ];
}

const percent = (share) => (100 * share).toFixed(1);

async function printWindows(tools, ask) {
  const found = await ask({ kind: "windows", profiles, fields: nearFields });
  console.log(
    `\nAutomatic windows: 16 stations at x/M = 6 to 100, 0.5 %, q = (x - 3)^-1.25 (1 + excess form); bar ${100 * unionBar} % on the union for the pure law; ` +
      "flagged: the flag near-field is raised; every start: the union over all that leave five stations; silent: the adopted union where the flag is not raised",
  );
  tools.table(
    [
      "near field",
      "form",
      "begins at",
      "given: n %",
      "x0 %",
      "union: n %",
      "x0 %",
      "",
      "every start: n %",
      "x0 %",
      "flagged %",
      "silent: n %",
    ],
    found.map(({ form, excess, begins, given, union, every, silent }) => [
      `${(100 * excess).toFixed(0)} %`,
      excess === 0 ? "" : form,
      begins.toFixed(1),
      ...[given.n, given.x0, union.n, union.x0].map((held) => percent(held / profiles)),
      excess > 0 || Math.min(union.n, union.x0) >= unionBar * profiles ? "" : "OUTSIDE",
      ...[every.n, every.x0].map((held) => percent(held / profiles)),
      percent(1 - silent.profiles / profiles),
      silent.profiles < 20 ? "few" : percent(silent.n / silent.profiles),
    ]),
  );
}

async function printTogether(tools, ask) {
  const found = await ask({ kind: "together", profiles: profiles / 4, rhos: [0, 0.8, 0.95] });
  console.log(
    `\nStations sampled together: 12 over a span of 4.75, 1000 integral times, ${profiles / 4} profiles; coverage of n and x0 by their common blocks, where the data have to tell, and each station for itself`,
  );
  tools.table(
    ["neighbours correlated", "blocks: n %", "x0 %", "told: n %", "x0 %", "alone: n %", "x0 %"],
    found.map(({ rho, blocks, auto, alone }) => [
      rho.toFixed(2),
      ...[blocks, auto, alone].flatMap((tally) =>
        [tally.n, tally.x0].map((held) => percent(held / (tally.profiles - tally.refused))),
      ),
    ]),
  );
}

async function printTimes(tools, ask) {
  const rounds = 40;
  mkdirSync(tools.generated, { recursive: true });
  const file = join(tools.generated, "refits.json");
  writeFileSync(file, JSON.stringify(await ask({ kind: "profiles", profiles })));
  const own = await ask({ kind: "refits", profiles, rounds });
  const warm = Math.min(...own.times.slice(1));
  console.log(`\n${profiles} refits of 30 stations, CPU milliseconds of one core, best of ${rounds} rounds`);
  const peer = await tools.measured("python3", [join(import.meta.dirname, "refitPeer.py"), file, "5"]);
  const rows = [["Waneline", own.times[0].toFixed(0), warm.toFixed(1), ...numbers(own.mean)]];
  if (peer.code === 0) {
    const { times, mean, scipy, failed } = JSON.parse(peer.out);
    const best = Math.min(...times);
    rows.push([
      `SciPy ${scipy} curve_fit${failed > 0 ? ` (${failed} failed)` : ""}`,
      times[0].toFixed(0),
      best.toFixed(1),
      ...numbers(mean),
    ]);
    tools.table(["", "first", "warm", "mean n", "mean x0"], rows);
    const share = warm / best;
    console.log(
      `ratio ${share.toFixed(3)}, bar ${refitBars.share}${share > refitBars.share ? " OUTSIDE" : ""}; ` +
        `bar ${refitBars.milliseconds} ms${warm > refitBars.milliseconds ? " OUTSIDE" : ""}`,
    );
  } else {
    tools.table(["", "first", "warm", "mean n", "mean x0"], rows);
    console.log("python3 with SciPy is not to be had: no peer");
  }
}

const numbers = ({ n, x0 }) => [n.toFixed(4), x0.toFixed(4)];
