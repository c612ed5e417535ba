import { render, screen, within } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { StationTable } from "../../../src/app/sections/StationTable.tsx";
import { estimate, missing } from "../../../src/core/quantity.ts";
import { stationAt, viewOf } from "../fixtures.ts";

const positions = [0.2, 0.3, 0.4, 0.8, 1.6];
const rows = () => screen.getAllByRole("row").slice(1);
const quiet = () => {};

describe("the table of stations", () => {
  it("gives a row to every station, those outside the fit window in grey", () => {
    render(<StationTable view={viewOf(positions.map((x) => stationAt(x)))} onHover={quiet} />);
    expect(rows()).toHaveLength(positions.length);
    expect(rows()[0].className).toBe("outside");
    expect(rows()[1].className).toBe("");
  });

  it("shows Tu in per cent with half the interval behind it, in the same decimals", () => {
    const Tu = estimate(0.0746, 0.0729, 0.0763);
    render(<StationTable view={viewOf([stationAt(0.3, { Tu })])} onHover={quiet} />);
    const cells = within(rows()[0]).getAllByRole("cell");
    expect(cells[2].textContent).toBe("7.46");
    expect(cells[3].textContent).toBe("±\u202f0.17");
  });

  it("shows distances from the virtual origin in reference lengths", () => {
    // (0.30 - 0.08)/0.025 = 8.8
    render(<StationTable view={viewOf([stationAt(0.3)])} onHover={quiet} />);
    expect(within(rows()[0]).getAllByRole("cell")[1].textContent).toBe("8.8");
  });

  it("draws a dash, never a zero, where a record is too short for an interval", () => {
    const Tu = { value: 0.0228, low: null, high: null, why_low: "161 integral times" };
    render(<StationTable view={viewOf([stationAt(1.6, { Tu })])} onHover={quiet} />);
    const cells = within(rows()[0]).getAllByRole("cell");
    expect(cells[2].textContent).toBe("2.28");
    expect(cells[3].textContent).toBe("–");
  });

  it("says a reason once, in a sentence, for a quantity that no station has", () => {
    const without = positions.map((x) =>
      stationAt(x, { eta: missing("no viscosity"), Re_lambda: missing("no viscosity") }),
    );
    render(<StationTable view={viewOf(without)} onHover={quiet} />);
    expect(screen.getByText(/no viscosity/).textContent).toBe("No η or Reλ: no viscosity.");
  });
});
