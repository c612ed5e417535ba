import { labelOf } from "../../core/catalogue.ts";
import type { Comparison } from "../../core/comparison.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, formatProbability, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { ComparedNumber } from "./ComparedNumber.tsx";
import { comparedPlaceText } from "./comparedPlaceText.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Every two stations whose spectra are held against each other: how far apart, and how far by chance. */
export function SpectrumPairTable({
  cases,
  comparison,
}: {
  cases: readonly CaseView[];
  comparison: Comparison;
}) {
  const { spectra } = comparison;
  if (spectra.why !== null)
    return (
      <p>
        <RichText text={`${spectra.why}.`} />
      </p>
    );
  const views = comparison.cases.map((name) => cases.find((view) => view.name === name));
  const byOrigin = { align: "x0", cases: comparison.cases } as const;
  const number = (of: string, value: number, text: string) => (
    <ComparedNumber of={of} value={value} text={text} cases={cases} comparison={comparison} />
  );
  return (
    <TableScroll label={`Spectra of ${comparison.cases.join(" and ")}`}>
      <table className="data dense">
        <thead>
          <tr>
            {views.map((view, side) => (
              <th scope="colgroup" colSpan={2} key={comparison.cases[side]}>
                {view && <CaseMark mark={view.mark} />} {comparison.cases[side]}
              </th>
            ))}
            <th scope="col">
              <Definition of="k1_eta">
                <SymbolText runs={labelOf("k1_eta").symbol} />
              </Definition>
            </th>
            <th scope="col">
              <Definition of="spectral_distance">
                <SymbolText runs={labelOf("spectral_distance").symbol} />
              </Definition>
            </th>
            <th scope="col">
              <Definition of="spectral_chance">by chance</Definition>
            </th>
            <th scope="col">95{"\u202f"}% below</th>
            <th scope="col">
              <i>p</i>
            </th>
          </tr>
        </thead>
        <tbody>
          {spectra.pairs.map(({ x, xi, range, distance, chance, chance_95, p }) => (
            <tr key={x.join(" ")}>
              {views.flatMap((view, side) => [
                <td key={`${comparison.cases[side]} x`}>{placeOf(view, x[side])}</td>,
                <td className="pm" key={`${comparison.cases[side]} xi`}>
                  {comparedPlaceText(xi[side], byOrigin, cases)}
                </td>,
              ])}
              <td>
                {formatDigits(range[0], 2)} to {formatDigits(range[1], 2)}
              </td>
              <td>
                <NumberButton of="spectral_distance" quantity={distance}>
                  {distance.value === null ? "–" : formatDigits(distance.value, 2)}
                </NumberButton>
              </td>
              <td>{number("spectral_chance", chance, formatDigits(chance, 2))}</td>
              <td>{number("spectral_chance", chance_95, formatDigits(chance_95, 2))}</td>
              <td>{number("p", p, formatProbability(p))}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

function placeOf(view: CaseView | undefined, x: number): string {
  return withUnit(formatPosition(x), unitOf(view?.along === "t" ? "T" : "L", view?.units ?? "SI"));
}
