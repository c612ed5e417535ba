/**
 * Brands by dimension: a length cannot be passed where a time is asked for.
 * A case is SI or non-dimensional throughout, so the brand names the dimension and not the unit.
 */
declare const dimension: unique symbol;
export type Scalar<D extends string> = number & { readonly [dimension]: D };

export type Time = Scalar<"T">;
export type Length = Scalar<"L">;
export type Speed = Scalar<"L/T">;
export type Viscosity = Scalar<"L²/T">;
export type Dissipation = Scalar<"L²/T³">;

/**
 * Brands a number, checking that it is finite.
 * @throws RangeError a value that is not finite: a bug of the caller, never bad input
 */
export function scalar<D extends string>(value: number): Scalar<D> {
  if (!Number.isFinite(value)) throw new RangeError(`a physical scalar must be finite, found ${value}`);
  return value as Scalar<D>;
}

/** A scalar that must be above zero: a step, a speed, a viscosity. */
export function positive<D extends string>(value: number): Scalar<D> {
  if (!(value > 0)) throw new RangeError(`a positive scalar was expected, found ${value}`);
  return scalar<D>(value);
}
