import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { lineMeanings } from "./lineMeaning.ts";
import { RichText } from "./RichText.tsx";

/** What the components of labels are in cases of lateral lines: said once beside the tables that have them. */
export function LinesNote({ cases }: { cases: readonly CaseView[] }) {
  return cases.map((view) => {
    const lines = view.stations.find(({ facts }) => facts.lines !== undefined)?.facts.lines;
    const text = lines === undefined ? null : lineMeanings(lines.along);
    return (
      text !== null && (
        <p className="reason" key={view.id}>
          <CaseMark mark={view.mark} /> {view.name}: <RichText text={text} />.
        </p>
      )
    );
  });
}
