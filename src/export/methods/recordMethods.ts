import { unitOf } from "../../core/unitText.ts";
import { formatCount, formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { MethodsPart } from "../methodsText.ts";
import type { MethodsCase } from "./methodsCase.ts";

const kinds = {
  measurement: "a measurement",
  dns: "a direct simulation",
  les: "a large-eddy simulation",
} as const;

/** What was recorded: stations, lengths of the records, components. */
export function recordMethods({ name, settings, stations }: MethodsCase): MethodsPart {
  if (stations.length === 0) return { text: "", sources: [] };
  const { units, layout, along, kind, startup, kinematicViscosity } = settings;
  const unit = unitOf(along === "t" ? "T" : "L", units);
  const [first, last] = [stations[0].x, stations[stations.length - 1].x];
  const what = kind === null ? "" : ` (${kinds[kind]})`;
  const count = stations.length === 1 ? "one station" : `${stations.length} stations`;
  const range = `${formatPosition(first)} to ${withUnit(formatPosition(last), unit)}`;
  const sentences = [`${name}${what}: ${count} from ${along} = ${range}.`];
  if (layout === "profile") sentences.push("The statistics were given as such; no record was reduced.");
  else sentences.push(...lengths(stations, units));
  if (startup > 0)
    sentences.push(
      `The first ${withUnit(formatDigits(startup, 3), unitOf("T", units))} of every record were left out.`,
    );
  if (kinematicViscosity !== null) {
    const nu = withUnit(formatDigits(kinematicViscosity, 3), unitOf("L²/T", units));
    sentences.push(`The kinematic viscosity was taken as ${nu}.`);
  }
  return { text: sentences.join(" "), sources: [] };
}

function lengths(stations: MethodsCase["stations"], units: MethodsCase["settings"]["units"]): string[] {
  const times = stations.flatMap(({ facts }) => facts.integralTimes ?? []);
  const samples = stations.map((station) => station.samples);
  const span = (values: readonly number[]) => {
    const [least, most] = [Math.min(...values), Math.max(...values)].map((value) =>
      formatCount(Math.round(value)),
    );
    return least === most ? least : `${least} to ${most}`;
  };
  const steps = [...new Set(stations.flatMap(({ facts }) => facts.step ?? []))];
  const step =
    steps.length === 1 ? ` at steps of ${withUnit(formatDigits(steps[0], 3), unitOf("T", units))}` : "";
  const lines = stations.find(({ facts }) => facts.lines)?.facts.lines;
  if (lines) {
    return [
      `Each was sampled on lines along ${lines.along}: ${lines.points} points, ${span(stations.flatMap(({ facts }) => facts.lines?.snapshots ?? []))} snapshots.`,
    ];
  }
  return [
    `Each station has ${span(samples)} samples${step}${times.length > 0 ? `, ${span(times)} integral times` : ""}.`,
  ];
}
