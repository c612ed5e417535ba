import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { RestedCases } from "../../../src/app/page/restedCases.ts";
import { ChecksFold } from "../../../src/app/sections/ChecksFold.tsx";
import { DefinitionPanel } from "../../../src/app/sections/DefinitionPanel.tsx";
import { DurationFold } from "../../../src/app/sections/DurationFold.tsx";
import { RecordsTable } from "../../../src/app/sections/RecordsTable.tsx";
import { ReductionFold } from "../../../src/app/sections/ReductionFold.tsx";
import { StartUpFold } from "../../../src/app/sections/StartUpFold.tsx";
import { TimesQuestion } from "../../../src/app/sections/TimesQuestion.tsx";
import { estimate } from "../../../src/core/quantity.ts";
import type { RecordCut } from "../../../src/core/recordCut.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { sheet, stationAt, viewOf, workspaceCase } from "../fixtures.ts";

const panel = () => screen.getByRole("dialog", { hidden: true });
const press = (text: string) => fireEvent.click(screen.getByRole("button", { name: text }));

const cut: RecordCut = {
  ...{ file: "long.csv", y: null, z: null, at: 401, kind: "backward" },
  ...{ from: 0.4, to: 0.25, samples: 150 },
};
const probe = (file: string, U: number, agrees: boolean) => ({
  ...{ file, y: 0.1, z: null, U: estimate(U, U - 0.1, U + 0.1), u_rms: estimate(0.3, 0.29, 0.31) },
  ...{ agrees, departs: agrees ? [] : (["U"] as const) },
});

function open(station: StationResult, children: React.ReactNode) {
  const view = viewOf([stationAt(0.2), station]);
  render(
    <RestedCases value={[view]}>
      <DefinitionPanel cases={[view]}>{children}</DefinitionPanel>
    </RestedCases>,
  );
  return view;
}

describe("the checks of the records", () => {
  it("list every cut of a record with its times and what became of it", () => {
    const view = viewOf([stationAt(0.3, { cuts: [cut, { ...cut, at: 900, kind: "gap" }], cuts_more: 7 })]);
    render(<ChecksFold cases={[view]} />);
    const rows = within(screen.getByRole("region", { name: "Cuts and gaps", hidden: true })).getAllByRole(
      "row",
      { hidden: true },
    );
    expect(rows).toHaveLength(3);
    expect(rows[1].textContent).toContain("time runs back");
    expect(rows[1].textContent).toContain("0.4000000 to 0.2500000");
    expect(document.body.textContent).toContain("7 more are not listed.");
  });

  it("show probes at one position apart, with what tells one from the others", () => {
    const probes = [probe("a.csv", 6, true), probe("b.csv", 7, false)];
    const view = viewOf([stationAt(0.3, { probes })]);
    render(<ChecksFold cases={[view]} />);
    const text = screen.getByRole("region", { name: "Probes at one position", hidden: true }).textContent;
    expect(text).toContain("6.00");
    expect(text).toContain("6.90 to 7.10");
    expect(text).toContain("differs in U");
  });
});

describe("numbers that no single result holds", () => {
  it("of the records table say which station gave the least and the greatest", () => {
    const few = stationAt(0.4, { facts: { ...stationAt(0.4).facts, integralTimes: 161 } });
    const view = open(few, null);
    render(
      <DefinitionPanel cases={[view]}>
        <RecordsTable cases={[view]} narrow={false} />
      </DefinitionPanel>,
    );
    press("160 to 5\u202f500");
    const [, last] = screen.getAllByRole("dialog", { hidden: true });
    expect(last.textContent).toContain("record length in integral times");
    expect(last.textContent).toContain("161 at 0.40");
    expect(last.textContent).toContain("Lenschow");
  });

  it("of a planned record length name the number it is for, and what that is now", () => {
    open(stationAt(0.4), <DurationFold />);
    const cells = within(screen.getByRole("region", { name: "Record lengths", hidden: true })).getAllByRole(
      "button",
      { hidden: true },
    );
    fireEvent.click(cells.at(-1) ?? cells[0]);
    expect(panel().textContent).toContain("record length needed");
    expect(panel().textContent).toContain("Taylor microscale");
    expect(panel().textContent).toContain("half-width asked for");
  });

  it("of a reduction stand in a fold of their own, whole numbers as such", () => {
    open(stationAt(0.4), <ReductionFold />);
    const fold = document.querySelector("details");
    if (!fold) throw new Error("no fold");
    fold.open = true;
    fireEvent(fold, new Event("toggle"));
    const [region] = screen.getAllByRole("region");
    expect(region.textContent).toContain("65\u202f536");
    fireEvent.click(within(region).getAllByRole("button", { name: "65\u202f536" })[0]);
    expect(panel().textContent).toContain("number of velocity samples used");
    expect(panel().textContent).toContain("counted, not estimated");
  });
});

describe("how a record begins", () => {
  it("is drawn, and its transient left out of every record of the case by one click", () => {
    const heard = vi.fn();
    const fields = ["weight", "u", "uu", "v", "vv", "w", "ww"];
    const data = Float64Array.from({ length: 40 * fields.length }, (_, i) =>
      i % fields.length === 0 ? 100 : i % 2 === 0 ? 4 : 0,
    );
    const blocks = { fields, rows: 40, data, blockSamples: 100, step: 1e-3, start: 0 };
    const flags = [{ code: "start-up" as const, text: "It begins in a transient.", value: 0.31 }];
    open(stationAt(0.4, { blocks, flags }), <StartUpFold onChange={heard} />);
    const fold = document.querySelector("details");
    if (!fold) throw new Error("no fold");
    expect(fold.textContent).toContain("a transient in screen");
    fold.open = true;
    fireEvent(fold, new Event("toggle"));
    press("Leave out 0.310\u202fs");
    expect(heard).toHaveBeenCalledWith({
      ...{ kind: "set-reduction", caseId: "case-1" },
      edit: { startup: 0.31 },
    });
  });
});

describe("time stamps with too few digits", () => {
  const flags = [{ code: "rounded-times" as const, text: "Too few digits.", value: 1.25e-4 }];
  it("are asked about once, with both answers", () => {
    const heard = vi.fn();
    render(<TimesQuestion view={viewOf([stationAt(0.3, { flags })])} onChange={heard} />);
    expect(document.body.textContent).toContain("1.250000\u202f×\u202f10⁻⁴\u202fs");
    press("Take the constant step");
    press("Take the times as written");
    expect(heard.mock.calls.map(([change]) => change.edit.read.times)).toEqual(["even", "written"]);
  });
  it("are not asked about again when one was chosen", () => {
    const of = { ...workspaceCase, sheet: { ...sheet, read: { ...sheet.read, times: "even" as const } } };
    render(<TimesQuestion view={viewOf([stationAt(0.3, { flags })], { of })} onChange={() => {}} />);
    expect(document.body.textContent).toBe("");
  });
});
