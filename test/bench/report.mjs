import { spawn } from "node:child_process";
import { readFileSync } from "node:fs";
import { performance } from "node:perf_hooks";

/**
 * Runs a program to its end: what it wrote, wall seconds, and the peak of its resident memory where the system tells
 * (Linux; read from /proc while it runs).
 */
export function measured(command, args, { environment = {}, folder } = {}) {
  return new Promise((resolve) => {
    const start = performance.now();
    let peakMB = null;
    const child = spawn(command, args, { cwd: folder, env: { ...process.env, ...environment } });
    let out = "";
    let errors = "";
    child.stdout.on("data", (text) => {
      out += text;
    });
    child.stderr.on("data", (text) => {
      errors += text;
    });
    const watch = setInterval(() => {
      peakMB = peakOf(child.pid) ?? peakMB;
    }, 20);
    const end = (code, message = errors) => {
      clearInterval(watch);
      resolve({ code, out, errors: message, seconds: (performance.now() - start) / 1000, peakMB });
    };
    child.on("error", (error) => end(-1, error.message));
    child.on("close", (code) => end(code));
  });
}

function peakOf(pid) {
  try {
    const found = /VmHWM:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, "utf8"));
    return found ? Number(found[1]) / 1024 : null;
  } catch {
    return null; // no /proc here, or the child has just ended
  }
}

/** Rows of texts as an aligned table, a head over them. */
export function table(head, rows) {
  const all = [head, ...rows];
  const widths = head.map((_, i) => Math.max(...all.map((row) => row[i].length)));
  for (const row of all) {
    console.log(
      row.map((cell, i) => (i === 0 ? cell.padEnd(widths[i]) : cell.padStart(widths[i]))).join("  "),
    );
  }
}
