import type { CompareSettings, Comparison } from "../comparison.ts";
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

/** How two cases are laid over one another, and how to do it again with moved station values. */
export interface Alignment {
  readonly align: CompareSettings["align"];
  readonly with: Comparison["aligned_with"];
  readonly common: CommonExponent | null;
  /** Why one exponent for both was not tried; null where it was. */
  readonly why: string | null;
  /** Virtual origins of the aligned laws; null where a case has no law. */
  readonly origins: readonly [number, number] | null;
  /** Origins of the laws fitted anew to the station values that now stand in the cases' copies. */
  readonly refit: () => readonly [number, number] | null;
}

/** A refit is followed to this share of a standard error. */
const refitTolerance = 1e-3;

/**
 * The virtual origins two cases are shifted by: those of laws with one common exponent unless that is rejected at 5 %,
 * then those of each case's own; or as the settings choose.
 */
export function alignment(
  [first, second]: readonly [ComparedCase, ComparedCase],
  { align, exponent = "auto" }: CompareSettings,
): Alignment {
  const [a, b] = [first.law, second.law];
  if (a === null || b === null) {
    const without = [a === null ? [first.name] : [], b === null ? [second.name] : []].flat();
    const why = `${without.join(" and ")}: no law was fitted`;
    return { align, with: "none", common: null, why, origins: null, refit: () => null };
  }
  const held = [a, b].some(({ fitted }) => fitted.fit.held.n !== null);
  const common = held ? null : commonExponent([a.fitted, b.fitted]);
  const why = held ? "the exponent of a case is held" : null;
  const shared = common !== null && exponent !== "own" && (exponent === "common" || common.p >= 0.05);
  const used = align === "x" ? "none" : shared ? "common n" : "own n";
  if (common === null || !shared) {
    const refit = () => [ownOrigin(a), ownOrigin(b)] as const;
    return { align, with: used, common, why, origins: [a.fitted.fit.x0, b.fitted.fit.x0], refit };
  }
  const [lawA, lawB] = common.laws;
  const copies: JointCase[] = [
    { ...jointCase(a.fitted), problem: a.problem, law: lawA },
    { ...jointCase(b.fitted), problem: b.problem, law: lawB },
  ];
  const refit = () => {
    const { laws } = jointFit(copies, common.n, refitTolerance);
    return [origin(a, laws[0]), origin(b, laws[1])] as const;
  };
  return { align, with: used, common, why, origins: [origin(a, lawA), origin(b, lawB)], refit };
}

/** The law of one case alone, fitted anew to the station values that now stand in its copy. */
export function ownLaw({ fitted, problem }: ComparedLaw): CentredLaw {
  return minimiseLaw(problem, fitted.fit.law, fitted.fit.held, refitTolerance).law;
}

function ownOrigin(law: ComparedLaw): number {
  return origin(law, ownLaw(law));
}

function origin({ fitted, problem }: ComparedLaw, law: CentredLaw): number {
  return fitted.fit.held.x0 ?? originOf(problem, law);
}

function originOf({ centre }: LawProblem, { kappa }: CentredLaw): number {
  return centre - 1 / kappa;
}
