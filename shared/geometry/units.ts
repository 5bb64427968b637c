declare const unit: unique symbol;
type Unit<U extends string> = number & { readonly [unit]: U };

/** An angle in degrees. Every angle that leaves a function is one of these two. */
export type Degrees = Unit<'degrees'>;
/** An angle in radians; only inside formulas. */
export type Radians = Unit<'radians'>;
/** A length in the athlete's space. */
export type Millimetres = Unit<'millimetres'>;

export const degrees = (value: number): Degrees => value as Degrees;
export const radians = (value: number): Radians => value as Radians;
export const millimetres = (value: number): Millimetres => value as Millimetres;

export const toDegrees = (angle: Radians): Degrees => degrees((angle * 180) / Math.PI);
export const toRadians = (angle: Degrees): Radians => radians((angle * Math.PI) / 180);

export const clamp = (value: number, low: number, high: number): number =>
  value < low ? low : value > high ? high : value;
