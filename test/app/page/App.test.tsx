import { act, fireEvent, render, screen } from "@testing-library/react";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { App } from "../../../src/app/App.tsx";
import { fitKey } from "../../../src/app/session/caseViews.ts";
import { createPageStore } from "../../../src/app/session/pageStore.ts";
import type { PageWork } from "../../../src/app/session/pageWork.ts";
import { decaySettings } from "../../../src/sheet/decaySettings.ts";
import { decayOf, sheet, stationAt, workspaceCase } from "../fixtures.ts";

const work: PageWork = { drop: vi.fn(async () => {}), cancel: vi.fn(), resume: vi.fn(), close: vi.fn() };

beforeEach(() => {
  localStorage.clear();
  document.documentElement.removeAttribute("data-theme");
});

/** A page with one case, reduced and argued. */
function loadedPage() {
  const store = createPageStore();
  const stations = [0.2, 0.3, 0.4, 0.8, 1.6].map((x) => stationAt(x));
  const reduced = { key: "k", stations, sources: [], flags: [], failures: [], complete: true };
  const work = { key: "k", files: 1, filesDone: 0, bytes: 1, bytesDone: 0 };
  const { dispatch } = store.getState();
  const { mark: _, ...added } = workspaceCase;
  dispatch({ kind: "offered", files: 1, bytes: 1 });
  dispatch({
    kind: "planned",
    plan: { cases: [added], files: [], previews: [], aside: { leftOut: [], failures: [], warnings: [] } },
  });
  dispatch({ kind: "started", caseId: "case-1", work });
  dispatch({ kind: "reduced", caseId: "case-1", reduced });
  dispatch({
    kind: "argued",
    argued: {
      key: "a",
      keys: { "case-1": fitKey(reduced, decaySettings(sheet)) },
      cases: { "case-1": { stations, decay: decayOf(stations) } },
      comparisons: [],
    },
  });
  return store;
}

/** The argument is a part of its own, fetched when it is first needed. */
async function open(store: ReturnType<typeof createPageStore>): Promise<void> {
  render(<App store={store} work={work} />);
  await vi.waitFor(() => expect(document.querySelector("#decay")).not.toBeNull(), { timeout: 10_000 });
}

describe("the page", () => {
  it("opens empty: what to drop, and the demo one click away", () => {
    render(<App store={createPageStore()} work={work} />);
    expect(screen.getByRole("heading", { level: 1 }).textContent).toMatch(/^Drop the velocity records/);
    expect(screen.getByRole("button", { name: "Open the demo" })).toBeDefined();
  });

  it("states the law of a loaded case in a sentence with its interval", async () => {
    await open(loadedPage());
    const finding = document.querySelector("#decay .finding")?.textContent;
    expect(finding).toContain("n = 1.25");
    expect(finding).toContain("(1.20 to 1.31)");
  });

  it("opens every section of the argument, in its order, under a heading", async () => {
    await open(loadedPage());
    const headings = screen.getAllByRole("heading", { level: 2 }).map(({ textContent }) => textContent);
    expect(headings).toEqual([
      "1Records",
      "2Intensity and decay",
      "3Isotropy",
      "4Length scales",
      "5Spectra and correlations",
      "6Dissipation balance",
      "7Side by side",
      "8At the body",
      "9Table and export",
    ]);
  });

  it("takes a change back with Control Z and makes it again with Shift", async () => {
    const store = loadedPage();
    await open(store);
    const title = () => screen.getByRole("heading", { level: 1 }).textContent;
    act(() =>
      store.getState().dispatch({ kind: "changed", change: { kind: "set-title", title: "Two inflows" } }),
    );
    expect(title()).toBe("Two inflows");
    fireEvent.keyDown(window, { key: "z", ctrlKey: true });
    expect(title()).toBe("Decay along the stream: screen");
    fireEvent.keyDown(window, { key: "Z", ctrlKey: true, shiftKey: true });
    expect(title()).toBe("Two inflows");
  });

  it("moves the body by the arrow keys as one change when the key is let go, and takes it back", async () => {
    const store = loadedPage();
    store
      .getState()
      .dispatch({ kind: "changed", change: { kind: "set-body", caseId: null, body: { x: 0.9 } } });
    await open(store);
    const placed = () => {
      const { session } = store.getState();
      return session.kind === "ready" ? session.held.history.present.cases[0].sheet.body?.x : null;
    };
    const body = screen.getByRole("slider", { name: "Body" });
    body.focus();
    fireEvent.keyDown(body, { key: "ArrowRight" });
    fireEvent.keyDown(body, { key: "ArrowRight" });
    expect(placed()).toBe(0.9);
    expect(Number(body.getAttribute("aria-valuenow"))).toBeGreaterThan(0.9);
    fireEvent.keyUp(body, { key: "ArrowRight" });
    expect(placed()).toBe(Number(body.getAttribute("aria-valuenow")));
    fireEvent.keyDown(window, { key: "z", ctrlKey: true });
    expect(placed()).toBe(0.9);
  });

  it("turns dark when asked to, and keeps the choice for the next visit", () => {
    render(<App store={createPageStore()} work={work} />);
    fireEvent.click(screen.getByRole("button", { name: "Dark" }));
    expect(document.documentElement.dataset.theme).toBe("dark");
    expect(localStorage.getItem("waneline-mode")).toBe("dark");
  });

  it("asks a case without a sheet for its viscosity, and enters the answer into its sheet", async () => {
    const store = loadedPage();
    const { dispatch } = store.getState();
    dispatch({
      kind: "changed",
      change: { kind: "edit-sheet", caseId: "case-1", edit: { kinematicViscosity: null } },
    });
    await open(store);
    const field = screen.getByLabelText(/kinematic viscosity/);
    fireEvent.change(field, { target: { value: "1.5e-5" } });
    fireEvent.blur(field);
    const { session } = store.getState();
    if (session.kind !== "ready") throw new Error(`session is ${session.kind}`);
    expect(session.held.history.present.cases[0].sheet.kinematicViscosity).toBe(1.5e-5);
  });
});
