import { relative } from "node:path";
import { notDrawn } from "./sample.mjs";

/** Statuses that count, and the two of them that count as a kill: a mutant that never ends has been noticed. */
const counted = ["Killed", "Timeout", "Survived", "NoCoverage"];
const detected = (status) => status === "Killed" || status === "Timeout";

/** The survivors by place, then a table of counts per file; of a sample, the score's 95 % interval too. */
export function summary(results, share) {
  const drawn = results.filter(({ statusReason }) => statusReason !== notDrawn);
  const alive = drawn.filter(({ status }) => status === "Survived" || status === "NoCoverage");
  const byFile = grouped(drawn);
  const rows = [...byFile].map(([file, mutants]) => row(file, mutants));
  return [
    ...alive.map(survivor),
    "",
    ["file", ...counted, "Error", "score %"].join("\t"),
    ...rows,
    row("all", drawn) + (share < 1 ? `\t(${intervalOf(drawn)})` : ""),
    "",
  ].join("\n");
}

function row(name, mutants) {
  const count = (wanted) => mutants.filter(({ status }) => status === wanted).length;
  const errors = count("RuntimeError") + count("CompileError");
  const valid = mutants.filter(({ status }) => counted.includes(status));
  const killed = valid.filter(({ status }) => detected(status)).length;
  const score = valid.length === 0 ? "none" : ((100 * killed) / valid.length).toFixed(1);
  return [name, ...counted.map(count), errors, score].join("\t");
}

/** Wilson's interval of a share (Wilson 1927). */
function intervalOf(mutants) {
  const valid = mutants.filter(({ status }) => counted.includes(status));
  const n = valid.length;
  const p = valid.filter(({ status }) => detected(status)).length / n;
  const z = 1.96;
  const middle = (p + z ** 2 / (2 * n)) / (1 + z ** 2 / n);
  const half = (z * Math.sqrt((p * (1 - p)) / n + z ** 2 / (4 * n ** 2))) / (1 + z ** 2 / n);
  return `95 %: ${(100 * (middle - half)).toFixed(1)} to ${(100 * (middle + half)).toFixed(1)}, of a sample`;
}

/** One mutant in one line. */
export function survivor({ status, fileName, location, mutatorName, replacement }) {
  const { line, column } = location.start;
  const text = String(replacement ?? "")
    .replace(/\s+/g, " ")
    .slice(0, 90);
  return `${status}\t${path({ fileName })}:${line}:${column}\t${mutatorName}\t${text}`;
}

const path = ({ fileName }) => relative(process.cwd(), fileName).split("\\").join("/");

function grouped(results) {
  const groups = new Map();
  for (const result of results) {
    const file = path(result);
    groups.set(file, [...(groups.get(file) ?? []), result]);
  }
  return groups;
}
