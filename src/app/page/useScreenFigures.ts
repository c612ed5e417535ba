import { useMemo } from "react";
import { defaultFigureOptions, type FigureOptions } from "../../figures/figureSpec.ts";
import { darkTokens, lightTokens } from "../../figures/tokens.ts";
import type { Held } from "../session/session.ts";
import { screenScale } from "./figureSettings.ts";
import type { Mode } from "./useTheme.ts";
import { useWindowWidth } from "./useWindowWidth.ts";

/** How figures are drawn on this screen: a new value only when one of its grounds changes. */
export function useScreenFigures(held: Held | null, mode: Mode, narrow: boolean): FigureOptions {
  const width = useWindowWidth();
  const workspace = held?.history.present;
  const sheet = workspace?.cases[0]?.sheet;
  const axis = workspace?.axis ?? "x";
  const units = sheet?.units ?? "SI";
  const along = sheet?.along ?? "x";
  const tolerance = sheet?.compare.tolerance ?? defaultFigureOptions.tolerance;
  // a wide screen has one scale whatever its width
  const room = narrow ? width : 0;
  return useMemo(
    () => ({
      ...defaultFigureOptions,
      ...screenScale(room, narrow),
      tokens: mode === "dark" ? darkTokens : lightTokens,
      axis,
      units,
      along,
      tolerance,
    }),
    [room, narrow, mode, axis, units, along, tolerance],
  );
}
