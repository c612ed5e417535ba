import type { Comparison } from "../../core/comparison.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";

/** A place on what two cases are laid over one another by, without its symbol: "20 M", "0.50 m", "3.2 %". */
export function comparedPlaceText(
  at: number,
  { align, cases: names }: Pick<Comparison, "align" | "cases">,
  cases: readonly CaseView[],
): string {
  if (align === "Tu") return withUnit(formatDigits(100 * at, 3), "%");
  const [first, second] = names.map((name) => cases.find((view) => view.name === name));
  const units = first?.units ?? "SI";
  const unit = unitOf(first?.along === "t" ? "T" : "L", units);
  if (align === "x") return withUnit(formatPosition(Number(at.toPrecision(4))), unit);
  const divided = first?.length != null && second?.length != null;
  return withUnit(formatDigits(at, 3), divided ? first.symbol : unit);
}
