import { labelOf } from "../../core/catalogue.ts";
import { type ComparedRatio, type Comparison, comparedQuantities } from "../../core/comparison.ts";
import type { Quantity } from "../../core/quantity.ts";
import { formatDigits, formatPosition, formatProbability, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import type { SettingRow } from "./definitionRows.ts";

const alignments = {
  x0: "at equal distance from the origins",
  x: "at equal position",
  Tu: "at equal intensity",
} as const;

/** What a number of a comparison rests on: which cases, how they are aligned, over which range, and its tests. */
export function comparisonSettings(
  comparison: Comparison,
  views: readonly CaseView[],
  quantity: Quantity,
): SettingRow[] {
  const { cases, align, tolerance, overlap, aligned_with } = comparison;
  const [first, second] = cases;
  const compared = comparedQuantities.find((key) => {
    const { ratio, largest } = comparison.quantities[key];
    return ratio === quantity || largest === quantity;
  });
  const rows: (SettingRow | null)[] = [
    ["cases", `${second} against ${first}`],
    compared === undefined ? null : ["quantity", labelOf(compared).name],
    ["aligned", alignments[align] + (align === "x0" ? exponentText(aligned_with) : "")],
    overlap === null ? null : ["common range", rangeText(overlap, comparison, views)],
    quantity.value === null || quantity.low === null
      ? null
      : [
          "interval",
          "every station value drawn anew about the measured one, both laws fitted again each time",
        ],
    ["tolerance", withUnit(formatDigits(100 * tolerance, 2), "%")],
    ...(compared === undefined ? [] : verdictRows(comparison.quantities[compared])),
  ];
  return rows.filter((row) => row !== null);
}

function exponentText(how: Comparison["aligned_with"]): string {
  if (how === "none") return "";
  return how === "common n" ? ", fitted with one exponent" : ", each fitted with its own exponent";
}

function rangeText(
  [from, to]: readonly [number, number],
  { align }: Comparison,
  [view]: readonly CaseView[],
): string {
  const unit = align === "x0" && view && view.length !== null ? view.symbol : "";
  return `${formatPosition(from)} to ${withUnit(formatPosition(to), unit)}`;
}

function verdictRows({ verdict, p_equivalent, p_different }: ComparedRatio): (SettingRow | null)[] {
  const p = (value: number) => `p ${value < 0.001 ? "" : "= "}${formatProbability(value)}`;
  return [
    verdict === null ? null : ["verdict", `${verdict}, by the 90\u202f% interval of the ratio`],
    p_equivalent === null ? null : ["tested equivalent", `${p(p_equivalent)}, Holm over the quantities`],
    p_different === null ? null : ["tested different", `${p(p_different)}, Holm over the quantities`],
  ];
}
