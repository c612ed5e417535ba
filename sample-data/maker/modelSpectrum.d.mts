export interface ModelSpectrum {
  readonly cL: number;
  readonly cEta: number;
  readonly L: number;
  readonly eta: number;
  readonly range: [number, number];
  energy(kappa: number): number;
}
export function solvedModelSpectrum(wanted: { k: number; epsilon: number; viscosity: number }): ModelSpectrum;
