import { useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { unitOf } from "../../core/unitText.ts";
import { targetText } from "../../export/sentences/bodySentences.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { SheetBody } from "../../sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { BodyFields } from "./BodyFields.tsx";
import { SentenceText } from "./SentenceText.tsx";
import { SymbolText } from "./SymbolText.tsx";

/** The body and its targets as a small list; Change opens the fields in its place. */
export function BodyChoices({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const [open, setOpen] = useState(false);
  return (
    <>
      {open ? <BodyFields cases={cases} onChange={onChange} /> : <BodyList cases={cases} />}
      <p className="note-actions">
        <button type="button" className="action" onClick={() => setOpen(!open)}>
          {open ? "Close" : "Change"}
        </button>{" "}
        <button
          type="button"
          className="action"
          onClick={() => onChange({ kind: "set-body", caseId: null, body: null })}
        >
          Take it away
        </button>
      </p>
    </>
  );
}

function BodyList({ cases }: { cases: readonly CaseView[] }) {
  const { units, along } = cases[0];
  const length = unitOf("L", units);
  /** One text where the cases agree, else one for each. */
  const said = (of: (body: SheetBody | null) => string) =>
    [...new Set(cases.map((view) => of(view.of.sheet.body)))].join(", ");
  const wanted = (key: "Tu" | "L11_chord") => {
    const numbers = cases.map(({ of: { sheet } }) => (key === "Tu" ? sheet.body?.Tu : sheet.body?.L11));
    return [...new Set(numbers)].flatMap((target) => (target == null ? [] : [target]));
  };
  const targets = (["Tu", "L11_chord"] as const).flatMap((key) =>
    wanted(key).map((target) => targetText(key, target)),
  );
  return (
    <dl className="choice-list">
      <dt>{along === "t" ? "time" : "position"}</dt>
      <dd>
        {said((body) =>
          body === null
            ? "nowhere"
            : withUnit(formatPosition(body.x), unitOf(along === "t" ? "T" : "L", units)),
        )}
      </dd>
      <dt>
        chord <SymbolText runs={labelOf("chord").symbol} />
      </dt>
      <dd>
        {said((body) => (body?.chord == null ? "none" : withUnit(formatDigits(body.chord, 3), length)))}
      </dd>
      <dt>targets</dt>
      <dd>
        {targets.length === 0
          ? "none"
          : targets.map((target, i) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: targets have no identity but their place
              <span key={i}>
                {i > 0 && ", "}
                <SentenceText sentence={[target]} />
              </span>
            ))}
      </dd>
    </dl>
  );
}
