import { describe, expect, it } from "vitest";
import { isEstimate } from "../../../../src/core/quantity.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { expectClose } from "../../../support/expectClose.ts";
import {
  codes,
  exact,
  gradient,
  grid,
  harmonics,
  names,
  nu,
  part,
  partOf,
  periodic,
  size,
  snapshots,
  spacing,
  station,
  variance,
  whyOf,
} from "./harmonicLines.ts";

describe("what lines cannot give", () => {
  const two = partOf(
    snapshots.map(([u, v]) => [u, v]),
    { ...grid, components: ["u", "v"] },
  );
  const alone = partOf(
    snapshots.map(([u]) => [u]),
    { ...grid, components: ["u"] },
  );
  it("u and v: w is taken like u across the line, and is missing by name", () => {
    const found = reduceLines([two], periodic);
    expect(codes(found)).toContain("axisymmetry-assumed");
    for (const q of [
      found.ww,
      found.uw,
      found.vw,
      found.isotropy_uw,
      found.routes.skewness_w,
      found.routes.K_w,
    ])
      expect(whyOf(q)).toBe("w was not measured");
    expect(whyOf(found.routes.L_w)).toBe("w was not measured");
    expect(whyOf(found.routes["epsilon_all-gradients"])).toMatch(/not all three/);
    expectClose(found.k.value, variance("u") / 2 + variance("v"), exact);
    expectClose(found.epsilon.value, 3 * nu * (gradient("v") + 2 * gradient("u")), exact);
  });
  it("u alone across a line: no component along it, so no length and no gradient", () => {
    const found = reduceLines([alone], periodic);
    expect(codes(found)).toContain("isotropy-assumed");
    expectClose(found.k.value, 1.5 * variance("u"), exact);
    for (const q of [found.L11, found.lambda, found.epsilon, found.eta])
      expect(whyOf(q)).toMatch(/^v(, the component along the line,)? was not measured/);
    expect(whyOf(found.epsilon_inertial)).toMatch(/no spectrum along the line/);
    expect(found.curves).toBeNull();
  });
  it("a stream at rest: lengths stand, times and the intensity do not", () => {
    const found = reduceLines([partOf(harmonics(24, 6, -1))], periodic);
    expectClose(found.L11.value, station.L11.value ?? 0, exact);
    expect(whyOf(found.T_int)).toMatch(/mean velocity is not positive/);
    expect(whyOf(found.Tu)).toMatch(/mean velocity is not positive/);
    expectClose(found.facts.step, spacing, exact);
    expectClose(found.curves?.lag[1], spacing, exact);
    expectClose(
      reduceLines([partOf(harmonics(24, 6, -1))], { ...periodic, referenceSpeed: 2 }).Tu.value,
      (station.Tu.value ?? 0) * 2,
      exact,
    );
  });
  it("a short line, a mean that varies, no viscosity, a large-eddy simulation are flagged", () => {
    expect(codes(station)).toEqual([]);
    // one wave in the line: its L11 is L/(2π)
    const wave = Array.from({ length: 12 }, (_, s) =>
      names.map((name) =>
        Float64Array.from(
          { length: size },
          (_unused, i) => (name === "u" ? 4 : 0) + Math.cos((2 * Math.PI * i) / size + s),
        ),
      ),
    );
    const short = reduceLines([partOf(wave)], periodic).flags.find(({ code }) => code === "short-box");
    expectClose(short?.value, 2 * Math.PI, { relative: 0.004, because: "trapezoids of eight steps" });
    const les = reduceLines([part], { ...periodic, kind: "les", kinematicViscosity: null });
    expect(codes(les)).toEqual(expect.arrayContaining(["resolved-scales", "no-viscosity"]));
    for (const q of [les.epsilon, les.lambda, les.Re_lambda, les.C_epsilon])
      expect(whyOf(q)).toMatch(/decay law/);
    expect(codes(station)).not.toContain("no-viscosity");
    expect(codes(station)).not.toContain("resolution");
    const thin = reduceLines([part], { ...periodic, kinematicViscosity: 1e-6 });
    const highest = (Math.PI / spacing) * (thin.eta.value ?? 0);
    expect(highest).toBeLessThan(0.9);
    expectClose(thin.flags.find(({ code }) => code === "resolution")?.value, highest, exact);
  });
  it("fewer than ten snapshots have no interval, and count by themselves", () => {
    const few = reduceLines([partOf(snapshots.slice(0, 6))], periodic);
    expect(few.flags.find(({ code }) => code === "short-record")?.value).toBe(6);
    expect(few.facts.integralTimes).toBe(12);
    expect(few.facts.groups).toBe(0);
    for (const q of [few.U, few.L11, few.C_epsilon])
      expect(isEstimate(q) && q.low === null && /6.0 independent snapshots/.test(q.why_low ?? "")).toBe(true);
  });
  it("an inertial range that is chosen and not there leaves nothing adopted, and the reason", () => {
    const found = reduceLines([part], { ...periodic, dissipation: "inertial" });
    for (const q of [found.epsilon, found.lambda, found.eta, found.C_epsilon])
      expect(whyOf(q)).toMatch(/Re_lambda is/);
    expectClose(found.routes.lambda_gradient.value, station.lambda.value ?? 0, exact);
  });
  it("points that are not equally spaced have neither spectra nor gradients", () => {
    const uneven = partOf(snapshots, { ...grid, points: grid.points.map((y) => y + 0.01 * y * y) });
    const found = reduceLines([uneven], periodic);
    expect(codes(found)).toContain("unequal-steps");
    expect(whyOf(found.lambda)).toMatch(/not equally spaced/);
    expect(whyOf(found.routes.L_v)).toMatch(/not equally spaced/);
    expect([found.facts.step, found.facts.segment, found.facts.k1max_eta, found.facts.lagLimit]).toEqual([
      null,
      null,
      null,
      null,
    ]);
    expectClose(found.facts.lines?.length, uneven.points[size - 1], exact);
  });
});
