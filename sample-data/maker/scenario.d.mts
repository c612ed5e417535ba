export interface Flow {
  readonly name: string;
  readonly x: readonly number[];
  readonly samples: number;
  readonly seed: number;
  step(x: number): number;
}
export const screen: Flow;
export const simulation: Flow;
