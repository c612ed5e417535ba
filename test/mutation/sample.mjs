import { createHash } from "node:crypto";

export const notDrawn = "not drawn";

/** The same mutant is drawn or not whatever else is in the run: the draw is a hash of the seed and the mutant. */
export class Sample {
  constructor() {
    this.share = Number(process.env.MUTATION_SHARE ?? "1");
    this.seed = process.env.MUTATION_SEED ?? "1";
  }
  init() {}
  group(mutants) {
    return [mutants.map(({ id }) => id)];
  }
  check(mutants) {
    return Object.fromEntries(
      mutants.map((mutant) => [
        mutant.id,
        this.draws(mutant) ? { status: "passed" } : { status: "compileError", reason: notDrawn },
      ]),
    );
  }
  draws({ fileName, mutatorName, replacement, location: { start, end } }) {
    const place = [start.line, start.column, end.line, end.column].join(":");
    const name = fileName.split(/[\\/]/).slice(-2).join("/");
    const hash = createHash("sha256").update(`${this.seed}|${name}|${place}|${mutatorName}|${replacement}`);
    return hash.digest().readUInt32BE(0) / 2 ** 32 < this.share;
  }
}
