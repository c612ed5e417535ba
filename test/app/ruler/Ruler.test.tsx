import { act, fireEvent, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { expectClose } from "../../support/expectClose.ts";
import { KeptRuler, lawless, rulerSpies, screenCase, simulationCase } from "./rulerFixture.tsx";

let spies = rulerSpies();
beforeEach(() => {
  spies = rulerSpies();
});
const slider = (name: string) => screen.getByRole("slider", { name });
const spokenOf = (element: HTMLElement) =>
  `${element.getAttribute("aria-label")}, ${element.getAttribute("aria-valuetext")}`;
const show = (cases = [screenCase()], rest = {}) =>
  render(<KeptRuler cases={cases} spies={spies} {...rest} />);

describe("what the ruler is to a screen reader", () => {
  it("is a group with a group for each lane, named with its stations", () => {
    show([screenCase(), simulationCase()]);
    const ruler = screen.getByRole("group", { name: "Streamwise ruler" });
    expect(within(ruler).getByRole("group", { name: "screen, 16 stations" })).toBeTruthy();
    expect(within(ruler).getByRole("group", { name: "simulation, 16 stations" })).toBeTruthy();
  });
  it("says case, place and number of the station for each bracket", () => {
    show();
    expect(spokenOf(slider("Start of fit window, screen"))).toBe(
      "Start of fit window, screen, 0.30 metres, station 4 of 16",
    );
    expect(spokenOf(slider("End of fit window, screen"))).toBe(
      "End of fit window, screen, 1.80 metres, station 16 of 16",
    );
  });
  it("says whether the origin is fitted or held, and what to press", () => {
    show();
    expect(spokenOf(slider("Virtual origin, screen"))).toBe(
      "Virtual origin, screen, fitted, 3.2 M. Enter to hold.",
    );
  });
  it("is walked through in the order switch, then each lane's brackets, flag and stations, then body", async () => {
    show([screenCase()], { body: { x: 0.9, name: "heated tube" } });
    const names: (string | null)[] = [];
    for (let i = 0; i < 6; i++) {
      await userEvent.tab();
      names.push(document.activeElement?.getAttribute("aria-label") ?? null);
    }
    expect(names).toEqual([
      "x in metres",
      "Start of fit window, screen",
      "End of fit window, screen",
      "Virtual origin, screen",
      "Station 0.15 metres; Tu 16.0 percent; well sampled.",
      "Body, heated tube",
    ]);
  });
});

describe("a bracket moved by key", () => {
  it("goes one station with an arrow: live while the key is down, one change when it is let go", async () => {
    show();
    slider("Start of fit window, screen").focus();
    await userEvent.keyboard("{ArrowRight}");
    expect(spies.onWindow.mock.calls).toEqual([
      ["a", [0.35, 1.8], "drag", false],
      ["a", [0.35, 1.8], "rest", false],
    ]);
    expect(slider("Start of fit window, screen").getAttribute("aria-valuenow")).toBe("0.35");
  });
  it("makes one change of a key that repeats", async () => {
    show();
    slider("Start of fit window, screen").focus();
    await userEvent.keyboard("{ArrowRight>3/}");
    const phases = spies.onWindow.mock.calls.map(([, , phase]) => phase);
    expect(phases).toEqual(["drag", "drag", "drag", "rest"]);
    expect(spies.onWindow.mock.lastCall?.[1]).toEqual([0.5, 1.8]);
  });
  it("stops a station before the other bracket on End", async () => {
    show();
    slider("Start of fit window, screen").focus();
    await userEvent.keyboard("{End}");
    expect(spies.onWindow.mock.lastCall).toEqual(["a", [1.6, 1.8], "rest", false]);
  });
  it("returns to automatic on A", async () => {
    show([screenCase({ windowChosen: "given" })]);
    slider("End of fit window, screen").focus();
    await userEvent.keyboard("a");
    expect(spies.onWindow.mock.calls).toEqual([["a", "auto", "rest", false]]);
  });
  it("returns on Escape to what stood when it was focused, automatic if it was", async () => {
    show();
    slider("End of fit window, screen").focus();
    await userEvent.keyboard("{ArrowLeft}{ArrowLeft}{Escape}");
    expect(spies.onWindow.mock.lastCall).toEqual(["a", "auto", "rest", false]);
  });
  it("drops on Escape what a key that is still down was moving", async () => {
    show();
    slider("End of fit window, screen").focus();
    await userEvent.keyboard("{ArrowLeft>}{Escape}");
    expect(spies.onWindow.mock.calls.map(([, window, phase]) => [window, phase])).toEqual([
      [[0.3, 1.6], "drag"],
      ["auto", "cancel"],
    ]);
  });
  it("is announced once, 400 ms after the last key", async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    show();
    slider("Start of fit window, screen").focus();
    await userEvent.keyboard("{ArrowRight}{ArrowRight}");
    const live = document.querySelector("[aria-live=polite]");
    act(() => vi.advanceTimersByTime(350));
    expect(live?.textContent).toBe("");
    act(() => vi.advanceTimersByTime(100));
    expect(live?.textContent).toBe("n 1.25, 95 percent 1.20 to 1.31; virtual origin 3.2 M.");
    vi.useRealTimers();
  });
});

describe("a bracket moved by pointer", () => {
  // happy-dom lays nothing out: the lane is taken as 890 px wide, 2.1 m or so, 0.1 m is about 42 px.
  const pull = (name: string, dx: number, shiftKey = false) => {
    fireEvent.pointerDown(slider(name), { pointerId: 1, button: 0, clientX: 100, shiftKey });
    fireEvent.pointerMove(slider(name), { pointerId: 1, clientX: 100 + dx });
  };
  it("snaps to the nearest station and rests as one change", () => {
    show();
    pull("Start of fit window, screen", 40);
    fireEvent.pointerUp(slider("Start of fit window, screen"), { pointerId: 1, clientX: 140 });
    expect(spies.onWindow.mock.calls).toEqual([
      ["a", [0.4, 1.8], "drag", false],
      ["a", [0.4, 1.8], "rest", false],
    ]);
  });
  it("keeps the old place in sight, and the caught station on the edge", () => {
    const { container } = show();
    pull("Start of fit window, screen", 40);
    expect(container.querySelector(".ruler-bracket-line.before")).toBeTruthy();
    expect(container.querySelector(".ruler-tag")?.textContent).toBe("0.40");
  });
  it("goes back to automatic on Escape", () => {
    show();
    pull("Start of fit window, screen", 40);
    fireEvent.keyDown(slider("Start of fit window, screen"), { key: "Escape" });
    expect(spies.onWindow.mock.lastCall).toEqual(["a", "auto", "cancel", false]);
  });
  it("goes back when the browser takes the pointer to scroll the page", () => {
    show();
    pull("Start of fit window, screen", 40);
    fireEvent.pointerCancel(slider("Start of fit window, screen"), { pointerId: 1 });
    expect(spies.onWindow.mock.lastCall).toEqual(["a", "auto", "cancel", false]);
  });
  it("takes every case's bracket along with Shift", () => {
    show([screenCase(), simulationCase()]);
    pull("Start of fit window, screen", 40, true);
    expect(spies.onWindow.mock.calls).toEqual([
      ["a", [0.4, 1.8], "drag", true],
      ["b", [0.35, 1.6], "drag", true],
    ]);
  });
  it("does nothing for a press that does not move", () => {
    show();
    fireEvent.pointerDown(slider("Start of fit window, screen"), { pointerId: 1, button: 0, clientX: 100 });
    fireEvent.pointerUp(slider("Start of fit window, screen"), { pointerId: 1, clientX: 101 });
    expect(spies.onWindow).not.toHaveBeenCalled();
  });
});

describe("the flag", () => {
  it("is held where it stands on Enter and freed on Delete", async () => {
    show();
    slider("Virtual origin, screen").focus();
    await userEvent.keyboard("{Enter}");
    expect(spies.onHoldOrigin.mock.lastCall).toEqual(["a", 3.2 * 0.025, "rest"]);
    expect(slider("Virtual origin, screen").getAttribute("aria-valuetext")).toContain("held, 3.2 M.");
    await userEvent.keyboard("{Delete}");
    expect(spies.onHoldOrigin.mock.lastCall).toEqual(["a", null, "rest"]);
  });
  it("moves by a tenth of M, with Shift by M", async () => {
    show();
    slider("Virtual origin, screen").focus();
    await userEvent.keyboard("{ArrowLeft}");
    expect(spies.onHoldOrigin.mock.lastCall).toEqual(["a", 0.0775, "rest"]);
    await userEvent.keyboard("{Shift>}{ArrowRight}{/Shift}");
    expect(spies.onHoldOrigin.mock.lastCall).toEqual(["a", 0.1025, "rest"]);
  });
  it("goes back on Escape to what stood when it was focused: fitted, if it was", async () => {
    show();
    slider("Virtual origin, screen").focus();
    await userEvent.keyboard("{ArrowLeft}{ArrowLeft}{Escape}");
    expect(spies.onHoldOrigin.mock.lastCall).toEqual(["a", null, "rest"]);
  });
  it("reads a held origin to the tenth of M that it moves by", async () => {
    show([screenCase({ originHeld: true, x0: { value: -0.0175, low: null, high: null } })]);
    expect(slider("Virtual origin, screen").getAttribute("aria-valuetext")).toContain("held, −0.7 M.");
  });
  it("is freed by a double click", async () => {
    show([screenCase({ originHeld: true })]);
    await userEvent.dblClick(slider("Virtual origin, screen"));
    expect(spies.onHoldOrigin.mock.lastCall).toEqual(["a", null, "rest"]);
  });
});

describe("the stations", () => {
  it("are picked and put back with Space, and say their letter", async () => {
    show();
    screen.getByRole("option", { name: /^Station 0\.15/ }).focus();
    await userEvent.keyboard("{ArrowRight}{ArrowRight} ");
    expect(spies.onPick.mock.lastCall).toEqual(["a", 0.25, true]);
    const option = screen.getByRole("option", {
      name: /^Station 0\.25 metres, picked as a; Tu 9\.60 percent/,
    });
    expect(option.getAttribute("aria-selected")).toBe("true");
    await userEvent.keyboard(" ");
    expect(spies.onPick.mock.lastCall).toEqual(["a", 0.25, false]);
  });
  it("are picked by a click", async () => {
    show();
    await userEvent.click(screen.getByRole("option", { name: /^Station 0\.40/ }));
    expect(spies.onPick.mock.lastCall).toEqual(["a", 0.4, true]);
  });
  it("show their row on Enter and are pointed out in the figures while focused", async () => {
    show();
    screen.getByRole("option", { name: /^Station 0\.15/ }).focus();
    await userEvent.keyboard("{End}{Enter}");
    expect(spies.onHover.mock.lastCall).toEqual(["a", 1.8]);
    expect(spies.onShowStation.mock.lastCall).toEqual(["a", 1.8]);
  });
  it("give the reason where there is no interval", () => {
    show();
    expect(
      screen.getByRole("option", { name: "Station 1.60 metres, no interval: record too short." }),
    ).toBeTruthy();
  });
  it("cannot be picked before they are read", async () => {
    show([lawless({ stations: [{ x: 0.2, Tu: null, quality: "waiting" }] })]);
    await userEvent.click(screen.getByRole("option", { name: "Station 0.2 metres, not yet read." }));
    expect(spies.onPick).not.toHaveBeenCalled();
  });
});

describe("the switch", () => {
  it("turns the scale with arrows and clicks", async () => {
    show();
    screen.getByRole("radio", { name: "x in metres" }).focus();
    await userEvent.keyboard("{ArrowRight}");
    expect(spies.onAxis.mock.lastCall).toEqual(["x/ell"]);
    expect(screen.getByRole("radio", { name: "x over M" }).getAttribute("aria-checked")).toBe("true");
    await userEvent.click(screen.getByRole("radio", { name: "x minus x0, over M" }));
    expect(spies.onAxis.mock.lastCall).toEqual(["(x-x0)/ell"]);
  });
  it("has no x/M without a reference length", () => {
    show([screenCase({ length: null })]);
    expect(screen.getAllByRole("radio").map((radio) => radio.textContent)).toEqual(["x(m)", "x−x0(m)"]);
  });
  it("has no distance from the origin, and the lane no flag, without a law", () => {
    show([lawless()]);
    expect(screen.getAllByRole("radio").map((radio) => radio.textContent)).toEqual(["x(m)", "x/M"]);
    expect(screen.queryByRole("slider")).toBeNull();
  });
  it("leaves a lane without an origin empty, with the reason, while the other is aligned", async () => {
    show([screenCase(), lawless({ id: "b", name: "simulation" })]);
    await userEvent.click(screen.getByRole("radio", { name: "x minus x0, over M" }));
    const lane = screen.getByRole("group", { name: "simulation, 16 stations" });
    expect(lane.textContent).toBe("no virtual origin, so no place on this scale");
  });
});

describe("the body", () => {
  const body = { body: { x: 0.9, name: "heated tube" } };
  it("moves by key and takes a typed number", async () => {
    show([screenCase()], body);
    slider("Body, heated tube").focus();
    await userEvent.keyboard("{ArrowRight}");
    expect(spies.onBody.mock.lastCall?.[1]).toBe("rest");
    expect(spies.onBody.mock.lastCall?.[0]).toBeGreaterThan(0.91);
    await userEvent.keyboard("{Enter}");
    await userEvent.clear(screen.getByRole("textbox", { name: "Position of heated tube" }));
    await userEvent.keyboard("1,05{Enter}");
    expect(spies.onBody.mock.lastCall).toEqual([1.05, "rest"]);
  });
  it("keeps what is being typed when the page draws anew in the middle of it", async () => {
    const { rerender } = show([screenCase()], body);
    slider("Body, heated tube").focus();
    await userEvent.keyboard("{Enter}1");
    rerender(<KeptRuler cases={[screenCase()]} spies={spies} {...body} />);
    await userEvent.keyboard(".05{Enter}");
    expect(spies.onBody.mock.lastCall).toEqual([1.05, "rest"]);
  });
  it("goes 1 % of the scale with an arrow, 5 % with Shift, and stays on the scale", async () => {
    show([screenCase()], body);
    const grip = slider("Body, heated tube");
    const [low, high] = ["aria-valuemin", "aria-valuemax"].map((end) => Number(grip.getAttribute(end)));
    grip.focus();
    const moved = async (keys: string) => {
      await userEvent.keyboard(keys);
      return Number(spies.onBody.mock.lastCall?.[0]) - 0.9;
    };
    const grain = { relative: 0.05, because: "places by hand keep a thousandth of the scale" };
    expectClose(await moved("{ArrowLeft}"), -(high - low) / 100, grain);
    expectClose(await moved("{Shift>}{ArrowRight}{/Shift}"), (high - low) / 20, grain);
    show([screenCase()], { body: { x: high, name: "edge" } });
    slider("Body, edge").focus();
    expectClose((await moved("{ArrowRight}")) + 0.9, high, { relative: 1e-3, because: "the same grain" });
  });
  it("off the scale stands at its edge, with an arrow, and its name on the side that has room", () => {
    const { container } = show([screenCase()], { body: { x: 40, name: "far" } });
    expect(slider("Body, far").getAttribute("aria-valuetext")).toContain("40.00 metres");
    const name = container.querySelector(".ruler-body-name");
    expect(name?.textContent).toContain("→");
    expect(name?.classList.contains("before")).toBe(true);
  });
  it("is said once it rests, with what is met there", async () => {
    show([screenCase()], { body: { x: 0.9, name: "body", readings: "Tu 3.34 percent in screen" } });
    slider("Body").focus();
    await userEvent.keyboard("{ArrowRight}");
    await vi.waitFor(() =>
      expect(document.querySelector(".ruler .spoken")?.textContent).toBe(
        "Body, 0.90 metres; Tu 3.34 percent in screen.",
      ),
    );
  });
  it("is drawn in each lane where it stands there, and in none where it does not", () => {
    const lines = (places: readonly (number | null)[]) => {
      const { container, unmount } = show([screenCase(), simulationCase()], {
        body: { x: 0.9, name: "body", places },
      });
      const path = container.querySelector(".ruler-body-line")?.getAttribute("d") ?? "";
      unmount();
      return path.split("M").slice(1);
    };
    expect(lines([0.9, null])).toHaveLength(1);
    const [first, second] = lines([0.9, 1.2]).map((piece) => Number.parseFloat(piece));
    expect(second).toBeGreaterThan(first);
  });
  it("keeps its place when what is typed is no number", async () => {
    show([screenCase()], body);
    slider("Body, heated tube").focus();
    await userEvent.keyboard("{Enter}far away{Enter}");
    expect(spies.onBody).not.toHaveBeenCalled();
  });
});

describe("the readings", () => {
  it("say how far the reading is, and offer to cancel", async () => {
    const onCancelReading = vi.fn();
    const state = { kind: "reading", done: 9, total: 16, amount: "2.1 of 3.8 GB" } as const;
    show([lawless({ state })], { onCancelReading });
    expect(screen.getByText("9 of 16 stations")).toBeTruthy();
    await userEvent.click(screen.getByRole("button", { name: "Cancel reading screen" }));
    expect(onCancelReading).toHaveBeenCalledWith("a");
  });
  it("are marked busy while they are stale", () => {
    const { container } = show([screenCase({ state: { kind: "stale" } })]);
    expect(container.querySelector("[aria-busy=true]")?.textContent).toContain("1.25");
  });
});
