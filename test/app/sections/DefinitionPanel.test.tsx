import { act, fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { DefinitionPanel } from "../../../src/app/sections/DefinitionPanel.tsx";
import { DefinitionDoor, type OpenDefinition } from "../../../src/app/sections/definitionContext.ts";
import { FitTable } from "../../../src/app/sections/FitTable.tsx";
import { NumberButton } from "../../../src/app/sections/NumberButton.tsx";
import { StationTable } from "../../../src/app/sections/StationTable.tsx";
import { estimate, missing } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { tableKeys } from "../../../src/export/stationColumns.ts";
import { madeComparison } from "../../figures/madeComparison.ts";
import { decayOf, stationAt, viewOf } from "../fixtures.ts";

const flag = { code: "resolution" as const, text: "Gradients are resolved to k1 eta 0.7 only." };
const station: StationResult = {
  ...stationAt(0.45),
  flags: [flag],
  routes: { lambda_f: { value: 0.004, low: 0.0039, high: 0.0041 }, lambda_gradient: missing("no spectrum") },
};
const view = viewOf([stationAt(0.2), station]);

function shown() {
  render(
    <DefinitionPanel cases={[view]}>
      <StationTable view={view} onHover={() => {}} />
      <FitTable cases={[view]} />
    </DefinitionPanel>,
  );
}
const panel = () => screen.getByRole("dialog", { hidden: true });

describe("the definition behind a number", () => {
  it("of the Taylor microscale gives formula, place, other routes with values or reasons, doubts and source", () => {
    shown();
    const row = document.querySelector<HTMLElement>('[data-station$=" 0.45"]');
    if (!row) throw new Error("no row");
    const cells = within(row).getAllByRole("button");
    // position and distance from the origin stand before them
    fireEvent.click(cells[2 + tableKeys.indexOf("lambda")]);
    expect(panel().textContent).toContain("Taylor microscale");
    expect(panel().textContent).toContain("0.45");
    expect(panel().textContent).toContain("longitudinal Taylor microscale");
    expect(panel().textContent).toContain("no spectrum");
    expect(panel().textContent).toContain(flag.text.slice(0, 24));
    expect(panel().textContent).toContain("Pope (2000)");
  });

  it("of the exponent gives window, residuals and the exponent by other routes", () => {
    shown();
    const exponent = screen.getByRole("row", { name: /^exponent n/ });
    fireEvent.click(within(exponent).getAllByRole("button").at(-1) ?? exponent);
    expect(panel().textContent).toContain("window");
    expect(panel().textContent).toContain("given this window");
  });

  it("is reached in a table by one stop of the Tab key and the arrow keys", () => {
    shown();
    const cells = [...document.querySelectorAll<HTMLElement>("[data-cell]")];
    expect(cells.filter(({ tabIndex }) => tabIndex === 0)).toHaveLength(1);
    cells[0].focus();
    fireEvent.keyDown(cells[0], { key: "ArrowRight" });
    expect(document.activeElement).toBe(cells[1]);
    fireEvent.keyDown(cells[1], { key: "ArrowDown" });
    expect(document.activeElement?.closest("tr")?.dataset.station).toContain("0.45");
  });

  it("a doubt stands beside the number it is about, with its text", () => {
    shown();
    const marked = [...document.querySelectorAll(".cell-flag")];
    expect(marked.length).toBeGreaterThan(0);
    expect(marked.every((each) => each.textContent?.includes(flag.text))).toBe(true);
  });

  it("of a ratio of two cases gives what they are aligned by, the common range and its tests", () => {
    const ratio = estimate(1.08, 1.02, 1.14);
    const comparison = { ...madeComparison, quantities: { ...madeComparison.quantities } };
    comparison.quantities.L11 = { ...comparison.quantities.L11, ratio };
    render(
      <DefinitionPanel cases={[view]} comparisons={[comparison]}>
        <NumberButton of="ratio" quantity={ratio}>
          1.08
        </NumberButton>
      </DefinitionPanel>,
    );
    fireEvent.click(screen.getByRole("button", { name: "1.08" }));
    expect(panel().textContent).toContain("integral length scale");
    expect(panel().textContent).toContain("aligned");
    expect(panel().textContent).toContain("1.08 (1.02 to 1.14)");
  });

  it("opens for a reading in the head, which stands outside of the page's argument", () => {
    const door: { current: OpenDefinition | null } = { current: null };
    render(
      <DefinitionDoor value={door}>
        <DefinitionPanel cases={[view]}>nothing</DefinitionPanel>
      </DefinitionDoor>,
    );
    const { n } = view.decay ?? decayOf([]);
    act(() => door.current?.({ key: "n", quantity: n }, document.body));
    expect(panel().textContent).toContain("decay exponent of the energy");
    expect(panel().textContent).toContain("profile likelihood");
  });

  it("says on lateral lines which component an index stands for", () => {
    const lines = {
      ...{ along: "y" as const, points: 64, spacing: 0.001, length: 0.064, periodic: true, parallel: 1 },
      ...{ snapshots: 40, independentSnapshots: 30, independentSamples: 90, snapshotCorrelation: 0.1 },
    };
    const of = stationAt(0.4, {
      facts: { ...stationAt(0.4).facts, lines },
      routes: { K_v: estimate(1, 0.9, 1.1) },
    });
    const onLines = viewOf([of]);
    render(
      <DefinitionPanel cases={[onLines]}>
        <NumberButton of="K_v" quantity={of.routes.K_v}>
          1.00
        </NumberButton>
      </DefinitionPanel>,
    );
    fireEvent.click(screen.getByRole("button", { name: "1.00" }));
    expect(panel().textContent).toContain("formed with u, a component across the line, against v along y");
  });
});
