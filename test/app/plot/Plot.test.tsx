import { render, screen, waitFor } from "@testing-library/react";
import Plotly from "plotly.js";
import { StrictMode } from "react";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { Plot } from "../../../src/app/plot/Plot.tsx";
import { decayFigure } from "../../../src/figures/decayFigure.ts";
import { defaultFigureOptions } from "../../../src/figures/figureSpec.ts";
import { darkTokens, lightTokens } from "../../../src/figures/tokens.ts";
import { madePair } from "../../figures/powerLawCase.ts";

const figure = decayFigure(madePair, { ...defaultFigureOptions, tokens: lightTokens });
const dark = decayFigure(madePair, { ...defaultFigureOptions, tokens: darkTokens });
const react = vi.mocked(Plotly.react);
const purge = vi.mocked(Plotly.purge);

describe("a figure on the page", () => {
  beforeEach(() => {
    react.mockClear();
    purge.mockClear();
    // happy-dom has no layout: without an observer every figure counts as near the screen
    vi.stubGlobal("IntersectionObserver", undefined);
  });

  it("reserves its place before it is drawn", () => {
    render(<Plot figure={figure} label="Decay" />);
    const frame = screen.getByRole("figure", { name: "Decay" });
    expect([frame.style.width, frame.style.height]).toEqual(["430px", "400px"]);
  });
  it("is drawn once it is near, without tools and without an address to send data to", async () => {
    render(<Plot figure={figure} label="Decay" />);
    await waitFor(() => expect(react).toHaveBeenCalledTimes(1));
    expect(react.mock.calls[0][3]).toMatchObject({
      displayModeBar: false,
      showSendToCloud: false,
      plotlyServerURL: "",
      responsive: false,
    });
  });
  it("is drawn in strict mode too, and is not purged while it stands on the page", async () => {
    render(
      <StrictMode>
        <Plot figure={figure} label="Decay" />
      </StrictMode>,
    );
    await waitFor(() => expect(react).toHaveBeenCalled());
    expect(purge).not.toHaveBeenCalled();
  });
  it("draws only the last of several changes within a frame", async () => {
    const { rerender } = render(<Plot figure={figure} />);
    for (let i = 0; i < 5; i++) rerender(<Plot figure={i % 2 === 0 ? dark : figure} />);
    rerender(<Plot figure={dark} />);
    await waitFor(() => expect(react).toHaveBeenCalled());
    await new Promise((resolve) => setTimeout(resolve, 60));
    expect(react).toHaveBeenCalledTimes(1);
    expect(react.mock.calls[0][2]).toBe(dark.layout);
  });
  it("is purged when it has left the page", async () => {
    const { unmount } = render(<Plot figure={figure} />);
    await waitFor(() => expect(react).toHaveBeenCalled());
    unmount();
    await waitFor(() => expect(purge).toHaveBeenCalledTimes(1));
  });
  it("says so where the drawing part cannot draw, and draws the next figure", async () => {
    react.mockRejectedValueOnce(new Error("no"));
    const { rerender } = render(<Plot figure={figure} />);
    await screen.findByText(/could not be loaded/);
    rerender(<Plot figure={dark} />);
    await waitFor(() => expect(screen.queryByText(/could not be loaded/)).toBeNull());
  });
});
