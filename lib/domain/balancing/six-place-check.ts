import { fail, ok, type Result } from '../result';
import { normaliseDeg } from '../units';

/** Sizes read with a known weight at places evenly round the rotor, the first at `firstDeg`. */
export type SixPlaceRuns = {
  /** In the order of the places, counted against rotation; in one unit. */
  readonly amplitudes: readonly number[];
  /** The known weight as unbalance, g·mm; must be larger than the residual. */
  readonly knownGmm: number;
  readonly firstDeg?: number;
};

/** Residual unbalance from sizes alone. */
export type SixPlaceResult = {
  /** `T·(max − min)/(max + min)`, g·mm. */
  readonly residualGmm: number;
  /** From the sine through all sizes: amplitude over mean, times T, g·mm. */
  readonly fittedGmm: number;
  /** Where the residual unbalance lies, degrees against rotation from the first place's mark. */
  readonly angleDeg: number;
  /** Largest distance of a size from the sine, share of the mean. */
  readonly worstShare: number;
};

const FEWEST = 6;

/**
 * Residual unbalance by a known weight at six places 60° apart (or more, evenly): the size rises where the
 * weight adds to the residual, `residual = T·(max − min)/(max + min)`; a sine through the sizes gives the
 * angle.
 *
 * @returns g·mm and degrees against rotation, or a failure: fewer than six sizes, a size that is not above
 *   zero, a known weight that is not larger than the residual
 * Source: residual unbalance check of compressor specifications (procedure from public text).
 * @example 7.1, 8.9, 9.6, 8.4, 6.3, 5.5 with 9000 g·mm → 2443.7 g·mm
 */
export function sixPlaceCheck(runs: SixPlaceRuns): Result<SixPlaceResult> {
  const { amplitudes, knownGmm, firstDeg = 0 } = runs;
  if (amplitudes.length < FEWEST)
    return fail(
      'too-few-places',
      `The check needs the known weight at ${FEWEST} places or more, and there are ${amplitudes.length}. Run the others too.`,
      'amplitudes',
    );
  if (!(knownGmm > 0))
    return fail(
      'weight-zero',
      'The known weight must make more than 0 g·mm. Weigh it.',
      'knownGmm',
    );
  const bad = amplitudes.findIndex((amplitude) => !(amplitude > 0));
  if (bad >= 0)
    return fail(
      'reading-range',
      `The size at place ${bad + 1} is ${amplitudes[bad]}, and every size must be above zero. Read it again.`,
      `amplitudes.${bad}`,
    );
  const [most, least] = [Math.max(...amplitudes), Math.min(...amplitudes)];
  const sine = sineThrough(amplitudes);
  const fittedGmm = (knownGmm * sine.swing) / sine.mean;
  if (fittedGmm >= knownGmm || sine.swing >= sine.mean)
    return fail(
      'weight-too-small',
      'The known weight is not larger than the residual unbalance, so the sizes cannot tell. Use a heavier one.',
      'knownGmm',
    );
  return ok({
    residualGmm: (knownGmm * (most - least)) / (most + least),
    fittedGmm,
    angleDeg: normaliseDeg(firstDeg + sine.deg),
    worstShare: sine.worst / sine.mean,
  });
}

/** Mean, swing and place of the highest point of the sine through evenly spaced sizes, least squares. */
function sineThrough(sizes: readonly number[]) {
  const count = sizes.length;
  const turn = (2 * Math.PI) / count;
  const mean = sizes.reduce((total, value) => total + value, 0) / count;
  const x = (2 / count) * sizes.reduce((total, value, k) => total + value * Math.cos(k * turn), 0);
  const y = (2 / count) * sizes.reduce((total, value, k) => total + value * Math.sin(k * turn), 0);
  const misses = sizes.map((value, k) =>
    Math.abs(value - mean - x * Math.cos(k * turn) - y * Math.sin(k * turn)),
  );
  const deg = (Math.atan2(y, x) * 180) / Math.PI;
  return { mean, swing: Math.hypot(x, y), deg, worst: Math.max(...misses) };
}
