import { readdirSync } from "node:fs";
import { dirname, join, relative } from "node:path";
import { pathToFileURL } from "node:url";
import { build } from "vite";

/** Every test file below test/<folder>, relative to here, but those whose path holds one of the words. */
export function testsOf(folders, without) {
  const found = folders.flatMap((folder) =>
    readdirSync(join("test", folder), { withFileTypes: true, recursive: true })
      .filter((entry) => entry.isFile() && entry.name.endsWith(".test.ts"))
      .map((entry) => relative(".", join(entry.parentPath, entry.name)).split("\\").join("/"))
      .sort(),
  );
  return found.filter((file) => !without.some((word) => word !== "" && file.includes(word)));
}

/** One test file and all of ours that it imports, as the text of one CommonJS module that can be run again and again. */
export async function bundleTest(file) {
  const { output } = await build({
    configFile: false,
    logLevel: "error",
    publicDir: false,
    plugins: [ownPlaces],
    build: {
      ssr: file,
      target: "node20",
      write: false,
      minify: false,
      rollupOptions: { treeshake: false, output: { format: "cjs", codeSplitting: false } },
    },
  });
  return output[0].code;
}

/** In one module a file still finds what lies beside it. */
const ownPlaces = {
  name: "own-places",
  enforce: "pre",
  transform: (code, id) => {
    if (id.includes("node_modules") || id.endsWith(".json")) return null;
    return code
      .replaceAll("import.meta.url", JSON.stringify(pathToFileURL(id).href))
      .replaceAll("import.meta.dirname", JSON.stringify(dirname(id)));
  },
};
