import { describe, expect, it } from "vitest";
import { progressLine } from "../../src/batch/progressLine.ts";

function told() {
  const lines: string[] = [];
  let now = 0;
  const line = progressLine(
    (text) => lines.push(text),
    () => now,
  );
  return { line, lines, wait: (ms: number) => (now += ms) };
}

describe("the progress of the batch", () => {
  it("is told at most once a second and once at the end", () => {
    const { line, lines, wait } = told();
    line.expect(2, 2e6);
    line.read(1e5);
    wait(1500);
    line.read(9e5);
    line.read(1);
    line.fileDone();
    line.fileDone();
    expect(lines).toEqual(["0 of 2 files done, 50 % of 2.0 MB", "2 of 2 files done, 100 % of 2.0 MB"]);
  });

  it("does not promise the whole before the last file is done", () => {
    const { line, lines, wait } = told();
    line.expect(2, 1e8);
    line.read(1e8);
    wait(2000);
    line.fileDone();
    expect(lines).toEqual(["1 of 2 files done, 99 % of 100 MB"]);
  });
});
