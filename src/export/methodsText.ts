import type { Comparison } from "../core/comparison.ts";
import { program } from "../core/program.ts";
import { bibTeX, type Source, sources } from "./bibliography.ts";
import { compareMethods } from "./methods/compareMethods.ts";
import { decayMethods } from "./methods/decayMethods.ts";
import type { MethodsCase } from "./methods/methodsCase.ts";
import { recordMethods } from "./methods/recordMethods.ts";
import { stationMethods } from "./methods/stationMethods.ts";
import { untestedMethods } from "./methods/untestedMethods.ts";

/** A few sentences of the methods text, and the sources they name. */
export interface MethodsPart {
  readonly text: string;
  readonly sources: readonly Source[];
}

export interface MethodsText {
  /** Paragraphs divided by blank lines. */
  readonly text: string;
  readonly bibTeX: string;
}

/**
 * What was done, as a methods section has it: made from the settings as they worked out, case by case where they
 * differ, with what was not tested, the program's version, and the sources.
 * @param cases       reduced and fitted, in the order of the page
 * @param comparisons every other case against the one chosen
 */
export function methodsText(cases: readonly MethodsCase[], comparisons: readonly Comparison[]): MethodsText {
  const parts: MethodsPart[] = [
    ...cases.map(recordMethods),
    ...alike(cases, stationMethods),
    ...alike(cases, decayMethods),
    ...(comparisons.length > 0 ? [compareMethods(comparisons[0])] : []),
    untestedMethods(cases),
    { text: `Computed with Waneline ${program.version}.`, sources: [] },
  ].filter(({ text }) => text !== "");
  const used = parts.flatMap((part) => part.sources);
  return {
    text: `${parts.map(({ text }) => text).join("\n\n")}\n`,
    bibTeX: bibTeX(used.length > 0 ? used : [sources.pope]),
  };
}

/** One paragraph for all cases that were treated alike; where they were not, each names its cases. */
function alike(cases: readonly MethodsCase[], describe: (one: MethodsCase) => MethodsPart): MethodsPart[] {
  const groups = new Map<string, { part: MethodsPart; names: string[] }>();
  for (const one of cases) {
    const part = describe(one);
    const group = groups.get(part.text);
    if (group) group.names.push(one.name);
    else groups.set(part.text, { part, names: [one.name] });
  }
  if (groups.size === 1) return [...groups.values()].map(({ part }) => part);
  return [...groups.values()].map(({ part, names }) => ({
    ...part,
    text: part.text === "" ? "" : `For ${names.join(" and ")}: ${part.text}`,
  }));
}
