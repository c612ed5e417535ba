type Plotly = typeof import("plotly.js");

let loading: Promise<Plotly> | null = null;

/** The drawing library, fetched when the first figure asks for it: the page's one import of it. */
export function loadPlotly(): Promise<Plotly> {
  loading ??= import("plotly.js")
    .then((module) => ("default" in module ? (module.default as Plotly) : module))
    .catch((failure: unknown) => {
      // A chunk that failed to load may load at the next figure.
      loading = null;
      throw failure;
    });
  return loading;
}
