import { angleDeg, fromPolar, size, sum } from '../complex';
import { fail, ok, type Result } from '../result';
import { normaliseDeg, shortTurnDeg } from '../units';

/** A weight at a radius that all share: grams and degrees against rotation. */
export type AngledMass = { readonly massG: number; readonly angleDeg: number };

/** Closer than this to in line, two positions cannot carry a weight between them. */
const IN_LINE = 1e-9;
/** A share of this size of the whole is rounding, not removal. */
const ROUNDING = 1e-9;

/**
 * Several weights on one radius as one: vector sum.
 * Source: vector sum. Example: 12 g at 40° and 9 g at 155° are 11.56 g at 84.9°.
 */
export function combineMasses(masses: readonly AngledMass[]): AngledMass {
  const total = sum(masses.map((m) => fromPolar(m.massG, m.angleDeg)));
  return { massG: size(total), angleDeg: angleDeg(total) };
}

/**
 * One weight split onto two positions of the same radius:
 * `m₁ = m·sin(a₂ − a)/sin(a₂ − a₁)`, `m₂ = m·sin(a − a₁)/sin(a₂ − a₁)`.
 *
 * @param mass grams and degrees against rotation; `ontoDeg` the two positions, degrees
 * @returns both masses in g, or a failure where the weight lies outside the positions (one share
 *   would be negative) or the positions are at one place or opposite
 * Source: law of sines. @example 30 g at 100° onto 80° and 140° → 22.27 and 11.85 g
 */
export function splitMass(
  mass: AngledMass,
  ontoDeg: readonly [number, number],
): Result<[AngledMass, AngledMass]> {
  const [first, second] = ontoDeg;
  const between = Math.sin(radians(shortTurnDeg(first, second)));
  if (Math.abs(between) < IN_LINE)
    return fail(
      'in-line',
      `Positions at ${show(first)} and ${show(second)} lie in one line through the shaft, so they cannot carry a weight between them. Choose two others.`,
    );
  const shares = [
    (mass.massG * Math.sin(radians(second - mass.angleDeg))) / between,
    (mass.massG * Math.sin(radians(mass.angleDeg - first))) / between,
  ].map((share) => (Math.abs(share) < ROUNDING * mass.massG ? 0 : share));
  const [a = 0, b = 0] = shares;
  if (a < 0 || b < 0)
    return fail(
      'outside',
      `${show(mass.angleDeg)} does not lie between ${show(first)} and ${show(second)}: one position would need ${Math.min(a, b).toFixed(1)} g, less than nothing. Choose the two positions on either side.`,
    );
  return ok([
    { massG: a, angleDeg: first },
    { massG: b, angleDeg: second },
  ]);
}

/**
 * The mass at another radius with the same unbalance: `m₂ = m₁·r₁/r₂`, g.
 * Source: definition. Example: 30 g at 400 mm is 34.09 g at 352 mm.
 */
export function massAtRadiusG(massG: number, fromRadiusMm: number, toRadiusMm: number): number {
  return (massG * fromRadiusMm) / toRadiusMm;
}

/**
 * Places of two equal sliding weights in a ring that together make an unbalance: half-angle
 * `acos(|C|/(2·m·r))` either side of it. For no effect they stand 180° apart.
 *
 * @param wanted unbalance, g·mm, and degrees against rotation
 * @param each one sliding weight: g and radius in mm
 * @returns the two angles, or a failure where the pair cannot make so much
 * Source: geometry. @example 8000 g·mm at 90° with two of 10 g at 400 mm → both at 90°
 */
export function slidingPair(
  wanted: { readonly unbalanceGmm: number; readonly angleDeg: number },
  each: { readonly massG: number; readonly radiusMm: number },
): Result<[number, number]> {
  const most = 2 * each.massG * each.radiusMm;
  if (!(most > 0) || wanted.unbalanceGmm > most * (1 + ROUNDING))
    return fail(
      'too-light',
      `Two sliding weights of ${each.massG} g make ${most.toFixed(0)} g·mm at most, and ${wanted.unbalanceGmm.toFixed(0)} g·mm are wanted. Use heavier ones.`,
    );
  const half = (Math.acos(Math.min(1, wanted.unbalanceGmm / most)) * 180) / Math.PI;
  return ok([normaliseDeg(wanted.angleDeg - half), normaliseDeg(wanted.angleDeg + half)]);
}

function radians(deg: number): number {
  return (deg * Math.PI) / 180;
}

function show(deg: number): string {
  return `${Number(deg.toFixed(1))}°`;
}
