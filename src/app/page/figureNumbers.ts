/** Numbers of the figures in the order of the page. */
export const figureNumbers = {
  decay: 1,
  window: 2,
  isotropy: 3,
  scales: 4,
  spectra: 5,
  balance: 6,
  ratios: 7,
  body: 8,
} as const;

/** "Figure 3"; "Figure 3 (continued)" for what stands in a fold under it. */
export function figureName(of: keyof typeof figureNumbers, continued = false): string {
  return `Figure ${figureNumbers[of]}${continued ? " (continued)" : ""}`;
}
