import * as v from "valibot";
import { comparedQuantities } from "../core/comparison.ts";
import { profileRoles, recordRoles } from "../core/records.ts";
import { defaultCaseSheet as standard } from "./defaultCaseSheet.ts";

const finite = v.pipe(v.number("a number"), v.finite("a finite number"));
const positive = v.pipe(
  finite,
  v.check((value) => value > 0, "a number above zero"),
);
const notNegative = v.pipe(finite, v.minValue(0, "a number, zero or above"));
const text = v.pipe(v.string("a text"), v.trim(), v.nonEmpty("a text that is not empty"));
const oneOf = <const T extends readonly string[]>(...options: T) =>
  v.picklist(options, options.map((option) => `"${option}"`).join(" or "));
const orAuto = v.union([v.boolean(), v.literal("auto")], 'true, false or "auto"');

const columnNumber = v.pipe(
  finite,
  v.integer("a whole column number"),
  v.minValue(0, "a column number from 1"),
);
const place = v.union([text, columnNumber], "a heading or a column number");
const column = v.union(
  [text, columnNumber, v.object({ from: place, unit: text })],
  'a heading, a column number from 1 (0: not used), or {"from": ..., "unit": ...}',
);

/** Lists are objects too, to JavaScript, and would pass as an object with every key left out. */
const keyed = <T extends v.ObjectEntries>(entries: T) =>
  v.pipe(
    v.custom<object>((value) => value instanceof Object && !Array.isArray(value), "an object"),
    v.object(entries),
  );

const columns = keyed(
  Object.fromEntries([...recordRoles, ...profileRoles].map((role) => [role, v.optional(column)])),
);

const window = v.union(
  [
    v.literal("auto"),
    v.pipe(
      v.tuple([finite, finite]),
      v.check(([first, last]) => first < last, "[first x, last x], the first below the last"),
    ),
  ],
  '"auto" or [first x, last x], the first below the last',
);
const powerOfTwo = v.pipe(
  finite,
  v.check((value) => value >= 16 && Number.isInteger(Math.log2(value)), "a power of two from 16"),
);

/** An object whose every key may be left out: what stands in `fallback` is taken then. */
const part = <T extends v.ObjectEntries>(entries: T, fallback: object) =>
  v.optional(keyed(entries), fallback as never);

/**
 * The case sheet as users write it, to the case sheet with every default filled in.
 * Messages say what was expected; keys are those of the README, to the letter.
 */
export const caseSheetSchema = keyed({
  case: text,
  kinematicViscosity: v.optional(v.nullable(positive), standard.kinematicViscosity),
  units: v.optional(oneOf("SI", "nondimensional"), standard.units),
  reference: part(
    {
      length: v.optional(v.nullable(positive), standard.reference.length),
      symbol: v.optional(text, standard.reference.symbol),
      speed: v.optional(v.nullable(positive), standard.reference.speed),
    },
    {},
  ),
  layout: oneOf("series", "lines", "profile"),
  along: v.optional(oneOf("x", "t"), standard.along),
  columns: v.optional(v.nullable(columns), standard.columns),
  files: v.pipe(
    v.array(
      v.object({ path: text, x: v.optional(v.nullable(finite), null) }, 'an object {"path": ...}'),
      "a list of files",
    ),
    v.nonEmpty("at least one file"),
  ),
  fit: part(
    {
      quantity: v.optional(oneOf("auto", "k", "uu", "q"), standard.fit.quantity),
      window: v.optional(window, "auto"),
      x0: v.optional(v.nullable(finite), standard.fit.x0),
      n: v.optional(v.nullable(positive), standard.fit.n),
      residuals: v.optional(oneOf("log", "linear"), standard.fit.residuals),
      weights: v.optional(oneOf("sampling", "equal"), standard.fit.weights),
      coordinate: v.optional(oneOf("auto", "x", "flight"), standard.fit.coordinate),
      otherX0: v.optional(v.nullable(finite), standard.fit.otherX0),
    },
    {},
  ),
  kind: v.optional(v.nullable(oneOf("measurement", "dns", "les")), standard.kind),
  read: part(
    {
      separator: v.optional(v.nullable(oneOf(",", ";", "\t", " ")), standard.read.separator),
      decimal: v.optional(v.nullable(oneOf(".", ",")), standard.read.decimal),
      heading: v.optional(
        v.nullable(v.pipe(notNegative, v.integer("a whole line number, 0 for none"))),
        standard.read.heading,
      ),
      step: v.optional(v.nullable(positive), standard.read.step),
      times: v.optional(oneOf("ask", "even", "written"), standard.read.times),
      missing: v.optional(v.array(v.string("a text"), "a list of texts"), [...standard.read.missing]),
    },
    {},
  ),
  zero: v.optional(finite, standard.zero),
  simultaneous: v.optional(orAuto, standard.simultaneous),
  periodic: v.optional(orAuto, standard.periodic),
  startup: v.optional(notNegative, standard.startup),
  extent: v.optional(v.nullable(positive), standard.extent),
  sensorLength: v.optional(v.nullable(positive), standard.sensorLength),
  reduce: part(
    {
      integralScale: v.optional(
        oneOf("zero-crossing", "one-over-e", "exponential", "low-frequency", "model"),
        standard.reduce.integralScale,
      ),
      correlation: v.optional(oneOf("biased", "unbiased"), standard.reduce.correlation),
      detrend: v.optional(oneOf("mean", "linear"), standard.reduce.detrend),
      segment: v.optional(v.nullable(powerOfTwo), standard.reduce.segment),
      taylorCorrection: v.optional(v.boolean("true or false"), standard.reduce.taylorCorrection),
      dissipation: v.optional(oneOf("auto", "gradient", "decay", "inertial"), standard.reduce.dissipation),
      probes: v.optional(oneOf("agreeing", "all"), standard.reduce.probes),
    },
    {},
  ),
  body: v.optional(
    v.nullable(
      keyed({
        x: finite,
        chord: v.optional(v.nullable(positive), null),
        Tu: v.optional(v.nullable(positive), null),
        L11: v.optional(v.nullable(positive), null),
      }),
    ),
    standard.body,
  ),
  development: part({ tolerance: v.optional(positive, standard.development.tolerance) }, {}),
  compare: part(
    {
      align: v.optional(oneOf("x0", "x", "Tu"), standard.compare.align),
      tolerance: v.optional(positive, standard.compare.tolerance),
      exponent: v.optional(oneOf("auto", "common", "own"), standard.compare.exponent),
      against: v.optional(v.nullable(text), standard.compare.against),
      at: v.optional(v.nullable(finite), standard.compare.at),
      quantities: v.optional(
        v.pipe(
          v.array(oneOf(...comparedQuantities), "a list of quantities"),
          v.nonEmpty("at least one quantity"),
          v.check((list) => new Set(list).size === list.length, "each quantity once"),
        ),
        [...standard.compare.quantities],
      ),
    },
    {},
  ),
});
