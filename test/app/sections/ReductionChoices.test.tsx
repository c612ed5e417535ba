import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { ReductionChoices } from "../../../src/app/sections/ReductionChoices.tsx";
import type { CaseView } from "../../../src/app/session/caseView.ts";
import type { CaseSheet } from "../../../src/sheet/caseSheet.ts";
import { sheet, stationAt, viewOf, workspaceCase } from "../fixtures.ts";

const startUp = { code: "start-up" as const, text: "The record begins in a transient.", value: 0.3456 };

function viewWith(id: string, change: Partial<CaseSheet>, flags = [] as (typeof startUp)[]): CaseView {
  return viewOf([stationAt(0.3), stationAt(0.4, { flags })], {
    ...{ id, name: id },
    of: { ...workspaceCase, id, sheet: { ...sheet, case: id, ...change } },
  });
}

const screenCase = viewWith("screen", {});
const les = viewWith("les", { kind: "les", startup: 0.2 }, [startUp]);
const profile = viewWith("profile", { layout: "profile" });

function opened(cases: readonly CaseView[]) {
  const heard = vi.fn();
  render(<ReductionChoices cases={cases} onChange={heard} />);
  fireEvent.click(screen.getByRole("button", { name: "Change" }));
  return heard;
}
const chooseIn = (label: RegExp | string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });

describe("the choices of the reduction", () => {
  it("stand as a small list, one word where the cases agree and one each where they differ", () => {
    render(<ReductionChoices cases={[screenCase, les]} onChange={() => {}} />);
    const text = document.querySelector("dl")?.textContent ?? "";
    expect(text).toContain("not said, LES");
    expect(text).toContain("correlationbiased");
    expect(text).toContain("none left out, 0.200\u202fs left out");
  });

  it("made for every case are one change of all of them", () => {
    const heard = opened([screenCase, les]);
    chooseIn(/integral scale/, "model");
    expect(heard.mock.calls).toEqual([
      [{ kind: "set-reduction", caseId: null, edit: { reduce: { integralScale: "model" } } }],
    ]);
  });

  it("made for one case leave the other alone", () => {
    const heard = opened([screenCase, les]);
    chooseIn("change it in", "les");
    chooseIn("samples in a segment", "2^12");
    expect(heard).toHaveBeenCalledWith({
      ...{ kind: "set-reduction", caseId: "les" },
      edit: { reduce: { segment: 4096 } },
    });
  });

  it("say that the cases differ, and offer no such answer", () => {
    opened([screenCase, les]);
    const field = screen.getByLabelText<HTMLSelectElement>("kind of data");
    expect(field.selectedOptions[0].textContent).toBe("they differ");
    expect(field.selectedOptions[0].disabled).toBe(true);
    expect(screen.getByLabelText<HTMLInputElement>(/left out at the start/).placeholder).toBe("they differ");
  });

  it("offer the start-up that was found by one click, counted from the record's own beginning", () => {
    const heard = opened([les]);
    // 0.2 s are left out already, 0.3456 s more are needed; three digits, never less
    fireEvent.click(screen.getByRole("button", { name: /^Leave out/ }));
    expect(heard).toHaveBeenCalledWith({ kind: "set-reduction", caseId: "les", edit: { startup: 0.546 } });
  });

  it("of a profile are those that a profile has", () => {
    opened([profile]);
    expect(screen.queryByLabelText("correlation")).toBeNull();
    expect(screen.queryByLabelText(/left out at the start/)).toBeNull();
    expect(within(document.body).getByLabelText(/dissipation/)).toBeDefined();
  });

  it("refuse a sensor of no length, and say what is needed", () => {
    const heard = opened([screenCase]);
    const field = screen.getByLabelText(/length of the sensor/);
    fireEvent.change(field, { target: { value: "0" } });
    fireEvent.blur(field);
    expect(heard).not.toHaveBeenCalled();
    expect(screen.getByRole("alert").textContent).toBe("A number above zero is needed.");
  });

  it("refuse to leave out less than nothing", () => {
    const heard = opened([screenCase]);
    const field = screen.getByLabelText(/left out at the start/);
    fireEvent.change(field, { target: { value: "-1" } });
    fireEvent.blur(field);
    expect(heard).not.toHaveBeenCalled();
    expect(screen.getByRole("alert").textContent).toBe("Zero or a number above it is needed.");
  });
});
