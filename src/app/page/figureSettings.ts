import { createContext, useContext } from "react";
import { defaultFigureOptions, type FigureOptions } from "../../figures/figureSpec.ts";
import { lightTokens } from "../../figures/tokens.ts";

/** How figures are drawn on this screen just now: colours of the mode, scale, axis. */
export const FigureSettings = createContext<FigureOptions>({ ...defaultFigureOptions, tokens: lightTokens });

export function useFigureSettings(): FigureOptions {
  return useContext(FigureSettings);
}

/** Room beside the page's column on a narrow screen, on both sides together, px. */
const margins = 32;

/** 5 px to the mm where the 178 mm column fits; else each panel, 86 mm wide, fills the screen. */
export function screenScale(screenWidth: number, narrow: boolean): { scale: number; stacked: boolean } {
  return narrow
    ? { scale: Math.min(5, (screenWidth - margins) / 86), stacked: true }
    : { scale: 5, stacked: false };
}
