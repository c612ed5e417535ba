import { join } from "node:path";
import { build } from "vite";

/** Builds one TypeScript file and all it imports from src into plain JavaScript for Node, as the batch is built. */
export async function buildBundle(entry, outDir) {
  await build({
    configFile: false,
    logLevel: "warn",
    root: import.meta.dirname,
    publicDir: false,
    ssr: { noExternal: true },
    build: {
      ssr: true,
      target: "node20",
      outDir,
      emptyOutDir: true,
      minify: false,
      rollupOptions: { input: { bundle: entry }, output: { entryFileNames: "[name].mjs" } },
    },
  });
  return join(outDir, "bundle.mjs");
}
