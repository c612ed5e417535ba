import type { CSSProperties } from "react";

/** Style with custom properties, which React passes on but does not type. */
export function withVariables(
  variables: Readonly<Record<`--${string}`, string | number>>,
  style: CSSProperties = {},
): CSSProperties {
  return { ...style, ...variables };
}
