import { splineAt, splineSecond } from "../signal/cubicSpline.ts";
import type { ResamplingResponse } from "./resamplingResponse.ts";

/** Samples between which a spline is evaluated, and those either side that steady it. */
const core = 512;
/** A spline forgets what lies so many points away to the last digit: at least by half a point. */
const margin = 48;

/**
 * Puts samples of unequal steps onto equal ones by cubic splines. It works over windows counted from the start of
 * each piece, so that the result does not depend on how the samples were handed in. No value is made outside the
 * first and last sample of a piece.
 */
export class EvenSteps {
  private readonly step: number;
  private readonly emit: (columns: readonly Float64Array[], count: number) => void;
  private readonly response: ResamplingResponse;
  /** Times from the start of the piece, and values. */
  private readonly times = new Float64Array(core + 2 * margin);
  private readonly values: readonly Float64Array[];
  private readonly second = new Float64Array(core + 2 * margin);
  private readonly work = new Float64Array(core + 2 * margin);
  private out: Float64Array[];
  private held = 0;
  /** Index of the first sample whose interval has not been evaluated yet. */
  private todo = 0;
  /** Grid points handed out of this piece. */
  private made = 0;
  private begin = 0;

  /** @param emit  takes the next evenly spaced samples; the arrays are used again */
  constructor(
    step: number,
    components: number,
    response: ResamplingResponse,
    emit: (columns: readonly Float64Array[], count: number) => void,
  ) {
    this.step = step;
    this.emit = emit;
    this.response = response;
    this.values = Array.from({ length: components }, () => new Float64Array(core + 2 * margin));
    this.out = this.values.map(() => new Float64Array(2 * core));
  }

  /** One sample later than all before it in its piece. */
  add(time: number, sample: readonly number[]): void {
    if (this.held === this.times.length) this.evaluate(this.held - margin - 1);
    if (this.held === 0) this.begin = time;
    this.times[this.held] = time - this.begin;
    for (let c = 0; c < sample.length; c++) this.values[c][this.held] = sample[c];
    this.held++;
  }

  /** The newest sample was sent once more. */
  replace(sample: readonly number[]): void {
    for (let c = 0; c < sample.length; c++) this.values[c][this.held - 1] = sample[c];
  }

  /** The piece ends: what is left is handed out, and the next sample begins another. */
  end(): void {
    if (this.held > 1) this.evaluate(this.held - 1);
    else if (this.held === 1) this.emit(this.values, 1);
    this.held = 0;
    this.todo = 0;
    this.made = 0;
  }

  /** Evaluates all intervals up to sample `to`, and forgets what lies far behind it. */
  private evaluate(to: number): void {
    const { times, values, second, work, held, step } = this;
    // the last sample of a piece is a grid point too, whatever rounding says
    const last = to === held - 1 ? times[to] + 1e-6 * step : times[to];
    let end = Math.max(this.made, Math.ceil(last / step));
    if (to === held - 1 && end * step <= last) end++;
    const count = end - this.made;
    if (count > this.out[0].length) this.out = values.map(() => new Float64Array(2 * count));
    values.forEach((y, c) => {
      splineSecond(times, y, held, second, work);
      const out = this.out[c];
      for (let j = 0, i = this.todo; j < count; j++) {
        const place = (this.made + j) * step;
        while (i < to - 1 && times[i + 1] <= place) i++;
        out[j] = splineAt(times, y, second, i, place);
      }
    });
    this.response.look(times, held, this.todo, to, this.made, count);
    if (count > 0) this.emit(this.out, count);
    this.made = end;
    this.forget(to);
  }

  private forget(to: number): void {
    const gone = Math.max(0, to - margin);
    for (const column of [this.times, ...this.values]) column.copyWithin(0, gone, this.held);
    this.held -= gone;
    this.todo = to - gone;
  }
}
