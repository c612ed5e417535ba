import { createHash } from "node:crypto";
import { cpSync, createReadStream, existsSync, readdirSync, readFileSync, statSync } from "node:fs";
import { extname, join, relative, resolve } from "node:path";
import react from "@vitejs/plugin-react";
import type { Plugin } from "vite";
import { defineConfig } from "vitest/config";

const top = import.meta.dirname;
const samples = resolve(top, "sample-data");

/**
 * Nothing but the page's own files. The hash of `style-src` is that of the one empty style element Plotly makes;
 * those of `style-src-attr` are the three style attributes it sets in a figure's text: `font-style:italic`,
 * `font-size:70%` and `font-weight:bold`. Any other is refused.
 */
const contentSecurityPolicy = [
  "default-src 'none'",
  "script-src 'self'",
  "worker-src 'self'",
  "style-src 'self' 'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='",
  "style-src-attr 'unsafe-hashes' 'sha256-r8zR3S6YuWY5tpo2Y0PvZHW5fa+SKLNon9zbEWb5UPA=' 'sha256-S+l+cz1wXqs2B0FcjqqT7NvjwGmhD1UjJswXjlSkj0s=' 'sha256-wkY2X5hecQzbhnFCqvTpwrUJ1f4X8LH5WFjYUzv1wmU='",
  "img-src 'self' data: blob:",
  "font-src 'self' data:",
  "connect-src 'self'",
  "manifest-src 'self'",
  "base-uri 'none'",
  "form-action 'none'",
].join("; ");

/** The policy as a meta tag, at build only: the development server needs inline scripts. */
function policyTag(): Plugin {
  return {
    name: "policy-tag",
    apply: "build",
    transformIndexHtml: () => [
      {
        tag: "meta",
        attrs: { "http-equiv": "Content-Security-Policy", content: contentSecurityPolicy },
        injectTo: "head-prepend",
      },
    ],
  };
}

const isDemoFile = (name: string) => [".csv", ".json"].includes(extname(name)) && !name.startsWith("truth");

/** The simulation once more, as lines: for whoever wants lines to try, and not a fourth case of the demo. */
const isOfLines = (name: string) => name.startsWith("simulation-lines");

/** Every demo file below sample-data, as paths relative to it. */
function demoFiles(folder = samples): string[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder)
    .sort()
    .filter((name) => !isOfLines(name))
    .flatMap((name) => {
      const path = join(folder, name);
      if (statSync(path).isDirectory()) return demoFiles(path);
      return isDemoFile(name) ? [relative(samples, path).split("\\").join("/")] : [];
    });
}

/** The demo is the sample data itself: served in development, copied beside the page in a build. */
function demoData(): Plugin {
  let outDir = "";
  return {
    name: "demo-data",
    configResolved: (config) => {
      outDir = resolve(config.root, config.build.outDir);
    },
    configureServer: (server) => {
      server.middlewares.use("/demo", (request, response, next) => {
        const path = decodeURIComponent((request.url ?? "/").split("?")[0].slice(1));
        if (path === "files.json") return void response.end(JSON.stringify(demoFiles()));
        if (!demoFiles().includes(path)) return next();
        createReadStream(join(samples, path)).pipe(response);
      });
    },
    generateBundle() {
      this.emitFile({ type: "asset", fileName: "demo/files.json", source: JSON.stringify(demoFiles()) });
    },
    writeBundle: () => {
      for (const path of demoFiles()) cpSync(join(samples, path), join(outDir, "demo", path));
    },
  };
}

/** The worker that keeps a copy of the page, told of all files the page is made of; the demo's records are not. */
function offlineCopy(): Plugin {
  return {
    name: "offline-copy",
    apply: "build",
    generateBundle: {
      order: "post",
      handler(_, bundle) {
        const made = Object.values(bundle).filter(({ fileName }) => !fileName.startsWith("demo/"));
        const hash = createHash("sha256");
        for (const each of made) hash.update(each.fileName).update("code" in each ? each.code : each.source);
        const fixed = ["./", "icon.svg", "manifest.webmanifest"];
        const files = [
          ...fixed,
          ...made.map(({ fileName }) => fileName).filter((name) => name !== "index.html"),
        ];
        const copy = { version: hash.digest("hex").slice(0, 16), files };
        const worker = readFileSync(resolve(top, "src/app/offline/offlineWorker.js"), "utf8");
        this.emitFile({
          type: "asset",
          fileName: "offline.js",
          source: `const copy = ${JSON.stringify(copy)};\n${worker}`,
        });
      },
    },
  };
}

const tests = {
  projects: [
    {
      extends: true as const,
      test: {
        name: "unit",
        environment: "node",
        include: ["../../test/**/*.test.ts"],
        exclude: ["../../test/browser/**"],
        testTimeout: 60_000,
      },
    },
    {
      extends: true as const,
      test: {
        name: "component",
        environment: "happy-dom",
        include: ["../../test/app/**/*.test.tsx"],
        setupFiles: ["../../test/app/setup.ts"],
        testTimeout: 60_000,
      },
    },
    {
      extends: true as const,
      test: {
        name: "browser",
        environment: "node",
        include: ["../../test/browser/**/*.test.ts"],
        globalSetup: ["../../test/browser/setup.ts"],
        fileParallelism: false,
        testTimeout: 120_000,
        hookTimeout: 120_000,
      },
    },
  ],
};

export default defineConfig(({ mode }) => {
  if (mode === "batch") {
    return {
      root: resolve(top, "src/batch"),
      publicDir: false,
      ssr: { noExternal: true },
      build: {
        ssr: true,
        target: "node20",
        outDir: resolve(top, "dist-batch"),
        emptyOutDir: true,
        minify: false,
        rollupOptions: {
          input: { main: resolve(top, "src/batch/main.ts"), thread: resolve(top, "src/engine/thread.ts") },
          output: { entryFileNames: "[name].js" },
        },
      },
    };
  }
  return {
    root: resolve(top, "src/app"),
    base: "./",
    cacheDir: resolve(top, "node_modules/.vite"),
    publicDir: resolve(top, "public"),
    plugins: [react(), policyTag(), demoData(), offlineCopy()],
    worker: { format: "es" },
    build: {
      target: "es2022",
      outDir: resolve(top, "dist"),
      emptyOutDir: true,
      chunkSizeWarningLimit: 1700,
      assetsInlineLimit: 0,
      rollupOptions: { checks: { pluginTimings: false } },
    },
    preview: { headers: { "Content-Security-Policy": contentSecurityPolicy } },
    test: tests,
  };
});
