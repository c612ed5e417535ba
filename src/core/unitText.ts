import type { Dimension, Label } from "./catalogue.ts";

export type Units = "SI" | "nondimensional";

const si: Readonly<Record<Dimension, string>> = {
  "1": "",
  L: "m",
  T: "s",
  "L/T": "m/s",
  "L²/T": "m²/s",
  "L²/T²": "m²/s²",
  "L²/T³": "m²/s³",
  "1/T²": "1/s²",
  // Nothing but wavenumbers has this dimension here, and they are angular.
  "1/L": "rad/m",
  "L³/T²": "m³/s²",
};

/** The unit of a dimension; empty where there is none, and in a non-dimensional case. */
export function unitOf(dimension: Dimension, units: Units): string {
  return units === "SI" ? si[dimension] : "";
}

/** How a quantity is shown: its number times `factor`, followed by `unit`. */
export interface Display {
  readonly factor: number;
  readonly unit: string;
}

/** Percent, thousandths of the SI unit (mm, ms), or the unit itself, as the label asks. */
export function displayOf(label: Label, units: Units): Display {
  if (label.percent) return { factor: 100, unit: "%" };
  const unit = unitOf(label.dimension, units);
  return label.milli && unit !== "" ? { factor: 1000, unit: `m${unit}` } : { factor: 1, unit };
}
