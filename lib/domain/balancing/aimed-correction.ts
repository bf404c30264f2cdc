import { scale, size, subtract, type Complex } from '../complex';
import { fail, ok, type Result } from '../result';
import type { DriftLine } from '../trends/drift-line';
import { polarUnbalance, type PolarUnbalance } from './weights-ledger';

/** A correction of today's unbalance, and one that aims ahead of the drift. */
export type AimedCorrection = {
  readonly plain: PolarUnbalance;
  readonly aimed: PolarUnbalance;
  /** What the aimed one leaves on purpose, opposite to the drift. */
  readonly leaves: PolarUnbalance;
};

/** Never leave more than this share of the grade's allowance. */
const SHARE_OF_ALLOWANCE = 0.5;

/**
 * A correction aimed ahead of a straight drift: it leaves an unbalance opposite to the drift, so that the
 * rotor drifts through its best state. At most half the grade's allowance is left. For an engineer to
 * decide.
 *
 * @param line drift of the unbalance, g·mm and g·mm a day, against rotation
 * @param now unbalance to correct, g·mm
 * @param allowedGmm permissible residual unbalance of the plane
 * @returns both corrections (what to add), or a failure where the track is not straight enough
 * Source: proposal of this project; ISO 21940-11 for the allowance.
 * @example S18 → plain 32.1 g, aimed 45.6 g at 133.5° on 450 mm, leaving 6077 g·mm at 137.5°
 */
export function aimedCorrection(
  line: DriftLine,
  { now, allowedGmm }: { readonly now: Complex; readonly allowedGmm: number },
): Result<AimedCorrection> {
  if (!line.isForecast)
    return fail(
      'not-straight',
      `The unbalance has not marched straight (straightness ${line.straightness.toFixed(2)} over ${line.readings} readings; above 0.80 over 6 or more is needed), so nothing can be aimed ahead.`,
    );
  const speed = size(line.perDayGmm);
  if (speed === 0 || !(allowedGmm > 0))
    return fail('no-drift', 'There is no drift to aim ahead of, or no grade that says how far.');
  const leaves = scale(line.perDayGmm, (-SHARE_OF_ALLOWANCE * allowedGmm) / speed);
  return ok({
    plain: polarUnbalance(scale(now, -1)),
    aimed: polarUnbalance(subtract(leaves, now)),
    leaves: polarUnbalance(leaves),
  });
}
