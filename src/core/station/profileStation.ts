import { ReductionFailure } from "../failure.ts";
import type { Flag } from "../flag.ts";
import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { ProfileRow, SourceNote } from "../records.ts";
import type { ReduceSettings, StationFacts, StationResult } from "../stationResult.ts";
import { profileTensor } from "./profileTensor.ts";
import { withError } from "./stationErrors.ts";
import type { Component } from "./stationPart.ts";
import { lateral } from "./stationValues.ts";

type Values = ProfileRow["values"];
const names: readonly Component[] = ["u", "v", "w"];
const squares = { u: "uu", v: "vv", w: "ww" } as const;
const noError = "the profile gives no standard error";

/**
 * One station from a row of statistics that were reduced elsewhere: what follows from them, and nothing else.
 * Only q has an interval, from the column se: normal in the logarithm.
 *     lambda = √(15 ν uu/epsilon) where it is not given, epsilon = 15 ν uu/lambda² where that is not
 * @param row       values in the units of the case
 * @param settings  what the user decided
 * @param source    note of the file, for the results
 * @throws not-a-number a variance, rms value, length or dissipation that is not positive
 * @throws no-velocity  a row without uu, u_rms or q
 */
export function profileStation(
  row: ProfileRow,
  settings: ReduceSettings,
  source: SourceNote | null = null,
): StationResult {
  checkRow(row);
  const { values } = row;
  const squared = names.map((name) => variance(values, name));
  const components = names.filter((_, i) => !Number.isNaN(squared[i]));
  const none = missing("a profile holds no time series");
  const scales = profileScales(values, squared[0], settings);
  const { lambda } = scales;
  const tensor = profileTensor(squared, values.uv ?? Number.NaN);
  return {
    x: row.x,
    samples: 0,
    duration: null,
    ...profileMoments(values, squared, settings),
    ...scales,
    epsilon_decay: missing("it follows from the decay law"),
    epsilon_inertial: none,
    S_dudx: none,
    balance: missing("it follows from the decay law"),
    q: givenQ(values),
    routes: {
      lambda_f: isEstimate(lambda) ? bare(Math.SQRT2 * lambda.value, noError) : lambda,
      ...tensor.routes,
    },
    flags: [...profileFlags(components, settings), ...tensor.flags],
    sources: source === null ? [] : [source],
    curves: null,
    blocks: null,
    facts: { ...emptyFacts, components },
  };
}

function given(value: number, why: string): Quantity {
  return Number.isFinite(value) ? bare(value, noError) : missing(why);
}

/** Means and stresses as given, and k, Tu and the ratios from them. */
function profileMoments(values: Values, [uu, vv, ww]: readonly number[], settings: ReduceSettings) {
  const U = values.U ?? Number.NaN;
  const [v2, w2] = lateral(uu, vv, ww);
  const k = (uu + v2 + w2) / 2;
  const noUu = "the profile has no column uu or u_rms";
  const Tu = Math.sqrt((2 * k) / 3) / (settings.referenceSpeed ?? U);
  return {
    U: given(U, "the profile has no column U"),
    uu: given(uu, noUu),
    vv: given(vv, "the profile has no column vv or v_rms"),
    ww: given(ww, "the profile has no column ww or w_rms"),
    uv: given(values.uv ?? Number.NaN, "the profile has no column uv"),
    uw: missing("a profile holds no uw"),
    vw: missing("a profile holds no vw"),
    k: given(k, noUu),
    Tu: given(Tu, Number.isNaN(uu) ? noUu : "neither U nor a reference speed is given"),
    isotropy_uv: given(Math.sqrt(uu / vv), "u and v are not both given"),
    isotropy_uw: given(Math.sqrt(uu / ww), "u and w are not both given"),
    T_int: given((values.L ?? Number.NaN) / U, "the profile has no columns L and U"),
  };
}

function variance(values: Values, name: Component): number {
  const [square, rms] = [values[squares[name]], values[`${name}_rms`]];
  return square ?? (rms === undefined ? Number.NaN : rms * rms);
}

function givenQ(values: Values): Quantity {
  if (values.q === undefined) return missing("the profile has no column q");
  if (values.se === undefined || values.se === 0) return bare(values.q, noError);
  return withError(values.q, { standard: values.se / values.q, freedom: null, scale: "log" });
}

/** Lengths, dissipation and what follows from both; each given, or derived from the other and nu. */
function profileScales(values: Values, uu: number, settings: ReduceSettings) {
  const nu = settings.kinematicViscosity ?? Number.NaN;
  const lambdaGiven = values.lambda ?? Number.NaN;
  const rms = Math.sqrt(uu);
  const gradient = uu / lambdaGiven ** 2;
  const epsilonGradient = 15 * nu * gradient;
  const epsilon = settings.dissipation === "decay" ? Number.NaN : (values.epsilon ?? epsilonGradient);
  const lambda = Number.isFinite(lambdaGiven) ? lambdaGiven : Math.sqrt((15 * nu * uu) / epsilon);
  const L11 = values.L ?? Number.NaN;
  const why =
    settings.kinematicViscosity === null
      ? "no kinematic viscosity is given"
      : "the profile has no column lambda or epsilon: it follows from the decay law";
  const noLength = "the profile has no column L";
  return {
    L11: given(L11, noLength),
    lambda: given(lambda, why),
    gradient: given(gradient, "the profile has no column lambda"),
    epsilon: given(epsilon, why),
    epsilon_gradient: given(epsilonGradient, Number.isNaN(nu) ? why : "the profile has no column lambda"),
    eta: given((nu ** 3 / epsilon) ** 0.25, why),
    Re_lambda: given((rms * lambda) / nu, why),
    Re_L: given((rms * L11) / nu, Number.isNaN(L11) ? noLength : why),
    C_epsilon: given((epsilon * L11) / rms ** 3, Number.isNaN(L11) ? noLength : why),
  };
}

function profileFlags(components: readonly Component[], settings: ReduceSettings): Flag[] {
  const flags: Flag[] = [];
  if (components.length === 1) {
    flags.push({ code: "isotropy-assumed", text: "u alone is given: isotropy is assumed, not tested." });
  }
  if (components.length === 2) {
    const [, known] = components;
    const text = `${known === "v" ? "w" : "v"} is not given and is taken like ${known}.`;
    flags.push({ code: "axisymmetry-assumed", text });
  }
  if (settings.kinematicViscosity === null) {
    flags.push({
      code: "no-viscosity",
      text: "No kinematic viscosity is given: Reynolds numbers are missing.",
    });
  }
  return flags;
}

const mustBePositive = ["uu", "vv", "ww", "u_rms", "v_rms", "w_rms", "q", "lambda", "L", "epsilon"] as const;

function checkRow({ values, file, line }: ProfileRow): void {
  for (const name of [...mustBePositive, "se"] as const) {
    const value = values[name];
    if (value === undefined || value > 0 || (name === "se" && value === 0)) continue;
    throw new ReductionFailure(
      "not-a-number",
      {
        message: `${name} is not positive`,
        found: String(value),
        expected: "a number above zero",
        remedy: `Mend the value, or leave the line or the column ${name} out.`,
      },
      { file, line },
    );
  }
  if (values.uu !== undefined || values.u_rms !== undefined || values.q !== undefined) return;
  throw new ReductionFailure(
    "no-velocity",
    {
      message: "the row has no decaying quantity",
      expected: "a column uu, u_rms or q",
      remedy: "Name the column that holds it.",
    },
    { file, line },
  );
}

const emptyFacts: StationFacts = {
  step: null,
  integralTimes: null,
  groups: 0,
  segment: null,
  segments: 0,
  recoveredVariance: null,
  cutoff: null,
  noiseFloor: null,
  shareBeyondCutoff: null,
  taylorFactor: null,
  k1max_eta: null,
  lagLimit: null,
  tauStar: null,
  components: [],
};
