import { fireEvent, render, screen } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { NumberField, parseNumber } from "../../../src/app/sections/NumberField.tsx";

describe("a number typed by hand", () => {
  it.each([
    ["1.5e-5", 1.5e-5],
    ["0,25", 0.25],
    ["−3", -3],
    ["  ", null],
    ["1.2.3", "wrong"],
    ["air", "wrong"],
    ["1e300", "wrong"],
    ["1e-300", "wrong"],
    ["0", 0],
  ])("reads %j as %j", (text, value) => expect(parseNumber(text)).toBe(value));

  it("counts when Enter is pressed, not before", () => {
    const heard = vi.fn();
    render(<NumberField label="viscosity" value={null} above={0} onChange={heard} />);
    const field = screen.getByLabelText("viscosity");
    fireEvent.change(field, { target: { value: "1.5e-5" } });
    expect(heard).not.toHaveBeenCalled();
    fireEvent.keyDown(field, { key: "Enter" });
    expect(heard).toHaveBeenCalledWith(1.5e-5);
  });

  it("refuses a viscosity of zero and says what is needed", () => {
    const heard = vi.fn();
    render(<NumberField label="viscosity" value={null} above={0} onChange={heard} />);
    const field = screen.getByLabelText("viscosity");
    fireEvent.change(field, { target: { value: "0" } });
    fireEvent.blur(field);
    expect(heard).not.toHaveBeenCalled();
    expect(screen.getByRole("alert").textContent).toBe("A number above zero is needed.");
  });
});
