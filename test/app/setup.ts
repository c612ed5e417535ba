import { cleanup } from "@testing-library/react";
import { afterEach, vi } from "vitest";

afterEach(cleanup);

// happy-dom has no layout: figures are judged in a real browser, here they are only counted
vi.mock("plotly.js", () => ({
  default: {
    react: vi.fn(async (element: HTMLElement) => element),
    newPlot: vi.fn(async (element: HTMLElement) => element),
    purge: vi.fn(),
    toImage: vi.fn(async () => "data:image/svg+xml,"),
  },
}));
