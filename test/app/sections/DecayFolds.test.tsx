import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { RestedCases } from "../../../src/app/page/restedCases.ts";
import { DecayFolds } from "../../../src/app/sections/DecayFolds.tsx";
import { DefinitionPanel } from "../../../src/app/sections/DefinitionPanel.tsx";
import type { CaseView } from "../../../src/app/session/caseView.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import type { FigureCase } from "../../../src/figures/figureSpec.ts";
import { arguedCases } from "../../support/arguedCases.ts";
import { sheet, viewOf, workspaceCase } from "../fixtures.ts";

/** A view of the page for an argued case. */
function asView(of: FigureCase, change: Partial<CaseView> = {}): CaseView {
  const id = `case-${of.mark + 1}`;
  return viewOf(of.stations, {
    ...{ id, name: of.name, mark: of.mark, decay: of.decay, argued: of.decay },
    of: { ...workspaceCase, id, sheet: { ...sheet, case: of.name } },
    ...change,
  });
}
const both = arguedCases();
const views = both.map((of) => asView(of));
const viewsWith = (change: Partial<DecaySettings>) => arguedCases(change).map((of) => asView(of));

function shown(cases: readonly CaseView[], late = false, onChange = vi.fn()) {
  render(
    <RestedCases value={cases}>
      <DefinitionPanel cases={cases} comparisons={[]}>
        <DecayFolds comparisons={[]} late={late} onChange={onChange} />
      </DefinitionPanel>
    </RestedCases>,
  );
  return onChange;
}

/** Opens the fold of this name and gives its content. */
function opened(name: RegExp): HTMLElement {
  const fold = screen.getByText(name).closest("details");
  if (fold === null) throw new Error("no such fold");
  fold.open = true;
  fireEvent(fold, new Event("toggle"));
  return fold;
}

describe("the folds of the decay", () => {
  it("hold nothing while they are closed", () => {
    shown(views);
    expect(document.querySelectorAll("details.fold").length).toBeGreaterThan(4);
    expect(document.querySelectorAll(".figure-block, table").length).toBe(0);
  });
  it("are absent before anything was argued", () => {
    shown(views.map((view) => ({ ...view, argued: null, decay: null })));
    expect(document.querySelectorAll("details.fold").length).toBe(0);
  });
  it("keep the numbers argued last, marked as busy, while a newer fit waits for its own", () => {
    const waiting = views.map((view) => {
      const { argument: _, ...decay } = view.decay ?? (undefined as never);
      return { ...view, decay };
    });
    shown(waiting, true);
    const fold = opened(/^Routes$/);
    expect(fold.querySelector(".argued")?.getAttribute("aria-busy")).toBe("true");
    expect(within(fold).getAllByRole("row").length).toBeGreaterThan(10);
  });
});

describe("the fold of the window", () => {
  it("holds Figure 2 and, for each case, every condition of physics in both readings", () => {
    shown(views);
    const fold = opened(/^Window$/);
    expect(within(fold).getByRole("figure", { name: /^Figure 2\./ })).toBeDefined();
    const table = within(fold).getByRole("region", { name: "Conditions on the ends of the window" });
    const starts = both[0].decay?.argument?.scan.start.length ?? 0;
    expect(within(table).getAllByText(/^the start: /).length).toBe(2 * starts);
    expect(within(table).getAllByText(/below 25 % of the lateral extent/).length).toBe(2);
  });
});

describe("the fold of the routes", () => {
  it("gives every route of every case a row, its intervals or the reason of a gap", () => {
    shown(viewsWith({ dissipation: "decay" }));
    const fold = opened(/^Routes$/);
    const table = within(fold).getByRole("region", { name: "Exponent and origin by every route" });
    expect(within(table).getAllByRole("rowheader", { name: /joint fit/ })).toHaveLength(2);
    expect(within(table).getAllByText(/1\.\d+ to 1\.\d+/).length).toBeGreaterThan(4);
  });
  it("opens behind a number its route and what it rests on", () => {
    shown(views);
    const fold = opened(/^Routes$/);
    const [row] = within(fold).getAllByRole("row", { name: /scan of x/ });
    fireEvent.click(within(row).getAllByRole("button")[0]);
    const panel = screen.getByRole("dialog", { hidden: true });
    expect(panel.textContent).toContain("scan of x0 for the least scatter");
    expect(panel.textContent).toContain("all stations weigh alike");
  });
  it("is one stop of the Tab key for all its numbers, arrow keys between them", () => {
    shown(views);
    const cells = [...opened(/^Routes$/).querySelectorAll<HTMLElement>("[data-cell]")];
    expect(cells.length).toBeGreaterThan(20);
    expect(cells.filter(({ tabIndex }) => tabIndex === 0)).toHaveLength(1);
    cells[0].focus();
    fireEvent.keyDown(cells[0], { key: "ArrowRight" });
    expect(document.activeElement).toBe(cells[1]);
  });
  it("takes another origin to try, and leaves the fit as it is", () => {
    const change = shown(views);
    const fold = opened(/^Routes$/);
    const field = within(fold).getAllByRole("textbox")[0];
    fireEvent.change(field, { target: { value: "0.05" } });
    fireEvent.keyDown(field, { key: "Enter" });
    expect(change).toHaveBeenCalledWith({
      kind: "edit-sheet",
      caseId: "case-1",
      edit: { fit: { ...sheet.fit, otherX0: 0.05 } },
    });
  });
});

describe("the folds of a decay in time", () => {
  const timed = arguedCases({ along: "t" }).map((of) => asView(of, { along: "t" }));
  it("name the origin t0 and count places in seconds", () => {
    shown(timed);
    expect(opened(/^Routes$/).textContent).toContain("t0 held at zero");
    const table = within(opened(/^Window$/)).getByRole("region", { name: /^Conditions/ });
    expect(table.textContent).toContain("t (s)");
    expect(within(opened(/^Fits$/)).getByRole("row", { name: /^virtual origin t/ })).toBeDefined();
  });
});

describe("the fold of the joint region", () => {
  it("gives the interval by union, profile, covariance and refits, one below the other", () => {
    shown(views);
    const fold = opened(/^Joint region$/);
    const names = within(fold)
      .getAllByRole("rowheader")
      .map((head) => head.textContent);
    expect(names.slice(1, 5)).toEqual([
      "adopted",
      "profile, given the window",
      "covariance",
      "1\u202f000 refits",
    ]);
  });
});

describe("the fold of the fits", () => {
  it("says of each named exponent whether these data exclude it, by which test, and never confirms one", () => {
    shown(views);
    const fold = opened(/^Fits$/);
    const table = within(fold).getByRole("region", { name: "Hypotheses" });
    expect(within(table).getAllByText(/^not excluded \(χ²\)$/).length).toBeGreaterThan(0);
    expect(
      within(table).getAllByText(/^excluded by these data in this window \(χ²\)$/).length,
    ).toBeGreaterThan(0);
    expect(fold.textContent).not.toMatch(/confirm/);
  });
  it("says that F was the test where the scatter alone tells the errors", () => {
    shown(viewsWith({ weights: "equal" }));
    const table = within(opened(/^Fits$/)).getByRole("region", { name: "Hypotheses" });
    expect(within(table).getAllByText(/\(F\)$/).length).toBeGreaterThan(0);
  });
  it("puts the doubt of a short span beside n, with dn/dx0 in figures", () => {
    shown(viewsWith({ window: [0.6, 1.6] }));
    const fold = opened(/^Fits$/);
    const row = within(fold).getByRole("row", { name: /^exponent n/ });
    expect(row.textContent).toMatch(/trade against each other.*n would change by -\d/);
    expect(within(fold).getByRole("row", { name: /^sensitivity/ }).textContent).toMatch(/−0\.\d/);
  });
  it("gives the growth of each scale beside what n implies", () => {
    shown(views);
    const table = within(opened(/^Fits$/)).getByRole("region", { name: "Growth of the scales" });
    expect(within(table).getAllByText("agree").length).toBeGreaterThanOrEqual(5);
  });
});
