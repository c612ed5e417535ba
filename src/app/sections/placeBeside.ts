/** Room between a number and its panel, and between the panel and the window's edge, px. */
const [apart, edge] = [6, 8];

/**
 * Puts a fixed panel under what was pressed, or above it where there is more room; as wide as it likes and the window
 * lets it, and no higher than the room on its side.
 */
export function placeBeside(panel: HTMLElement, pressed: HTMLElement, widthPx = 420): void {
  const box = pressed.getBoundingClientRect();
  const width = Math.min(widthPx, window.innerWidth - 2 * edge);
  const below = window.innerHeight - box.bottom - apart - edge;
  const above = box.top - apart - edge;
  const under = below >= above || below > window.innerHeight / 2;
  panel.style.width = `${width}px`;
  panel.style.left = `${Math.max(edge, Math.min(box.left, window.innerWidth - width - edge))}px`;
  panel.style.top = under ? `${box.bottom + apart}px` : "auto";
  panel.style.bottom = under ? "auto" : `${window.innerHeight - box.top + apart}px`;
  panel.style.maxHeight = `${Math.max(under ? below : above, 120)}px`;
}
