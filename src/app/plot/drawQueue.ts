type Draw = () => void | Promise<void>;

/** What each element is to show next; a newer drawing replaces one that has not begun. */
const waiting = new Map<Element, Draw>();
let running = false;

/** Draws in the next free animation frame: one figure a frame, so that no frame waits for two. */
export function queueDraw(element: Element, draw: Draw): void {
  waiting.set(element, draw);
  if (running) return;
  running = true;
  requestAnimationFrame(next);
}

export function dropDraw(element: Element): void {
  waiting.delete(element);
}

function next(): void {
  const first = waiting.entries().next().value;
  if (first === undefined) {
    running = false;
    return;
  }
  const [element, draw] = first;
  waiting.delete(element);
  // A drawing reports its own failure; the queue goes on with the next.
  void Promise.resolve(draw()).finally(() => requestAnimationFrame(next));
}
