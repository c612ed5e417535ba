import { caseMark, type MarkerShape } from "../../figures/caseMark.ts";
import { lightTokens } from "../../figures/tokens.ts";

const paths: Readonly<Record<MarkerShape, string>> = {
  circle: "M4.6 0A4.6 4.6 0 1 1 -4.6 0A4.6 4.6 0 1 1 4.6 0Z",
  square: "M-4.2 -4.2H4.2V4.2H-4.2Z",
  "triangle-up": "M0 -4.9L4.7 3.7H-4.7Z",
  diamond: "M0 -5.2L5.2 0L0 5.2L-5.2 0Z",
  "triangle-down": "M0 4.9L4.7 -3.7H-4.7Z",
  cross: "M-1.5 -4.6H1.5V-1.5H4.6V1.5H1.5V4.6H-1.5V1.5H-4.6V-1.5H-1.5Z",
};

/** A case's sign, by marker and colour; with a stretch of its line where there is room. */
export function CaseMark({ mark, line = false }: { mark: number; line?: boolean }) {
  const { marker, dash, open } = caseMark(lightTokens, mark);
  const colour = `var(--case-${(mark % lightTokens.cases.length) + 1})`;
  const width = line ? 28 : 11;
  return (
    <svg
      className="case-mark"
      width={width}
      height="11"
      viewBox={`${-width / 2} -5.5 ${width} 11`}
      aria-hidden="true"
    >
      {line && <path d="M-14 0H14" stroke={colour} strokeWidth="1.6" strokeDasharray={dash.join(" ")} />}
      <path
        d={paths[marker]}
        fill={open ? "var(--paper)" : colour}
        stroke={colour}
        strokeWidth={open ? 1.3 : 0.4}
      />
    </svg>
  );
}
