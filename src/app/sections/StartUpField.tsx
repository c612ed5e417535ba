import { unitOf } from "../../core/unitText.ts";
import { formatDigits, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CommonNumber } from "./CommonNumber.tsx";
import { startUpOffer } from "./startUpOffer.ts";

/** Time left out at the start of every record, with what the checks propose one click away. */
export function StartUpField({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (startup: number) => void;
}) {
  const unit = unitOf("T", cases[0].units);
  const offers = cases.flatMap((view) => startUpOffer(view) ?? []);
  // the case that takes longest decides for all that are changed alike
  const time = Math.max(...offers.map((offer) => offer.time), 0);
  return (
    <>
      <CommonNumber
        label="left out at the start"
        unit={unit}
        least={0}
        of={({ startup }) => startup}
        sheets={cases.map((view) => view.of.sheet)}
        onChange={(startup) => onChange(startup ?? 0)}
      />
      {time > 0 && (
        <button type="button" className="action" onClick={() => onChange(time)}>
          Leave out {withUnit(formatDigits(time, 3), unit)}
        </button>
      )}
    </>
  );
}
