import { z } from 'zod';
import { optionalNumber, typedNumber } from './number';
import { choice, degrees, numbering, rotation } from './workbench-parts';

const reading = z.strictObject({
  amplitude: typedNumber({ what: 'the 1x size', min: 0, max: 1e6 }),
  phaseDeg: degrees('the phase'),
});

const trial = z.strictObject({
  massG: typedNumber({ what: 'the trial weight', unit: 'g', above: 0, max: 1e6 }),
  radiusMm: typedNumber({ what: 'its radius', unit: 'mm', above: 0, max: 20_000 }),
  angleDeg: degrees('the angle of the trial weight'),
  stays: choice(
    ['taken off', 'stays on'],
    'Say whether the trial weight is taken off after its run or stays on the rotor.',
  ),
  readings: z.array(reading),
});

const plane = z.strictObject({
  radiusMm: typedNumber({
    what: 'the radius of the correction',
    unit: 'mm',
    above: 0,
    max: 20_000,
  }),
});

/** Runs typed on one page: base, then one trial a plane. */
export const typedRunsInput = z
  .strictObject({
    unit: choice(['mm/s rms', 'µm p-p'], 'Choose what the 1x sizes are read in.'),
    phaseSense: choice(
      ['lag', 'lead'],
      'Say whether your instrument shows phase as lag or as lead.',
    ),
    angleSense: numbering,
    rotationFromDriveEnd: rotation,
    speedRpm: typedNumber({ what: 'the speed', unit: 'r/min', above: 0, max: 200_000 }),
    rotorMassKg: optionalNumber({ what: 'the rotor mass', unit: 'kg', above: 0 }),
    scatter: optionalNumber({ what: 'the scatter of one reading', above: 0, max: 1e6 }),
    planes: z.array(plane).min(1).max(2),
    base: z.array(reading),
    trials: z.array(trial),
  })
  .superRefine(({ planes, base, trials }, context) => {
    const wanted = planes.length;
    if (base.length > 0 && base.every(({ amplitude }) => amplitude === 0))
      context.addIssue({
        code: 'custom',
        path: ['base', 0, 'amplitude'],
        message: 'The base run reads zero at every point, so there is nothing to correct.',
      });
    if (base.length === wanted && trials.length === wanted && trials.every(isWhole)) return;
    const message = 'Type a reading of every point in every run, and one trial a plane.';
    context.addIssue({ code: 'custom', message });
    function isWhole({ readings }: { readings: readonly unknown[] }) {
      return readings.length === wanted;
    }
  });

export const toleranceInput = z
  .strictObject({
    gradeMmS: typedNumber({ what: 'the balance quality grade G', unit: 'mm/s', above: 0 }),
    massKg: typedNumber({ what: 'the rotor mass', unit: 'kg', above: 0 }),
    speedRpm: typedNumber({ what: 'the highest service speed', unit: 'r/min', above: 0 }),
    apartM: optionalNumber({ what: 'the distance between the bearings', unit: 'm', above: 0 }),
    massCentreFromAM: optionalNumber({
      what: 'the place of the mass centre, from bearing A',
      unit: 'm',
    }),
    residualAGmm: optionalNumber({ what: 'the residual at A', unit: 'g·mm', min: 0 }),
    residualBGmm: optionalNumber({ what: 'the residual at B', unit: 'g·mm', min: 0 }),
  })
  .superRefine(({ apartM, massCentreFromAM, residualAGmm, residualBGmm }, context) => {
    const missing = (field: string, message: string) => {
      context.addIssue({ code: 'custom', path: [field], message });
    };
    if (apartM !== null && massCentreFromAM === null)
      missing('massCentreFromAM', 'Write where the mass centre lies, in m from bearing A.');
    if (apartM === null && massCentreFromAM !== null)
      missing('apartM', 'Write the distance between the bearings in m.');
    if (apartM === null && (residualAGmm !== null || residualBGmm !== null))
      missing('apartM', 'To judge a residual at a bearing, write where the bearings are.');
  });

export const splitInput = z.strictObject({
  massG: typedNumber({ what: 'the weight', unit: 'g', above: 0, max: 1e6 }),
  angleDeg: degrees('the angle of the weight'),
  radiusMm: typedNumber({ what: 'the radius', unit: 'mm', above: 0, max: 20_000 }),
  angleSense: numbering,
  rotationFromDriveEnd: rotation,
  positions: typedNumber({ what: 'the number of positions', min: 3, max: 360 }).pipe(
    z.int({ error: 'The number of positions is a whole number.' }),
  ),
  firstDeg: degrees('the angle of position 1'),
  numbered: choice(
    ['against', 'with'],
    'Say which way the positions are numbered: against or with rotation.',
  ),
  maxG: optionalNumber({ what: 'the most on one position', unit: 'g', above: 0 }),
  speedRpm: optionalNumber({ what: 'the speed', unit: 'r/min', above: 0, max: 200_000 }),
});
