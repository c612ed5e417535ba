import { describe, expect, it } from "vitest";
import { parseHeading } from "../../src/read/heading.ts";
import { recogniseColumns } from "../../src/read/recogniseColumns.ts";

const seen = (...headings: string[]) => recogniseColumns(headings.map(parseHeading), null);

describe("headings of a time series", () => {
  it.each([
    [
      ["t", "u", "v", "w"],
      ["t", "u", "v", "w"],
    ],
    [
      ["Time", "U", "V", "W"],
      ["t", "u", "v", "w"],
    ],
    [
      ["T", "U"],
      ["t", "u"],
    ],
    [
      ["Zeit", "u", "v", "w", "T"],
      ["t", "u", "v", "w", null],
    ],
    [
      ["time [s]", "Ux [m/s]", "Uy [m/s]", "Uz [m/s]"],
      ["t", "u", "v", "w"],
    ],
    [
      ["temps", "velocity_x", "velocity_y"],
      ["t", "u", "v"],
    ],
    [
      ["t", "u1", "u2", "u3"],
      ["t", "u", "v", "w"],
    ],
    [
      ["Time", "U:0", "U:1", "U:2", "Points:0", "Points:1", "Points:2"],
      ["t", "u", "v", "w", "x", "y", "z"],
    ],
    [
      ["t", "u0", "u1"],
      ["t", "u", "v"],
    ],
    [
      ["t", "u1", "v1", "w1"],
      ["t", "u", "v", "w"],
    ],
    [
      ["X", "Y", "Z", "Time", "vx", "vy", "vz"],
      ["x", "y", "z", "t", "u", "v", "w"],
    ],
    [
      ["t", "u", "U", "p"],
      ["t", "u", null, null],
    ],
    [
      ["t", "u", "v", "w", "k"],
      ["t", "u", "v", "w", null],
    ],
  ])("%j", (headings, roles) => {
    expect(seen(...headings).roles).toEqual(roles);
    expect(seen(...headings).layout).toBe("series");
  });
  it("that fit two columns alike are left to the user", () => {
    expect(seen("t", "u", "u", "v").clashes).toEqual([{ role: "u", columns: [2, 3] }]);
    expect(seen("u0", "u1", "u2", "u3").roles).toEqual([null, null, null, null]);
    expect(seen("u1", "u2", "v1", "v2").roles).toEqual([null, null, null, null]);
  });
});

describe("headings of a profile", () => {
  it.each([
    [
      ["x", "U", "uu", "vv", "ww"],
      ["x", "U", "uu", "vv", "ww"],
    ],
    [
      ["x [m]", "Umean", "u_rms", "v_rms", "w_rms"],
      ["x", "U", "u_rms", "v_rms", "w_rms"],
    ],
    [
      ["x", "U", "<u'u'>", "<v'v'>", "<u'v'>"],
      ["x", "U", "uu", "vv", "uv"],
    ],
    [
      ["x", "u'^2", "v\u2032\u00b2"],
      ["x", "uu", "vv"],
    ],
    [
      ["x", "U", "u'", "v'", "lambda", "L", "eps"],
      ["x", "U", "u_rms", "v_rms", "lambda", "L", "epsilon"],
    ],
    [
      ["x", "q", "se"],
      ["x", "q", "se"],
    ],
    [
      ["time", "TKE"],
      ["t", "q"],
    ],
    [
      ["x", "k", "dissipation"],
      ["x", "q", "epsilon"],
    ],
  ])("%j", (headings, roles) => {
    expect(seen(...headings).roles).toEqual(roles);
    expect(seen(...headings).layout).toBe("profile");
  });
});

describe("a unit in a heading", () => {
  it.each([
    ["u [m/s]", "u", "m/s"],
    ["u (cm/s)", "u", "cm/s"],
    ["u / m/s", "u", "m/s"],
    ["u/(m/s)", "u", "m/s"],
    ["t in ms", "t", "ms"],
    ["time, s", "time", "s"],
    ["x_mm", "x", "mm"],
    ["u_m_s", "u", "m/s"],
    ["uu_m2_s2", "uu", "m2/s2"],
    ["eps_cm2_s3", "eps", "cm2/s3"],
    ["u [furlong]", "u", "furlong"],
    ["u (probe 1)", "u (probe 1)", null],
    ["u_rms", "u_rms", null],
    ["u", "u", null],
    ['"u [m s^-1]"', "u", "m s^-1"],
  ])("%s", (text, name, unit) => expect(parseHeading(text)).toMatchObject({ name, unit }));
});
