// The arrows of DEVELOPERS.md as a check that fails: for each room, all that it may import.
const room = (name, allowed, packages = []) => ({
  name: `${name}-arrows`,
  comment: `${name} may import only: ${[...allowed, ...packages].join(", ") || "nothing"}`,
  severity: "error",
  from: { path: `^src/${name}/` },
  to: {
    pathNot: [
      `^src/${name}/`,
      ...allowed.map((folder) => (folder === "core" ? "^src/core/" : `^src/${folder}/`)),
      ...packages.filter((name) => name !== "node:").map((name) => `node_modules/${name}(/|$)`),
    ],
    // Node's own modules are resolved to bare names such as `fs`: they are told by their kind
    ...(packages.includes("node:") ? { dependencyTypesNot: ["core"] } : {}),
  },
});

/** Inside core: root nouns, then signal, station, decay, compare; each sees only what stands before it. */
const stages = ["signal", "station", "decay", "compare"];
const coreRoot = "^src/core/[^/]+\\.ts$";
const inner = stages.map((stage, i) => ({
  name: `core-${stage}-arrows`,
  comment: `core/${stage} may see the root nouns and ${stages.slice(0, i).join(", ") || "no stage"}`,
  severity: "error",
  from: { path: `^src/core/${stage}/` },
  to: {
    pathNot: [coreRoot, "node_modules/fft\\.js", ...stages.slice(0, i + 1).map((s) => `^src/core/${s}/`)],
  },
}));

export default {
  forbidden: [
    {
      name: "no-circles",
      severity: "error",
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } },
    },
    { name: "unresolved", severity: "error", from: {}, to: { couldNotResolve: true } },
    room("core", [], ["fft\\.js"]),
    {
      name: "core-root-knows-no-stage",
      severity: "error",
      from: { path: coreRoot },
      to: { path: "^src/core/(signal|station|decay|compare)/" },
    },
    ...inner,
    room("read", ["core"], ["papaparse", "@types/papaparse", "fflate"]),
    room("sheet", ["core"], ["valibot"]),
    room("engine", ["core", "read", "sheet"], ["node:"]),
    {
      name: "engine-node-only-in-thread",
      severity: "error",
      from: { path: "^src/engine/", pathNot: "^src/engine/thread[A-Za-z]*\\.ts$" },
      to: { dependencyTypes: ["core"] },
    },
    room("figures", ["core"], ["plotly\\.js", "plotly.js-cartesian-dist-min", "@types/plotly.js"]),
    {
      name: "figures-know-plotly-by-type",
      severity: "error",
      from: { path: "^src/figures/" },
      to: { path: "plotly", dependencyTypesNot: ["type-only"] },
    },
    room("export", ["core", "figures"], ["fflate"]),
    room("batch", ["core", "engine", "sheet", "export"], ["node:"]),
    room(
      "app",
      ["core", "engine", "sheet", "figures", "export"],
      [
        "react",
        "react-dom",
        "zustand",
        "idb",
        "@tanstack/react-virtual",
        "@fontsource",
        "@fontsource-variable",
        "plotly\\.js",
        "plotly.js-cartesian-dist-min",
        "@types/react",
        "@types/react-dom",
        "@types/plotly.js",
        "jspdf",
        "svg2pdf\\.js",
      ],
    ),
    {
      name: "plotly-only-in-app-plot",
      severity: "error",
      from: { path: "^src/", pathNot: "^src/(app/plot|figures)/" },
      to: { path: "plotly" },
    },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "types", "default"] },
  },
};
