import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { BodySection } from "../../../src/app/sections/BodySection.tsx";
import { DefinitionPanel } from "../../../src/app/sections/DefinitionPanel.tsx";
import { NarrowingFold } from "../../../src/app/sections/NarrowingFold.tsx";
import type { CaseView } from "../../../src/app/session/caseView.ts";
import type { SheetBody } from "../../../src/sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../../src/sheet/workspace.ts";
import { arguedCase } from "../../support/arguedCase.ts";
import { sheet, viewOf, workspaceCase } from "../fixtures.ts";

const standing: SheetBody = { x: 0.9, chord: 0.02, Tu: 0.025, L11: 1.2 };

function caseWith(body: SheetBody | null, name = "screen"): CaseView {
  const { stations, decay } = arguedCase({ name, settings: { body } });
  const of = { ...workspaceCase, id: name, sheet: { ...sheet, case: name, body } };
  return viewOf(stations, { id: name, name, of, decay });
}

function shown(cases: readonly CaseView[]) {
  const onChange = vi.fn<(change: WorkspaceChange) => void>();
  render(
    <DefinitionPanel cases={cases} comparisons={[]}>
      <BodySection cases={cases} late={false} onChange={onChange} />
    </DefinitionPanel>,
  );
  return onChange;
}
const table = (name: string) => within(screen.getByRole("region", { name }));
const rowOf = (name: string, row: RegExp) => table(name).getByRole("row", { name: row });

describe("the section at the body", () => {
  it("says what to set where no body stands, and offers the last station to all cases", () => {
    const onChange = shown([caseWith(null), caseWith(null, "simulation")]);
    expect(document.querySelector(".finding")?.textContent).toMatch(
      /^No body is placed: type where it stands/,
    );
    fireEvent.click(screen.getByRole("button", { name: /^Place it at 2.00/ }));
    expect(onChange).toHaveBeenCalledWith({ kind: "set-body", caseId: null, body: { x: 2 } });
    fireEvent.change(screen.getByLabelText("position (m)"), { target: { value: "0,9" } });
    fireEvent.blur(screen.getByLabelText("position (m)"));
    expect(onChange).toHaveBeenLastCalledWith({ kind: "set-body", caseId: null, body: { x: 0.9 } });
  });
  it("gives what the law has there: intensity, length in chords, and how both change over the chord", () => {
    shown([caseWith(standing)]);
    // √(2 A/3) ((x − x0)/M)^(−n/2) at 0.9 m, and 5 mm ((x − x0)/M)^0.375 over 20 mm
    expect(rowOf("At the body", /^Tu .*\(%\)/).textContent).toContain("2.249");
    expect(rowOf("At the body", /^L 11 \/ c/).textContent).toContain("0.928");
    const change = table("At the body").getAllByRole("row", { name: /^Tu/ })[1];
    // (0.845/0.825)^(−0.625) − 1
    expect(change.textContent).toMatch(/−1\.48/);
  });
  it("gives where each target is met, or why none is, and marks the inflow as extrapolated", () => {
    shown([caseWith({ ...standing, Tu: 0.001 })]);
    const rows = table("Targets at the body").getAllByRole("row", { name: /^is met at/ });
    expect(rows[0].textContent).toMatch(/the intensity is .* times the target at the last station still/);
    expect(rows[1].textContent).toContain("1.71");
    expect(rowOf("Targets at the body", /needed at the first station/).textContent).toContain("extrapolated");
  });
  it("has the definition of every number one click away, with the place it is for", () => {
    shown([caseWith(standing)]);
    const [number] = within(rowOf("At the body", /^Tu .*\(%\)/)).getAllByRole("button", { name: /2\.249/ });
    fireEvent.click(number);
    const panel = screen.getByRole("dialog", { hidden: true });
    expect(panel.textContent).toContain("turbulence intensity");
    expect(panel.textContent).toContain("by the fitted law");
    expect(panel.textContent).toMatch(/body0\.90\sm/);
    const numbers = [...document.querySelectorAll("td[title]")];
    expect(numbers.every((cell) => cell.querySelector("button.number") || cell.className === "pm")).toBe(
      true,
    );
  });
  it("takes targets in per cent and in chords, for all cases at once or for each its own", () => {
    const onChange = shown([caseWith(standing), caseWith(standing, "simulation")]);
    fireEvent.click(screen.getByRole("button", { name: "Change" }));
    const type = (field: HTMLElement, value: string) => {
      fireEvent.change(field, { target: { value } });
      fireEvent.blur(field);
    };
    type(screen.getByLabelText("target Tu (%)"), "2.2");
    expect(onChange).toHaveBeenLastCalledWith({ kind: "set-body", caseId: null, body: { Tu: 0.022 } });
    fireEvent.click(screen.getByRole("button", { name: "Each case its own" }));
    type(screen.getAllByLabelText("target L11/c")[1], "1.5");
    expect(onChange).toHaveBeenLastCalledWith({ kind: "set-body", caseId: "simulation", body: { L11: 1.5 } });
    type(screen.getAllByLabelText("position (m)")[0], "");
    expect(onChange).toHaveBeenLastCalledWith({ kind: "set-body", caseId: "screen", body: null });
  });
  it("says that loads and transition are judged elsewhere", () => {
    shown([caseWith(standing)]);
    expect(document.querySelector(".small-print")?.textContent).toContain("licensed practice");
  });
});

/** happy-dom opens no fold by a click on its summary. */
function open(name: RegExp) {
  const fold = screen.getByText(name).closest("details");
  if (!fold) throw new Error("no fold");
  fold.open = true;
  fireEvent(fold, new Event("toggle"));
}

describe("the fold of development", () => {
  it("counts every place in x, in meshes and in integral scales at the inflow, in both readings", () => {
    const view = caseWith(null);
    shown([view]);
    open(/^Development length$/);
    const cells = rowOf("Development length by criterion", /^the window of the law/).querySelectorAll("td");
    const texts = [...cells].map(({ textContent }) => textContent);
    // all 14 stations are the window: it begins at 0.2 m, 8 M, with L11 = 5 mm · 5^0.375 there
    expect(texts.slice(0, 4)).toEqual(["0.20", "–", "8.00", (0.2 / (0.005 * 5 ** 0.375)).toPrecision(3)]);
    expect(texts.slice(4)).toEqual(texts.slice(0, 4));
  });
  it("takes the tolerance for all cases", () => {
    const onChange = shown([caseWith(null)]);
    open(/^Development length$/);
    fireEvent.change(screen.getByLabelText("within (%)"), { target: { value: "5" } });
    fireEvent.blur(screen.getByLabelText("within (%)"));
    expect(onChange).toHaveBeenCalledWith({
      kind: "edit-every-sheet",
      edit: { development: { tolerance: 0.05 } },
    });
  });
});

describe("the fold of what would narrow the intervals", () => {
  it("marks the ruler while it is open, and gives the gains that the covariance of each plan has", () => {
    const view = caseWith(null);
    const onMarks = vi.fn();
    const { unmount } = render(<NarrowingFold cases={[view]} onMarks={onMarks} />);
    expect(onMarks).not.toHaveBeenCalled();
    open(/^What would narrow/);
    expect(onMarks).toHaveBeenLastCalledWith(true);
    const best = view.decay?.argument?.narrowing.find(({ kind }) => kind === "station");
    const [row] = table("What would narrow the intervals").getAllByRole("row", { name: /^one more station/ });
    expect(row.textContent).toContain(`${Math.round(100 * (1 - (best?.n ?? 1)))}\u202f%`);
    unmount();
    expect(onMarks).toHaveBeenLastCalledWith(false);
  });
});
