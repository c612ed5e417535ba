import { useId, useState } from "react";
import { formatNumber } from "../../figures/formatNumber.ts";
import type { SheetCompare } from "../../sheet/caseSheet.ts";

const [least, most] = [1, 30];
/** How far two cases may differ and still be called equivalent; it counts when the slider is let go. */
export function ToleranceControl({
  settings,
  onChange,
}: {
  settings: SheetCompare;
  onChange: (edit: Partial<SheetCompare>) => void;
}) {
  const id = useId();
  const [moving, move] = useState<number | null>(null);
  const percent = moving ?? Math.round(settings.tolerance * 100);
  const settle = () => {
    if (moving !== null && moving / 100 !== settings.tolerance) onChange({ tolerance: moving / 100 });
    move(null);
  };
  return (
    <>
      <input
        className="range"
        id={id}
        type="range"
        min={least}
        max={most}
        value={percent}
        aria-label="Tolerance, per cent"
        aria-valuetext={`${percent} per cent`}
        onChange={(event) => move(Number(event.target.value))}
        onPointerUp={settle}
        onKeyUp={settle}
        onBlur={settle}
      />
      <p>
        set to{" "}
        <output htmlFor={id} className="strong">
          {formatNumber(percent, 0)}
          {"\u202f"}%
        </output>
      </p>
      <p>
        Two one-sided tests at 5{"\u202f"}% each. <i>Undecided</i> means that the data are too few, not that
        the cases agree.
      </p>
    </>
  );
}
