import { fail, ok, type Result } from '../result';

/** What one typed unit is in the unit of its quantity's kind. */
const IN_KEPT_UNIT = {
  'mm/s rms': { kept: 'mm/s rms', factor: 1 },
  'mm/s pk': { kept: 'mm/s rms', factor: Math.SQRT1_2 },
  'in/s pk': { kept: 'mm/s rms', factor: 25.4 * Math.SQRT1_2 },
  'µm p-p': { kept: 'µm p-p', factor: 1 },
  'mil p-p': { kept: 'µm p-p', factor: 25.4 },
} as const;

/**
 * A typed 1x size in the unit a job keeps. Peak to rms is ÷√2, which holds for the 1x component
 * because it is one sinusoid; velocity and displacement are never mixed inside a job.
 *
 * @param amplitude size as typed, in `typed`
 * @returns the size in `kept`, or `unit` where the two are different quantities
 * @example convertOneX(0.3, 'in/s pk', 'mm/s rms') is 5.388 mm/s rms within 0.001
 * Source: definition of rms and peak of a sinusoid; 1 in = 25.4 mm (exact).
 */
export function convertOneX(
  amplitude: number,
  typed: keyof typeof IN_KEPT_UNIT,
  kept: 'mm/s rms' | 'µm p-p',
): Result<number> {
  const unit = IN_KEPT_UNIT[typed];
  if (unit.kept !== kept)
    return fail(
      'unit',
      `${typed} cannot be used in a job kept in ${kept}: one job, one quantity.`,
      'unit',
    );
  return ok(amplitude * unit.factor);
}
