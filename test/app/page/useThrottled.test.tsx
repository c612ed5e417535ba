import { act, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { useThrottled } from "../../../src/app/page/useThrottled.ts";

describe("a figure that follows a bracket", () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it("is drawn at least five times a second while a value changes every frame", () => {
    const { result, rerender } = renderHook(({ value }) => useThrottled(value, 90), {
      initialProps: { value: 0 },
    });
    const seen = new Set<number>();
    for (let frame = 1; frame <= 60; frame++) {
      rerender({ value: frame });
      act(() => vi.advanceTimersByTime(1000 / 60));
      seen.add(result.current);
    }
    expect(seen.size).toBeGreaterThanOrEqual(6);
  });

  it("ends on the last value", () => {
    const { result, rerender } = renderHook(({ value }) => useThrottled(value, 90), {
      initialProps: { value: "a" },
    });
    for (const value of ["b", "c", "d"]) rerender({ value });
    act(() => vi.advanceTimersByTime(200));
    expect(result.current).toBe("d");
  });
});
