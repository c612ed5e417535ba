import type { BodyArgument, BodyKey } from "../../core/decayArgument.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import type { SettingRow } from "./definitionRows.ts";
import type { FoundNumber } from "./foundNumber.ts";

/** A case with what a body meets in it, and the fit that this follows from. */
export interface PlacedBody {
  readonly view: CaseView;
  readonly decay: DecayResult;
  readonly body: BodyArgument;
}

export function placedBodies(cases: readonly CaseView[]): readonly PlacedBody[] {
  return cases.flatMap((view) => {
    const argued = arguedOf(view);
    const body = argued?.argument.body ?? null;
    return argued === null || body === null ? [] : [{ view, decay: argued.decay, body }];
  });
}

/** What a number at the body rests on, for its definition. */
export function bodyNumber(placed: PlacedBody, shown: string, rows: readonly SettingRow[]): FoundNumber {
  const { view, body } = placed;
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  const place: SettingRow[] = [
    ["body", withUnit(formatPosition(body.x), unit)],
    ...(body.chord === null
      ? []
      : [["chord", withUnit(formatDigits(body.chord, 3), unitOf("L", view.units))] as const]),
  ];
  return { kind: "page", view, shown, rows: [...place, ...rows] };
}

/** How a quantity is found between the stations, and where its interval comes from. */
export function howFound({ decay, body }: PlacedBody, key: BodyKey): readonly SettingRow[] {
  const [first, last] = decay.window;
  const inside = body.x >= first && body.x <= last;
  const { law } = decay;
  if (key === "Tu" && law !== null && inside && decay.quantity !== "q" && decay.speed !== null)
    return [
      ["found", "by the fitted law"],
      ["interval", "covariance of the law’s coefficient, n and x0"],
    ];
  return [
    [
      "found",
      law === null
        ? "between its neighbouring stations, a straight line in ln x"
        : "between its neighbouring stations, a straight line in ln(x − x0)",
    ],
    ["interval", "errors of those stations"],
  ];
}
