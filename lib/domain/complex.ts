/**
 * A plane vector as a complex number. Vibration: `V = A·e^{+jφ}`, φ the lag; unbalance:
 * `U = m·r·e^{+jα}`, α the rotor angle against rotation. With these signs `V = V₀ + H·U`.
 */
export type Complex = { readonly re: number; readonly im: number };

/** The zero vector. */
export const ZERO: Complex = { re: 0, im: 0 };

/** From size and angle in degrees. Example: `fromPolar(2, 90)` is `{ re: 0, im: 2 }` within rounding. */
export function fromPolar(size: number, deg: number): Complex {
  const angle = (deg * Math.PI) / 180;
  return { re: size * Math.cos(angle), im: size * Math.sin(angle) };
}

/** Size of the vector, never negative. */
export function size(z: Complex): number {
  return Math.hypot(z.re, z.im);
}

/** Angle of the vector in degrees, [0, 360); 0 for the zero vector. */
export function angleDeg(z: Complex): number {
  const deg = (Math.atan2(z.im, z.re) * 180) / Math.PI;
  const turned = deg < 0 ? deg + 360 : deg;
  // + 0 makes −0 of an exactly real vector 0, which JSON would do anyway.
  return turned >= 360 ? 0 : turned + 0;
}

/** Sum. */
export function add(a: Complex, b: Complex): Complex {
  return { re: a.re + b.re, im: a.im + b.im };
}

/** Difference `a − b`. */
export function subtract(a: Complex, b: Complex): Complex {
  return { re: a.re - b.re, im: a.im - b.im };
}

/** Product. */
export function multiply(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

/** Quotient `a / b`; the caller makes sure that `b` is not zero. */
export function divide(a: Complex, b: Complex): Complex {
  const d = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / d, im: (a.im * b.re - a.re * b.im) / d };
}

/** The vector times a real factor. */
export function scale(z: Complex, factor: number): Complex {
  return { re: z.re * factor, im: z.im * factor };
}

/** Sum of any number of vectors. */
export function sum(vectors: readonly Complex[]): Complex {
  return vectors.reduce(add, ZERO);
}
