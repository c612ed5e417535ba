import { rulerScale } from "./rulerScale.ts";
import { ScaleEdge } from "./ScaleEdge.tsx";

/** The ruler before anything is loaded: two grey bands and a scale without numbers. */
export function BlankRuler({ width }: { width: number }) {
  const scale = rulerScale([], "x", width);
  return (
    <>
      <svg className="ruler-blank" width={width} height={88} aria-hidden="true" focusable="false">
        <path className="band" d={waning(width * 0.157, width * 0.986, 22)} />
        <line x1={0} x2={width} y1={44} y2={44} />
        <path className="band" d={waning(width * 0.09, width * 0.986, 66)} />
      </svg>
      <ScaleEdge scale={scale} blank />
    </>
  );
}

/** A band as wide as (1 + 9 s)^-0.65 along its length s: a decay without numbers. */
function waning(from: number, to: number, middle: number): string {
  const points = Array.from({ length: 41 }, (_, i) => {
    const s = i / 40;
    return [from + (to - from) * s, 16.5 * (1 + 9 * s) ** -0.75] as const;
  });
  const side = (sign: number) =>
    points.map(([px, half]) => `${px.toFixed(1)} ${(middle + sign * half).toFixed(2)}`);
  return `M${side(-1).join("L")}L${side(1).reverse().join("L")}Z`;
}
