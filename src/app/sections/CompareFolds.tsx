import type { Comparison } from "../../core/comparison.ts";
import type { Sentence } from "../../export/sentences/piece.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CompareTable } from "./CompareTable.tsx";
import { comparedPlaceText } from "./comparedPlaceText.ts";
import { Fold } from "./Fold.tsx";
import { ExponentTests, OriginTable } from "./OriginTable.tsx";
import { SentenceText } from "./SentenceText.tsx";
import { SpectrumPairTable } from "./SpectrumPairTable.tsx";
import { StretchTable } from "./StretchTable.tsx";

/** The numbers behind the comparison, each kind in a fold of its own. */
export function CompareFolds({
  cases,
  comparisons,
  sentences,
}: {
  cases: readonly CaseView[];
  comparisons: readonly Comparison[];
  sentences: readonly (readonly Sentence[])[];
}) {
  const several = comparisons.length > 1;
  const [first] = comparisons;
  const titled = (comparison: Comparison) => several && <p className="pair-name">{pairName(comparison)}</p>;
  return (
    <>
      <Fold name="Ratios" fact={several ? `${comparisons.length} pairs` : pairName(first)}>
        {several &&
          comparisons.map((comparison, i) => (
            <p className="pair-words" key={pairName(comparison)}>
              {(sentences[i] ?? []).slice(1).map((sentence, at) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: sentences have no identity but their place
                <span key={at}>
                  <SentenceText sentence={sentence} />{" "}
                </span>
              ))}
            </p>
          ))}
        <CompareTable cases={cases} comparisons={comparisons} />
      </Fold>
      <Fold name="Origins and exponents" fact={exponentFact(first)}>
        <OriginTable cases={cases} comparisons={comparisons} />
        <ExponentTests cases={cases} comparisons={comparisons} />
      </Fold>
      <Fold name="From where on they are equivalent" fact={several ? undefined : beyondFact(first, cases)}>
        <p>
          Stretches of three stations of either case, each tested at 5{"\u202f"}% from the last one upstream
          until one fails: an order fixed beforehand needs no correction for their number, and the quantities
          have to agree all at once.
        </p>
        {comparisons.map((comparison) => (
          <div key={pairName(comparison)}>
            {titled(comparison)}
            <StretchTable cases={cases} comparison={comparison} />
          </div>
        ))}
      </Fold>
      <Fold name="Spectra at equal distance" fact={spectraFact(comparisons)}>
        {comparisons.map((comparison) => (
          <div key={pairName(comparison)}>
            {titled(comparison)}
            <SpectrumPairTable cases={cases} comparison={comparison} />
          </div>
        ))}
      </Fold>
    </>
  );
}

const pairName = ({ cases: [first, second] }: Comparison) => `${second} to ${first}`;

function exponentFact({ aligned_with, align }: Comparison): string {
  if (align === "x") return "not used at equal position";
  return aligned_with === "common n" ? "one exponent used" : "each its own used";
}

function beyondFact(comparison: Comparison, cases: readonly CaseView[]): string {
  const { from } = comparison.equivalent_beyond;
  return from === null ? "not shown" : `from ${comparedPlaceText(from, comparison, cases)}`;
}

function spectraFact(comparisons: readonly Comparison[]): string {
  const pairs = comparisons.flatMap(({ spectra }) => spectra.pairs);
  const far = pairs.filter(({ p }) => p < 0.05).length;
  return pairs.length === 0
    ? "not compared"
    : `${formatNumber(far, 0)} of ${formatNumber(pairs.length, 0)} farther apart than by chance`;
}
