import { expect } from "vitest";

/** The keys that scripts rely on, checked one by one; what is more than these is free. */
const quantityKeys = ["value", "low", "high", "why", "why_low", "why_high"];

export const stationQuantities =
  "U uu vv ww uv uw vw k Tu isotropy_uv isotropy_uw T_int L11 lambda gradient epsilon epsilon_gradient epsilon_decay epsilon_inertial eta Re_lambda Re_L C_epsilon S_dudx balance".split(
    " ",
  );

type Json = Record<string, unknown>;

function object(found: unknown, place: string): Json {
  expect(typeof found === "object" && found !== null && !Array.isArray(found), `${place} is an object`).toBe(
    true,
  );
  return found as Json;
}

function list(found: unknown, place: string): unknown[] {
  expect(Array.isArray(found), `${place} is a list`).toBe(true);
  return found as unknown[];
}

function number(found: unknown, place: string) {
  expect(Number.isFinite(found), `${place} is a number, found ${JSON.stringify(found)}`).toBe(true);
}

function numberOrNull(found: unknown, place: string) {
  if (found !== null) number(found, place);
}

function text(found: unknown, place: string) {
  expect(typeof found === "string" && found !== "", `${place} is a text`).toBe(true);
}

/** {"value", "low", "high"} or {"value": null, "why"}; an end that is null with its reason. */
function quantity(found: unknown, place: string) {
  const each = object(found, place);
  expect(
    Object.keys(each).filter((key) => !quantityKeys.includes(key)),
    `${place} has no other keys`,
  ).toEqual([]);
  if (each.value === null) {
    text(each.why, `${place}.why`);
    expect(Object.keys(each).sort()).toEqual(["value", "why"]);
    return;
  }
  number(each.value, `${place}.value`);
  for (const end of ["low", "high"]) {
    expect(each, place).toHaveProperty(end);
    numberOrNull(each[end], `${place}.${end}`);
    if (each[end] === null) text(each[`why_${end}`], `${place}.why_${end}`);
  }
  if (each.low !== null) expect(each.low as number, place).toBeLessThanOrEqual(each.value as number);
  if (each.high !== null) expect(each.high as number, place).toBeGreaterThanOrEqual(each.value as number);
}

function flags(found: unknown, place: string) {
  for (const each of list(found, place)) {
    const flag = object(each, place);
    text(flag.code, `${place}.code`);
    text(flag.text, `${place}.text`);
    if (flag.value !== undefined) number(flag.value, `${place}.value`);
  }
}

function station(found: unknown, place: string) {
  const each = object(found, place);
  for (const key of ["x", "samples"]) number(each[key], `${place}.${key}`);
  numberOrNull(each.duration, `${place}.duration`);
  for (const key of stationQuantities) quantity(each[key], `${place}.${key}`);
  for (const [key, route] of Object.entries(object(each.routes, `${place}.routes`)))
    quantity(route, `${place}.routes.${key}`);
  flags(each.flags, `${place}.flags`);
}

function decay(found: unknown, place: string) {
  const each = object(found, place);
  expect(each.quantity, place).toMatch(/^(k|uu|q)$/);
  expect(each.residuals, place).toMatch(/^(log|linear)$/);
  expect(each.weights, place).toMatch(/^(sampling|equal)$/);
  for (const end of list(each.window, `${place}.window`)) number(end, `${place}.window`);
  number(each.stations, `${place}.stations`);
  for (const key of ["n", "x0", "A"]) quantity(each[key], `${place}.${key}`);
  for (const key of ["correlation_n_x0", "chi2_reduced"]) numberOrNull(each[key], `${place}.${key}`);
  for (const key of ["given_window", "lambda_route"]) {
    const route = object(each[key], `${place}.${key}`);
    for (const parameter of ["n", "x0"]) quantity(route[parameter], `${place}.${key}.${parameter}`);
  }
  quantity(object(each.growth, `${place}.growth`).m, `${place}.growth.m`);
  for (const hypothesis of list(each.hypotheses, `${place}.hypotheses`)) {
    const { name, n, p } = object(hypothesis, place);
    text(name, `${place}.hypotheses.name`);
    number(n, `${place}.hypotheses.n`);
    numberOrNull(p, `${place}.hypotheses.p`);
  }
}

function source(found: unknown, place: string) {
  const each = object(found, place);
  text(each.name, `${place}.name`);
  number(each.bytes, `${place}.bytes`);
  numberOrNull(each.x, `${place}.x`);
  expect(each, place).toHaveProperty("position");
}

function comparison(found: unknown, place: string) {
  const each = object(found, place);
  expect(list(each.cases, `${place}.cases`)).toHaveLength(2);
  text(each.align, `${place}.align`);
  number(each.tolerance, `${place}.tolerance`);
  if (each.overlap !== null) for (const end of list(each.overlap, place)) number(end, `${place}.overlap`);
  const quantities = object(each.quantities, `${place}.quantities`);
  for (const key of ["Tu", "L11", "lambda", "eta", "Re_lambda", "isotropy_uv"]) {
    const compared = object(quantities[key], `${place}.quantities.${key}`);
    quantity(compared.ratio, `${place}.${key}.ratio`);
    quantity(compared.largest, `${place}.${key}.largest`);
    if (compared.verdict !== null)
      expect(compared.verdict, `${place}.${key}`).toMatch(/^(equivalent|different|undecided)$/);
  }
  for (const key of ["extra_distance", "matched_distance"]) quantity(each[key], `${place}.${key}`);
  const common = object(each.common_n, `${place}.common_n`);
  numberOrNull(common.value, `${place}.common_n.value`);
  numberOrNull(common.p, `${place}.common_n.p`);
}

/** Fails unless this is a results file of schema 1. */
export function expectContract(found: unknown): void {
  const file = object(found, "results");
  expect(file).toMatchObject({
    program: "waneline",
    schema: 1,
    version: expect.stringMatching(/^\d+\.\d+\.\d+$/),
  });
  for (const each of list(file.cases, "cases")) {
    const one = object(each, "case");
    text(one.case, "case.case");
    const place = String(one.case);
    for (const key of ["settings", "scan", "development", "body"]) object(one[key], `${place}.${key}`);
    list(one.sources, `${place}.sources`).forEach((part, i) => {
      source(part, `${place}.sources[${i}]`);
    });
    const stations = list(one.stations, `${place}.stations`);
    stations.forEach((part, i) => {
      station(part, `${place}.stations[${i}]`);
    });
    const places = stations.map((part) => object(part, place).x as number);
    expect(places).toEqual([...places].sort((a, b) => a - b));
    decay(one.decay, `${place}.decay`);
    flags(one.flags, `${place}.flags`);
  }
  list(file.comparisons, "comparisons").forEach((each, i) => {
    comparison(each, `comparisons[${i}]`);
  });
}
