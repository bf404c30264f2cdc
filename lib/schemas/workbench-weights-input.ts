import { z } from 'zod';
import { optionalNumber, typedNumber } from './number';
import { choice, degrees, grams, numbering, radius, rotation } from './workbench-parts';

export const trialWeightInput = z
  .strictObject({
    radiusMm: radius('the radius of the trial weight'),
    speedRpm: typedNumber({ what: 'the speed', unit: 'r/min', above: 0, max: 200_000 }),
    rotorMassKg: typedNumber({ what: 'the rotor mass', unit: 'kg', above: 0, max: 1e6 }),
    planes: choice(['one', 'two'], 'Say whether one or two planes are balanced.'),
    planeLimitG: optionalNumber({ what: 'the most in the plane', unit: 'g', above: 0 }),
    amplitudeNow: optionalNumber({ what: 'the 1x reading now', above: 0 }),
    perKgMm: optionalNumber({ what: 'the size of a known coefficient, per kg·mm', above: 0 }),
  })
  .superRefine(({ amplitudeNow, perKgMm }, context) => {
    if ((amplitudeNow === null) === (perKgMm === null)) return;
    context.addIssue({
      code: 'custom',
      path: [amplitudeNow === null ? 'amplitudeNow' : 'perKgMm'],
      message: 'A known coefficient needs the reading now, and the reading needs the coefficient.',
    });
  });

export const withoutPhaseInput = z.strictObject({
  unit: choice(['mm/s rms', 'µm p-p'], 'Choose what the 1x sizes are read in.'),
  angleSense: numbering,
  rotationFromDriveEnd: rotation,
  radiusMm: radius('the radius of the trial weight'),
  trialMassG: grams('the trial weight'),
  baseAmplitude: typedNumber({ what: 'the size of the base run', above: 0, max: 1e6 }),
  runs: z
    .array(
      z.strictObject({
        angleDeg: degrees('the place of the trial weight'),
        amplitude: typedNumber({ what: 'the size of this run', min: 0, max: 1e6 }),
      }),
    )
    .min(3, 'Type the sizes at three positions or more: two have two mirror answers.')
    .max(24),
});

export const sixPlacesInput = z.strictObject({
  angleSense: numbering,
  firstDeg: degrees('the angle of the first place'),
  massG: grams('the known weight'),
  radiusMm: radius('its radius'),
  amplitudes: z
    .array(typedNumber({ what: 'the size at this place', min: 0, max: 1e6 }))
    .min(6, 'Type the sizes at six places or more.')
    .max(24),
});

export const piecesInput = z.strictObject({
  massG: grams('the weight'),
  angleDeg: degrees('the angle of the weight'),
  radiusMm: radius('the radius'),
  angleSense: numbering,
  rotationFromDriveEnd: rotation,
  positions: typedNumber({ what: 'the number of positions', min: 3, max: 24 }).pipe(
    z.int({ error: 'The number of positions is a whole number.' }),
  ),
  firstDeg: degrees('the angle of position 1'),
  numbered: choice(
    ['against', 'with'],
    'Say which way the positions are numbered: against or with rotation.',
  ),
  pieceG: typedNumber({ what: 'the piece', unit: 'g', min: 0.1, max: 1e6 }),
  maxG: optionalNumber({ what: 'the most on one position', unit: 'g', above: 0 }),
  mayRemainGmm: typedNumber({ what: 'what may remain', unit: 'g·mm', min: 0 }),
});

export const combineInput = z.strictObject({
  angleSense: numbering,
  toRadiusMm: radius('the radius of the one weight'),
  weights: z
    .array(
      z.strictObject({
        massG: grams('this weight'),
        radiusMm: radius('its radius'),
        angleDeg: degrees('its angle'),
      }),
    )
    .min(1, 'Type at least one weight.')
    .max(50),
});

const vector = z.strictObject({
  size: typedNumber({ what: 'the size', min: 0 }),
  phaseDeg: degrees('the phase'),
});

const coefficient = z.strictObject({
  perKgMm: typedNumber({ what: 'the size of the coefficient, per kg·mm', min: 0 }),
  turnDeg: degrees('the turn of the coefficient'),
});

/** Any number of planes, points and speeds: one row for every point at every speed. */
export const solveRowsInput = z
  .strictObject({
    unit: choice(['mm/s rms', 'µm p-p'], 'Choose what the 1x sizes are read in.'),
    phaseSense: choice(['lag', 'lead'], 'Say whether phases and turns are lag or lead.'),
    planes: z
      .array(
        z.strictObject({
          name: z.string().trim().min(1).max(40),
          limitGmm: optionalNumber({ what: 'the limit of the plane', unit: 'g·mm', above: 0 }),
        }),
      )
      .min(1)
      .max(12),
    rows: z
      .array(
        z.strictObject({
          label: z.string().trim().min(1).max(40),
          /** The row is multiplied by it; 1 where it is left out. */
          weight: typedNumber({ what: 'the weight of the row', above: 0 }).default(1),
          now: vector,
          coefficients: z.array(coefficient),
        }),
      )
      .min(1)
      .max(200),
  })
  .superRefine(({ planes, rows }, context) => {
    for (const [index, { label, coefficients }] of rows.entries()) {
      if (coefficients.length === planes.length) continue;
      context.addIssue({
        code: 'custom',
        path: ['rows', index, 'coefficients'],
        message: `Row ${label} has ${coefficients.length} coefficients, and there are ${planes.length} planes.`,
      });
    }
  });
