import { build, preview } from "vite";
import type { TestProject } from "vitest/node";
import { ensureBrowser } from "./findBrowser.mjs";

declare module "vitest" {
  export interface ProvidedContext {
    pageUrl: string;
    browserPath: string;
  }
}

/** Builds the page once, serves it as a user would get it, and names the browser. */
export default async function setup(project: TestProject) {
  const browser = ensureBrowser();
  if (!browser.path) throw new Error(browser.advice);
  // An application build, whatever mode the tests themselves run in.
  process.env.NODE_ENV = "production";
  await build({ configFile: "vite.config.ts", mode: "production", logLevel: "warn" });
  // The batch of the same sources: the page's numbers are held against it.
  await build({ configFile: "vite.config.ts", mode: "batch", logLevel: "warn" });
  const server = await preview({
    configFile: "vite.config.ts",
    mode: "production",
    preview: { port: 0, open: false },
  });
  const address = server.httpServer.address();
  if (address === null || typeof address === "string") throw new Error("the preview server has no port");
  project.provide("pageUrl", `http://localhost:${address.port}/`);
  project.provide("browserPath", browser.path);
  return () => server.close();
}
