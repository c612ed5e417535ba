import { useCallback } from "react";
import { developmentSentences } from "../../export/sentences/developmentSentences.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { developmentFigure } from "../../figures/developmentFigure.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { DevelopmentTable } from "./DevelopmentTable.tsx";
import { DrawnFold } from "./DrawnFold.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { NumberField } from "./NumberField.tsx";
import { SaidSentences } from "./SaidSentences.tsx";

/** From where on the flow has developed, each criterion by itself, at a tolerance that can be set. */
export function DevelopmentFold({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const argued = cases.filter((view) => arguedOf(view) !== null);
  if (argued.length === 0) return null;
  const { tolerance } = cases[0].of.sheet.development;
  const percent = Number((100 * tolerance).toPrecision(12));
  return (
    <DrawnFold name="Development length" fact={`each criterion by itself, within ${percent}\u202f%`}>
      {() => (
        <>
          <SaidSentences sentences={developmentSentences(argued)} />
          <div className="fields development-fields">
            <NumberField
              label="within"
              unit="%"
              above={0}
              value={percent}
              onChange={(typed) =>
                onChange({
                  kind: "edit-every-sheet",
                  edit: { development: { tolerance: Number(((typed ?? 10) / 100).toPrecision(12)) } },
                })
              }
            />
          </div>
          <Drawn cases={argued} />
          <DevelopmentTable cases={argued} />
        </>
      )}
    </DrawnFold>
  );
}

function Drawn({ cases }: { cases: readonly CaseView[] }) {
  // the list is made anew with every rendering, its cases are not
  // biome-ignore lint/correctness/useExhaustiveDependencies: the cases themselves are what the drawing follows from
  const build = useCallback((options: FigureOptions) => developmentFigure(cases, options), [...cases]);
  return (
    <FigureBlock
      name={figureName("body", true)}
      title="From where on each criterion of a developed flow holds"
      widthMm={178}
      build={build}
      caption={caption}
    />
  );
}

const caption = (
  <>
    From where on each criterion holds for good. Open: no interval contradicts it. Filled: every interval lies
    inside. Thin lines above and below: 95 % of those places, by drawing the stations anew; to the edge: or
    never.
  </>
);
