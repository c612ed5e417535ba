import { useState } from "react";
import { vi } from "vitest";
import { Ruler } from "../../../src/app/ruler/Ruler.tsx";
import type { RulerCase, RulerPick, RulerProps, RulerStation } from "../../../src/app/ruler/rulerProps.ts";
import { estimate, missing } from "../../../src/core/quantity.ts";

const M = 0.025;
const screenX = [0.15, 0.2, 0.25, 0.3, 0.35, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.2, 1.4, 1.6, 1.8];

/** Invented: 16 stations behind a screen of M = 25 mm, the one at 1.6 m without an interval. */
export function screenCase(changes: Partial<RulerCase> = {}): RulerCase {
  const stations = screenX.map(
    (x): RulerStation =>
      x === 1.6
        ? { x, Tu: 0.02, quality: "none", why: "record too short" }
        : { x, Tu: 0.024 / x, quality: x === 0.35 ? "fair" : "well" },
  );
  return {
    id: "a",
    name: "screen",
    mark: 0,
    stations,
    law: { A: 0.16, x0: 3.2 * M, n: 1.25, length: M, covariance: [], quantile: 2 },
    lawTu: Math.sqrt(2 / 3),
    window: [0.3, 1.8],
    windowChosen: "auto",
    n: estimate(1.25, 1.2, 1.31),
    x0: estimate(3.2 * M, 2.1 * M, 4.1 * M),
    originHeld: false,
    length: M,
    symbol: "M",
    state: { kind: "ready" },
    ...changes,
  };
}

export function simulationCase(changes: Partial<RulerCase> = {}): RulerCase {
  return screenCase({
    id: "b",
    name: "simulation",
    mark: 1,
    window: [0.25, 1.6],
    x0: estimate(-2.9 * M, -5.8 * M, -0.5 * M),
    ...changes,
  });
}

/** A case that no law could be fitted to. */
export function lawless(changes: Partial<RulerCase> = {}): RulerCase {
  const none = missing("three stations lie in the window");
  return screenCase({ law: null, lawTu: null, window: null, n: none, x0: none, ...changes });
}

export function rulerSpies() {
  return {
    onWindow: vi.fn<RulerProps["onWindow"]>(),
    onAxis: vi.fn<RulerProps["onAxis"]>(),
    onPick: vi.fn<RulerProps["onPick"]>(),
    onHoldOrigin: vi.fn<RulerProps["onHoldOrigin"]>(),
    onBody: vi.fn<NonNullable<RulerProps["onBody"]>>(),
    onHover: vi.fn<NonNullable<RulerProps["onHover"]>>(),
    onShowStation: vi.fn<NonNullable<RulerProps["onShowStation"]>>(),
  };
}

/** The ruler with a page around it that keeps what is chosen, as the app does. */
export function KeptRuler({
  cases,
  spies,
  ...rest
}: { cases: readonly RulerCase[]; spies: ReturnType<typeof rulerSpies> } & Partial<RulerProps>) {
  const [kept, setKept] = useState(cases);
  const [axis, setAxis] = useState<RulerProps["axis"]>("x");
  const [picked, setPicked] = useState<readonly RulerPick[]>([]);
  const change = (id: string, changes: Partial<RulerCase>) =>
    setKept((before) => before.map((one) => (one.id === id ? { ...one, ...changes } : one)));
  return (
    <Ruler
      units="m"
      {...spies}
      {...rest}
      cases={kept}
      axis={axis}
      picked={picked}
      onWindow={(id, window, phase, all) => {
        spies.onWindow(id, window, phase, all);
        if (window === "auto") change(id, { window: [0.3, 1.8], windowChosen: "auto" });
        else change(id, { window, windowChosen: "given" });
      }}
      onAxis={(next) => {
        spies.onAxis(next);
        setAxis(next);
      }}
      onPick={(caseId, x, on) => {
        spies.onPick(caseId, x, on);
        setPicked((before) =>
          on ? [...before, { caseId, x, letter: "a" }] : before.filter((p) => p.x !== x),
        );
      }}
      onHoldOrigin={(id, x0, phase) => {
        spies.onHoldOrigin(id, x0, phase);
        change(id, x0 === null ? { originHeld: false } : { originHeld: true, x0: estimate(x0, x0, x0) });
      }}
    />
  );
}
