import type { Config } from "plotly.js";

/** No tools over a figure, no resizing of its own, and no address that data could be sent to. */
export const plotConfig: Partial<Config> & { showSendToCloud: false } = {
  // no layers for pointers, which a figure does not follow: a redraw costs a third less
  staticPlot: true,
  responsive: false,
  displayModeBar: false,
  displaylogo: false,
  scrollZoom: false,
  doubleClick: false,
  showTips: false,
  showSendToCloud: false,
  plotlyServerURL: "",
};
