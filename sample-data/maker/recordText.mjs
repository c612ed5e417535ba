/**
 * The text of one record, as a file holds it. Two dialects, so that the sample shows both: whole mm/s without a time,
 * the rate in a comment and the position in the file's name; or m/s with a time in ms and the position in a comment.
 * @param {{ u: Float64Array, v: Float64Array, w: Float64Array }} record m/s
 * @param {{ x: number, step: number }} probe position (m) and time between samples (s)
 */
export function measuredText({ u, v, w }, { step }) {
  const lines = [`# sampling rate = ${Math.round(1 / step) / 1000} kHz`, "u [mm/s],v [mm/s],w [mm/s]"];
  for (let i = 0; i < u.length; i++) lines.push([u[i], v[i], w[i]].map(wholeMillimetres).join(","));
  return `${lines.join("\n")}\n`;
}

export function simulatedText({ u, v, w }, { x, step }) {
  const lines = [`# x = ${x} m`, "t [ms],u [m/s],v [m/s],w [m/s]"];
  for (let i = 0; i < u.length; i++) {
    lines.push(`${(i * step * 1000).toFixed(1)},${[u[i], v[i], w[i]].map(fourDecimals).join(",")}`);
  }
  return `${lines.join("\n")}\n`;
}

/** Statistics of a run, a row each. */
export function profileText(rows) {
  const columns = {
    "x [m]": (row) => String(row.x),
    "U [m/s]": (row) => row.U.toFixed(4),
    "uu [m2/s2]": (row) => row.uu.toPrecision(5),
    "vv [m2/s2]": (row) => row.vv.toPrecision(5),
    "ww [m2/s2]": (row) => row.ww.toPrecision(5),
    "L [mm]": (row) => (row.L11 * 1000).toFixed(2),
    "lambda [mm]": (row) => (row.lambda * 1000).toFixed(3),
    "epsilon [m2/s3]": (row) => row.epsilon.toPrecision(5),
  };
  const lines = rows.map((row) =>
    Object.values(columns)
      .map((text) => text(row))
      .join(","),
  );
  return `${[Object.keys(columns).join(","), ...lines].join("\n")}\n`;
}

// Rounded before it is written: a small negative value must not become "-0".
const wholeMillimetres = (speed) => String(Math.round(speed * 1000) + 0);
const fourDecimals = (speed) => (Math.round(speed * 10000) / 10000 + 0).toFixed(4);
