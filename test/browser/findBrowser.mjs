// Finds an installed Chromium, Chrome or Edge; on a Debian machine, as root, installs chromium.
import { spawnSync } from "node:child_process";
import { accessSync, constants } from "node:fs";
import { delimiter, join } from "node:path";

const advice =
  "No Chromium-family browser found. Install one (Debian: apt-get install chromium; or Chrome or Edge) or set CHROME_PATH to its executable.";

const names = [
  "chromium",
  "chromium-browser",
  "google-chrome-stable",
  "google-chrome",
  "microsoft-edge-stable",
  "microsoft-edge",
];

const usualPlaces = {
  linux: ["/snap/bin/chromium", "/opt/google/chrome/chrome", "/opt/microsoft/msedge/msedge"],
  darwin: [
    "/Applications/Google Chrome.app/Contents/MacOS/Google Chrome",
    "/Applications/Chromium.app/Contents/MacOS/Chromium",
    "/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge",
  ],
  win32: [process.env.PROGRAMFILES, process.env["PROGRAMFILES(X86)"], process.env.LOCALAPPDATA]
    .filter(Boolean)
    .flatMap((folder) => [
      join(folder, "Google", "Chrome", "Application", "chrome.exe"),
      join(folder, "Microsoft", "Edge", "Application", "msedge.exe"),
    ]),
};

function executable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** The path of a browser, or null. */
export function findBrowser() {
  for (const variable of ["CHROME_PATH", "CHROME_BIN"]) {
    const path = process.env[variable];
    if (!path) continue;
    if (executable(path)) return path;
    console.error(`${variable} is set to ${path}, which cannot be run; looking elsewhere.`);
  }
  const onPath = (process.env.PATH ?? "").split(delimiter).filter(Boolean);
  const candidates = [
    ...names.flatMap((name) => onPath.map((folder) => join(folder, name))),
    ...(usualPlaces[process.platform] ?? []),
  ];
  return candidates.find(executable) ?? null;
}

const apt = (...args) =>
  spawnSync("apt-get", ["-o", "DPkg::Lock::Timeout=600", ...args], {
    stdio: ["ignore", "ignore", "inherit"],
    env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
  }).status === 0;

/** Finds a browser, installing Debian's where that is allowed. */
export function ensureBrowser() {
  const path = findBrowser();
  if (path) return { path, advice };
  const mayInstall =
    process.platform === "linux" && process.getuid?.() === 0 && executable("/usr/bin/apt-get");
  if (!mayInstall) return { path: null, advice };
  console.log("No browser found; installing Debian's chromium.");
  apt("update", "-qq");
  apt("install", "-y", "-qq", "--no-install-recommends", "chromium", "fonts-dejavu-core");
  return { path: findBrowser(), advice };
}
