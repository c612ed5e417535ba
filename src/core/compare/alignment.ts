import { type CompareSettings, type Comparison, compareDefaults } from "../comparison.ts";
import { placeBack } from "../decay/flightCourse.ts";
import type { CentredLaw, LawProblem } from "../decay/lawProblem.ts";
import { minimiseLaw } from "../decay/minimiseLaw.ts";
import {
  type CommonExponent,
  commonExponent,
  type JointCase,
  jointCase,
  jointFit,
} from "./commonExponent.ts";
import type { ComparedCase, ComparedLaw } from "./comparedCase.ts";

/** Virtual origins of all cases, along what each law runs along, by both ways of fitting; null without a law. */
export interface Origins {
  readonly own: readonly (number | null)[];
  /** By laws with one exponent; null where that was not tried. */
  readonly common: readonly (number | null)[] | null;
}

/** How the cases are laid over one another, and how to do it again with moved station values. */
export interface Alignment {
  readonly align: CompareSettings["align"];
  readonly with: Comparison["aligned_with"];
  /** One exponent for all cases that have a law. */
  readonly common: CommonExponent | null;
  /** Why one exponent for all was not tried; null where it was. */
  readonly why: string | null;
  readonly origins: Origins;
  /** The laws fitted anew to the station values that now stand in the cases' copies. */
  readonly refit: () => { readonly origins: Origins; readonly own: readonly (CentredLaw | null)[] };
}

/** A refit is followed to this share of a standard error. */
const refitTolerance = 1e-3;
const rejectedBelow = 0.05;

/**
 * The virtual origins that cases are shifted by: those of laws with one exponent for all, unless that is rejected at
 * 5 %, then those of each case's own; or as the settings choose. Both are found, so that both can be shown.
 * @param cases two or more; those without a law take no part
 */
export function alignment(
  cases: readonly ComparedCase[],
  { align, exponent = compareDefaults.exponent }: CompareSettings,
): Alignment {
  const laws = cases.map(({ law }) => law);
  const fitted = laws.filter((law) => law !== null);
  const why = withoutCommon(fitted);
  const common = why === null ? commonExponent(fitted.map((law) => law.fitted)) : null;
  const copies = fitted.map(
    (law, i): JointCase => ({
      ...jointCase(law.fitted),
      problem: law.problem,
      law: common?.laws[i] ?? law.fitted.fit.law,
    }),
  );
  const spread = (found: readonly CentredLaw[]) =>
    laws.map((law) => (law === null ? null : originOf(law, found[fitted.indexOf(law)])));
  const refit = () => {
    const own = laws.map((law) => (law === null ? null : ownLaw(law)));
    const joint = common === null ? null : jointFit(copies, common.n, refitTolerance);
    const ownOrigins = own.map((found, i) => {
      const law = laws[i];
      return found === null || law === null ? null : originOf(law, found);
    });
    return { own, origins: { own: ownOrigins, common: joint === null ? null : spread(joint.laws) } };
  };
  return {
    align,
    with: align === "x" ? "none" : isShared(common, exponent) ? "common n" : "own n",
    common,
    why,
    origins: {
      own: laws.map((law) => law?.fitted.fit.x0 ?? null),
      common: common === null ? null : spread(common.laws),
    },
    refit,
  };
}

/** Origins along what each law runs along, as places in x. */
export function originsBack(cases: readonly ComparedCase[], { own, common }: Origins): Origins {
  const back = (origins: Origins["own"]) =>
    origins.map((at, i) => (at === null ? null : placeBack(cases[i].flight, at)));
  return { own: back(own), common: common === null ? null : back(common) };
}

/** The origins that the cases are in fact shifted by. */
export function usedOrigins(aligned: Pick<Alignment, "with">, { own, common }: Origins): Origins["own"] {
  return aligned.with === "common n" && common !== null ? common : own;
}

function withoutCommon(fitted: readonly ComparedLaw[]): string | null {
  if (fitted.length < 2) return "fewer than two cases have a law";
  return fitted.some((law) => law.fitted.fit.held.n !== null) ? "the exponent of a case is held" : null;
}

function isShared(common: CommonExponent | null, exponent: CompareSettings["exponent"]): boolean {
  if (common === null || exponent === "own") return false;
  return exponent === "common" || common.p >= rejectedBelow;
}

/** The law of one case alone, fitted anew to the station values that now stand in its copy. */
function ownLaw({ fitted, problem }: ComparedLaw): CentredLaw {
  return minimiseLaw(problem, fitted.fit.law, fitted.fit.held, refitTolerance).law;
}

function originOf({ fitted, problem }: ComparedLaw, law: CentredLaw): number {
  return fitted.fit.held.x0 ?? centredOrigin(problem, law);
}

function centredOrigin({ centre }: LawProblem, { kappa }: CentredLaw): number {
  return centre - 1 / kappa;
}
