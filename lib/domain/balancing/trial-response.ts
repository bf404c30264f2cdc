import { angleDeg, size, subtract, type Complex } from '../complex';
import { shortTurnDeg } from '../units';

/** What is known of the noise at a point: deviation of one reading and number of repeats behind it. */
export type Noise = { readonly deviation: number; readonly repeats: number };

/** Whether a weight was heard over the scatter. */
export type TrialResponse = {
  readonly changeAmplitude: number;
  readonly changeDeg: number;
  readonly changePct: number;
  /** `deviation·√(1 + 1/k)`; null where no run was repeated and no scatter given. */
  readonly noise: number | null;
  readonly changeOverNoise: number | null;
  readonly verdict: 'refuse' | 'wide' | 'good' | 'unknown';
  /** The change that gives a ratio of 10, in the unit of the readings. */
  readonly neededChange: number | null;
  /** The trade's rule of thumb: size changed by 30 % or lag by 30°, or more. */
  readonly amplitudeChangePct: number;
  readonly lagChangeDeg: number;
  readonly thirtyRule: boolean;
};

const REFUSE_BELOW = 5;
const GOOD_FROM = 10;
const THIRTY = 30;

/**
 * Whether the change from `before` to `after` at one point is large enough to learn from:
 * change/noise below 5 refuse, 5 to 10 wide band, from 10 good, with noise = deviation·√(1 + 1/k) for
 * a mean of k repeats; and the trade's 30 % or 30° rule beside it.
 *
 * @param before mean vector without the weight; `after` the run with it, same unit
 * Source: propagation of reading scatter; 30/30 rule from training literature (from memory).
 * @example S08: deviation 0.154 of four runs, change 0.100 → ratio 0.58, `refuse`
 */
export function trialResponse(before: Complex, after: Complex, noise: Noise | null): TrialResponse {
  const change = subtract(after, before);
  const level = noise && noise.deviation * Math.sqrt(1 + 1 / noise.repeats);
  const ratio = level === null || level === 0 ? null : size(change) / level;
  const amplitudeChangePct = percent(size(after) - size(before), size(before));
  const lagChangeDeg = Math.abs(shortTurnDeg(angleDeg(before), angleDeg(after)));
  return {
    changeAmplitude: size(change),
    changeDeg: angleDeg(change),
    changePct: percent(size(change), size(before)),
    noise: level,
    changeOverNoise: ratio,
    verdict: verdictOf(ratio),
    neededChange: level === null ? null : GOOD_FROM * level,
    amplitudeChangePct,
    lagChangeDeg,
    thirtyRule: atLeast(Math.abs(amplitudeChangePct), THIRTY) || atLeast(lagChangeDeg, THIRTY),
  };
}

function verdictOf(ratio: number | null): TrialResponse['verdict'] {
  if (ratio === null) return 'unknown';
  if (ratio < REFUSE_BELOW) return 'refuse';
  return ratio < GOOD_FROM ? 'wide' : 'good';
}

function percent(part: number, whole: number): number {
  return whole === 0 ? 0 : (100 * part) / whole;
}

/** Polar to rectangular and back costs the last digits; 30 typed as 30 must count as 30. */
function atLeast(value: number, limit: number): boolean {
  return value >= limit - 1e-9;
}
