export interface OneDimensionalSpectra {
  readonly k1: Float64Array;
  readonly E11: Float64Array;
  readonly E22: Float64Array;
}
export function oneDimensionalSpectra(
  energy: (kappa: number) => number,
  range: [number, number],
): OneDimensionalSpectra;
export function moment(k1: Float64Array, E: Float64Array, power: number): number;
export function integralScale(k1: Float64Array, E11: Float64Array): number;
