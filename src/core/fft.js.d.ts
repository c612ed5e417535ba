/** fft.js ships no types. Sizes are powers of two above one; complex data are interleaved re, im. */
declare module "fft.js" {
  type Complex = Float64Array | number[];
  export default class FFT {
    constructor(size: number);
    readonly size: number;
    createComplexArray(): number[];
    /** Forward transform of real input; fills the bins 0..size/2 of `out` (length 2 size). */
    realTransform(out: Complex, input: ArrayLike<number>): void;
    /** Fills the upper half of a spectrum from its lower half by conjugate symmetry. */
    completeSpectrum(spectrum: Complex): void;
    transform(out: Complex, input: Complex): void;
    /** Inverse, divided by size. */
    inverseTransform(out: Complex, input: Complex): void;
  }
}
