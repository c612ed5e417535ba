import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { CompareChoices } from "../../../src/app/sections/CompareChoices.tsx";
import { CompareFolds } from "../../../src/app/sections/CompareFolds.tsx";
import { DefinitionPanel } from "../../../src/app/sections/DefinitionPanel.tsx";
import { Finding } from "../../../src/app/sections/Finding.tsx";
import { compareSentences } from "../../../src/export/sentences/compareSentences.ts";
import type { SheetCompare } from "../../../src/sheet/caseSheet.ts";
import { madeComparison } from "../../figures/madeComparison.ts";
import { sheet, stationAt, viewOf } from "../fixtures.ts";

const stations = [0.2, 0.3, 0.4].map((x) => stationAt(x));
const cases = [
  viewOf(stations),
  viewOf(stations, { id: "case-2", name: "simulation", mark: 1 }),
  viewOf(stations, { id: "case-3", name: "grid", mark: 2 }),
];
const panel = () => screen.getByRole("dialog", { hidden: true });
const sentences = compareSentences(madeComparison, [cases[0], cases[1]]);

function shown(comparisons = [madeComparison]) {
  render(
    <DefinitionPanel cases={cases} comparisons={comparisons}>
      <Finding sentences={sentences} />
      <CompareFolds cases={cases} comparisons={comparisons} sentences={[sentences]} />
    </DefinitionPanel>,
  );
}
const table = (label: string) => screen.getByRole("region", { name: label, hidden: true });

describe("the numbers of a comparison", () => {
  it("each open their definition, with both cases and how they are aligned", () => {
    shown();
    for (const label of ["Ratios", "Origins and exponents", "Spectra of screen and simulation"]) {
      const numbers = [...table(label).querySelectorAll<HTMLElement>("button.number")];
      expect(numbers.length, label).toBeGreaterThan(4);
      for (const number of numbers) {
        fireEvent.click(number);
        expect(panel().textContent, number.textContent ?? "").toContain("simulation against screen");
        expect(panel().textContent).toContain("aligned");
      }
    }
  });
  it("have no number in their cells that opens nothing", () => {
    shown();
    for (const label of ["Ratios", "Origins and exponents"]) {
      const bare = [...table(label).querySelectorAll("tbody td:not(.pm):not(.why)")].filter(
        (cell) => /\d/.test(cell.textContent ?? "") && cell.querySelector("button") === null,
      );
      expect(bare.map((cell) => cell.textContent)).toEqual([]);
    }
  });
  it("in the sentences open theirs too: the shift is signed though its words are not", () => {
    shown();
    const finding = document.querySelector<HTMLElement>(".finding");
    if (!finding) throw new Error("no finding");
    const [needed] = within(finding).getAllByRole("button", { name: /6\.1/ });
    fireEvent.click(needed);
    expect(panel().textContent).toContain("shift of the origin");
    expect(panel().textContent).toContain("simulation against screen");
  });
});

describe("the fold of the origins", () => {
  it("shows both ways of fitting, and says which was used", () => {
    shown();
    const rows = within(table("Origins and exponents")).getAllByRole("row", { hidden: true });
    const texts = rows.map((row) => row.textContent ?? "");
    expect(texts.filter((text) => text.includes("own exponent"))).toHaveLength(2);
    expect(texts.filter((text) => text.includes("one exponent, used"))).toHaveLength(2);
    expect(screen.getByText(/one exponent for screen, simulation/).nextElementSibling?.textContent).toMatch(
      /1\.26, not excluded by chi-square, p 0\.81; AICc 31\.0+ against 34\.0+ with one each/,
    );
  });
});

describe("the choices of a comparison", () => {
  function choices(settings: SheetCompare = sheet.compare) {
    const edits: Partial<SheetCompare>[] = [];
    render(<CompareChoices cases={cases} settings={settings} onChange={(edit) => edits.push(edit)} />);
    fireEvent.click(screen.getByRole("button", { name: "Change" }));
    return edits;
  }
  it("let any case be the one that the others are held against", () => {
    const edits = choices();
    fireEvent.change(screen.getByLabelText("held against"), { target: { value: "case-3" } });
    expect(edits).toEqual([{ against: "grid" }]);
  });
  it("hold the exponents, the alignment and the place of equal Tu", () => {
    const edits = choices();
    fireEvent.change(screen.getByLabelText("exponent"), { target: { value: "own" } });
    fireEvent.change(screen.getByLabelText("at equal"), { target: { value: "Tu" } });
    const place = screen.getByLabelText(/equal Tu at/);
    fireEvent.change(place, { target: { value: "0.35" } });
    fireEvent.blur(place);
    expect(edits).toEqual([{ exponent: "own" }, { align: "Tu" }, { at: 0.35 }]);
  });
  it("keep one quantity at least that has to agree", () => {
    const edits = choices({ ...sheet.compare, quantities: ["Tu"] });
    const [Tu, L11] = screen.getAllByRole<HTMLInputElement>("checkbox");
    expect(Tu.disabled).toBe(true);
    fireEvent.click(L11);
    expect(edits).toEqual([{ quantities: ["Tu", "L11"] }]);
  });
  it("name the first case where the one that was chosen is gone", () => {
    render(
      <CompareChoices cases={cases} settings={{ ...sheet.compare, against: "gone" }} onChange={() => {}} />,
    );
    expect(screen.getByText("held against").nextElementSibling?.textContent).toBe("screen");
  });
});
