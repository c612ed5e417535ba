import { memo, useCallback } from "react";
import { covarianceIntervals } from "../../core/decay/covarianceIntervals.ts";
import type { Quantity } from "../../core/quantity.ts";
import { type ArguedDecay, arguedOf } from "../../figures/arguedOf.ts";
import type { FigureOptions, FigureTable } from "../../figures/figureSpec.ts";
import { formatCount } from "../../figures/formatNumber.ts";
import { regionFigure } from "../../figures/regionFigure.ts";
import { endsOf } from "../../figures/stationPoints.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { FigureBlock } from "./FigureBlock.tsx";
import { PairCells } from "./PairCells.tsx";
import { PairHeads } from "./PairHeads.tsx";
import { TableSave } from "./TableSave.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** The intervals of n and x0 by every way of making them, and the joint region with all its neighbours. */
export const RegionBody = memo(function RegionBody({ cases }: { cases: readonly CaseView[] }) {
  const build = useCallback((options: FigureOptions) => regionFigure(cases, options), [cases]);
  return (
    <>
      <FigureBlock
        name={figureName("decay", true)}
        title="Joint region by profile, covariance and refits; scatter against the origin"
        widthMm={178}
        build={build}
        caption={caption}
      />
      <TableScroll label="Intervals by every way of making them">
        <table className="data dense" {...cellKeys}>
          <PairHeads view={cases[0]} first="Interval" />
          {cases.map((view) => (
            <tbody key={view.id}>
              <tr>
                <th scope="rowgroup" colSpan={5}>
                  <CaseMark mark={view.mark} /> {view.name}
                </th>
              </tr>
              {waysOf(view).map(({ name, note, n, x0 }) => (
                <tr key={name}>
                  <th scope="row" className="text">
                    {name}
                  </th>
                  <PairCells view={view} n={n} x0={x0} rows={[["interval", note]]} />
                </tr>
              ))}
            </tbody>
          ))}
        </table>
      </TableScroll>
      <TableSave name="intervals" table={() => intervalsTable(cases)} />
    </>
  );
});

const caption = (
  <>
    Joint 68 % and 95 % regions as contours of the profile, filled; thin: the ellipses that the covariance has
    in their place; dots: refits of stations drawn anew, shown and not adopted. Last panel: the classical
    scan, rms of the residuals of ln <i>q</i> about the best line, all stations alike, against the origin it
    is drawn from; marked: the least.
  </>
);

interface Way {
  readonly name: string;
  readonly note: string;
  readonly n: Quantity;
  readonly x0: Quantity;
}

function waysOf(view: CaseView): Way[] {
  const argued = arguedOf(view);
  if (!argued?.decay.law) return [];
  const { decay, argument } = argued;
  const { n, x0, given_window } = decay;
  const united = decay.windowChosen === "auto";
  return [
    { name: "adopted", note: adoptedNote(argued), n, x0 },
    ...(united
      ? [
          {
            name: "profile, given the window",
            note: "profile likelihood in this window alone",
            ...given_window,
          },
        ]
      : []),
    {
      name: "covariance",
      note: "symmetric about the value, from the covariance of the fit",
      ...covarianceIntervals(argued.decay.law),
    },
    ...(argument.bootstrap === null
      ? []
      : [
          {
            name: `${formatCount(argument.bootstrap.refits)} refits`,
            note: refitNote(argument.bootstrap),
            n: argument.bootstrap.n,
            x0: argument.bootstrap.x0,
          },
        ]),
  ];
}

function adoptedNote({ decay }: ArguedDecay): string {
  const blocks =
    decay.together == null ? "" : `, with the drop of ${decay.together.groups} common groups of blocks`;
  return decay.windowChosen === "auto"
    ? `union over later starts of profile intervals${blocks}`
    : `profile likelihood in this window${blocks}`;
}

function refitNote({ refits, withoutLaw }: { readonly refits: number; readonly withoutLaw: number }): string {
  const lost =
    withoutLaw === 0 ? "" : `; ${formatCount(withoutLaw)} of them fell like an exponential and count as open`;
  return `2.5 and 97.5 % points of ${formatCount(refits)} refits of stations drawn anew${lost}`;
}

function intervalsTable(cases: readonly CaseView[]): FigureTable {
  return {
    heading: ["case", "interval", "n", "n_low", "n_high", "x0", "x0_low", "x0_high", "made_by"],
    rows: cases.flatMap((view) =>
      waysOf(view).map(({ name, note, n, x0 }) => {
        const [exponent, origin] = [endsOf(n), endsOf(x0)];
        const numbers = [exponent.value, exponent.low, exponent.high, origin.value, origin.low, origin.high];
        return [view.name, name, ...numbers, note];
      }),
    ),
  };
}
