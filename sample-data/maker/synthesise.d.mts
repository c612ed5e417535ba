export interface Spectra {
  readonly k1: Float64Array;
  readonly E11: Float64Array;
  readonly E22: Float64Array;
  readonly E33?: Float64Array;
}
export interface SynthesisedRecord {
  readonly u: Float64Array;
  readonly v: Float64Array;
  readonly w: Float64Array;
}
export interface RecordWish {
  readonly U: number;
  readonly step: number;
  readonly samples: number;
  readonly seed: number;
  readonly skewness?: number;
}
/** SI; lambda is the transverse microscale, gradient is <(∂u/∂x)²>. */
export interface IsotropicTruth {
  readonly U: number;
  readonly uu: number;
  readonly vv: number;
  readonly ww: number;
  readonly k: number;
  readonly L11: number;
  readonly T_int: number;
  readonly gradient: number;
  readonly lambda: number;
  readonly epsilon: number;
  readonly eta: number;
  readonly Re_lambda: number;
  readonly S_dudx: number;
  readonly E11_0: number;
  readonly cL: number;
  readonly cEta: number;
}
export function synthesiseRecord(wish: RecordWish & { readonly spectra: Spectra }): SynthesisedRecord;
export function isotropicRecord(
  wish: RecordWish & { readonly k: number; readonly epsilon: number; readonly viscosity: number },
): SynthesisedRecord & { readonly truth: IsotropicTruth };
