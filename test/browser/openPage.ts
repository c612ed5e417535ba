import { type Browser, type BrowserContext, chromium, type Page } from "playwright-core";
import { inject } from "vitest";

/** Switches that keep a headless browser quiet and off the network. */
const quiet = [
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

export interface OpenPage {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Console errors, page errors and requests to any other host, in order: must stay empty. */
  readonly complaints: string[];
}

export function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: inject("browserPath"), chromiumSandbox: false, args: quiet });
}

/** A fresh page on the built app, listening for every complaint from the first request on. */
export async function openPage(
  browser: Browser,
  options: { width?: number; height?: number; dark?: boolean } = {},
): Promise<OpenPage> {
  const context = await browser.newContext({
    viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
    colorScheme: options.dark ? "dark" : "light",
    acceptDownloads: true,
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  const home = new URL(inject("pageUrl"));
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(`console: ${message.text()}`);
  });
  page.on("pageerror", (error) => complaints.push(`page: ${error.message}`));
  page.on("request", (request) => {
    const url = new URL(request.url());
    if (!["blob:", "data:"].includes(url.protocol) && url.host !== home.host)
      complaints.push(`request: ${url.href}`);
  });
  await page.goto(home.href);
  // a drop is heard once the page stands, which it does when what was kept is there
  await page.locator("main").waitFor();
  return { page, context, complaints };
}
