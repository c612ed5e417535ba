/** Index of a sample of a block, or of those held, among all samples of its probe in the file. */
export type PlaceOf = (i: number) => number;

/** Where samples that are held stand in the file, though some before or between them were left out. */
export class SamplePlaces {
  /** Index of the first held of each run without a gap, and its place in the file. */
  private readonly runs: { readonly at: number; readonly place: number }[] = [];

  /** Samples held from `at` on follow one another in the file from `place` on; what was held there goes. */
  follow(at: number, place: number): void {
    const { runs } = this;
    while (runs.length > 0 && runs[runs.length - 1].at >= at) runs.pop();
    const last = runs.at(-1);
    if (last === undefined || place - last.place !== at - last.at) runs.push({ at, place });
  }

  readonly of: PlaceOf = (i) => {
    const { runs } = this;
    let [low, high] = [0, runs.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (runs[middle].at <= i) low = middle;
      else high = middle - 1;
    }
    const run = runs.at(low);
    return run === undefined ? i : run.place + i - run.at;
  };
}
