/**
 * Asks the browser to keep a copy of the page, so that it opens without the network. Pages from disk, and browsers that
 * keep none, do without.
 */
export function keepOffline(): void {
  if (!import.meta.env.PROD || !("serviceWorker" in navigator) || location.protocol === "file:") return;
  // after the page: the copy is of no use to this visit
  window.addEventListener("load", () => {
    navigator.serviceWorker.register("./offline.js").catch(() => {
      // refused, in a private window say: the page works from the network all the same
    });
  });
}
