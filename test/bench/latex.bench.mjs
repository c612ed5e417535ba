// All that the program writes for LaTeX, compiled by a plain TeX (Debian's texlive, installed where that is allowed).
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";

export const title = "Tables, methods text and sources of the demo through pdflatex and BibTeX";

export async function run(tools) {
  if (!hasTex()) return void console.log("pdflatex is not to be had here.");
  const folder = join(tools.generated, "latex");
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  const made = await tools.measured(process.execPath, [await tools.bundle("texDocument")], {
    folder: tools.top,
  });
  if (made.code !== 0) throw new Error(`the bundle failed: ${made.errors}`);
  const { tex, bib } = JSON.parse(made.out);
  writeFileSync(join(folder, "paper.tex"), tex);
  writeFileSync(join(folder, "sources.bib"), bib);
  const step = (command, ...args) => spawnSync(command, args, { cwd: folder, encoding: "utf8" });
  const latex = () => step("pdflatex", "-interaction=nonstopmode", "-halt-on-error", "paper.tex");
  const ends = [latex(), step("bibtex", "paper"), latex(), latex()].map(({ status }) => status);
  const log = readFileSync(join(folder, "paper.log"), "utf8");
  const warnings = log.match(/^(! |Overfull|LaTeX Warning|Missing character).*/gm) ?? [];
  console.log(ends.every((status) => status === 0) ? "compiled" : `NOT COMPILED (${ends.join(", ")})`);
  for (const warning of warnings) console.log(`  ${warning}`);
}

function hasTex() {
  const there = () => spawnSync("pdflatex", ["--version"]).status === 0;
  if (there()) return true;
  if (process.getuid?.() !== 0 || !existsSync("/usr/bin/apt-get")) return false;
  const packages = ["texlive-latex-base", "texlive-latex-recommended"];
  spawnSync("apt-get", ["update", "-qq"]);
  spawnSync("apt-get", ["install", "-y", "-qq", "--no-install-recommends", ...packages], {
    env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
  });
  return there();
}
