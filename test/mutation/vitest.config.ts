import { resolve } from "node:path";
import { defineConfig } from "vitest/config";
import { CollectionFailures } from "./collectionFailures.ts";

/** The unit tests of the folders that run.mjs names, from a copy of the tree: no page, no browser. */
const folders = (process.env.MUTATION_TESTS ?? "core/signal").split(",");

export default defineConfig({
  root: resolve(import.meta.dirname, "../.."),
  test: {
    environment: "node",
    include: folders.map((folder) => `test/${folder}/**/*.test.ts`),
    testTimeout: 60_000,
    reporters: [new CollectionFailures()],
  },
});
