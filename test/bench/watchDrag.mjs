/**
 * Runs inside the page. From now on `window.dragSeen` collects, in milliseconds since the pointer event that caused
 * them, the changes of the readings in the head and of the finding sentence (`readings`) and the redraws of the
 * section's figure (`figure`): a drawing counts once, from the hand's last move that changed a reading before it
 * to the frame in which it stands.
 */
export function watchDrag(section) {
  const seen = { readings: [], figure: [] };
  window.dragSeen = seen;
  let moved = 0; // the newest pointer event
  let owed = 0; // the pointer event whose readings are shown, and whose figure is still to come
  addEventListener("pointermove", () => (moved = performance.now()), { capture: true });
  const texts = new MutationObserver((changes) => {
    if (moved === 0 || !changes.some((change) => change.target.nodeType === Node.TEXT_NODE)) return;
    seen.readings.push(performance.now() - moved);
    if (owed === 0) owed = moved;
  });
  const deep = { subtree: true, characterData: true };
  texts.observe(document.querySelector("header"), deep);
  texts.observe(document.querySelector("#decay .finding"), deep);
  let framed = false;
  const drawings = new MutationObserver(() => {
    if (owed === 0 || framed) return;
    framed = true;
    const cause = owed;
    owed = 0;
    requestAnimationFrame(() => {
      seen.figure.push(performance.now() - cause);
      framed = false;
    });
  });
  drawings.observe(document.querySelector(`#${section} .plot`), {
    subtree: true,
    childList: true,
    attributes: true,
  });
}
