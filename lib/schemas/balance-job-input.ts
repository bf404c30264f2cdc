import { z } from 'zod';
import { JOB_KINDS, planesOf } from '@/lib/domain/balance-job/job-kinds';
import { SLIPS } from '@/lib/domain/balance-job/slip-repair';
import { id, optionalNumber, text, tick, typedNumber } from './number';
import { fixingFields } from './photo-input';

const ids = z.preprocess(
  (value: unknown): unknown =>
    Array.isArray(value) ? value : value === undefined || value === '' ? [] : [value],
  z.array(id),
);

/** A choice that must be made: nothing is chosen beforehand. */
const choice = <const Options extends readonly [string, ...string[]]>(
  options: Options,
  message: string,
) => z.enum(options, { error: message });

const mustTick = (message: string) => tick.refine((ticked) => ticked, { error: message });

const namedPerson = (what: string) => text(what, 120);

export const AMPLITUDE_UNITS = ['mm/s rms', 'mm/s pk', 'in/s pk', 'µm p-p', 'mil p-p'] as const;

export const openBalanceJobInput = z
  .object({
    machineId: id,
    kind: choice(JOB_KINDS, 'Say what is to be done: how many planes, or a check only.'),
    planeIds: ids,
    pointIds: ids,
    unit: choice(['mm/s rms', 'µm p-p'], 'Choose what the 1x readings of this job are kept in.'),
    phaseSense: choice(
      ['lag', 'lead'],
      'Say whether your instrument shows phase as lag or as lead.',
    ),
    angleSense: choice(
      ['against', 'with'],
      'Say which way you count degrees on this rotor: against or with rotation.',
    ),
    reason: text('why this rotor is balanced', 1000),
    targetOneX: optionalNumber({ what: 'the 1x target', above: 0 }),
    targetZone: z.enum(['A', 'B', '']).default(''),
    gradeTarget: tick,
    startsAllowed: optionalNumber({ what: 'the number of starts allowed', min: 1, max: 50 }),
    cleaned: choice(
      ['yes', 'no', 'cannot be'],
      'Say whether the rotor was cleaned and looked at: deposits are unbalance too.',
    ),
    nothingLoose: mustTick(
      'Check bolts, feet and fixings. Loose parts are found before weights are hung.',
    ),
    readingSteady: mustTick(
      'See that mark, tacho and sensors are fixed and the tacho counts steadily.',
    ),
    stateAgreed: mustTick('Agree speed, load and damper for every run with the area owner.'),
    setupConfirmed: mustTick(
      'Look at the mark, the tacho and the sensors and confirm the set-up, or record a new set-up first.',
    ),
    standingSentence: mustTick('Read the caution and tick it.'),
  })
  .superRefine((job, context) => {
    const { least, most } = planesOf(job.kind);
    const chosen = new Set(job.planeIds).size;
    if (chosen < least || chosen > (most ?? chosen) || job.planeIds.length !== chosen) {
      const message = `${planeWords(least, most)} for this kind of job (${job.kind}).`;
      context.addIssue({ code: 'custom', path: ['planeIds'], message });
    }
    const points = Math.max(1, chosen, least);
    if (job.pointIds.length < points) {
      const message = `Choose at least ${countWords(points, 'point')} to read in every run.`;
      context.addIssue({ code: 'custom', path: ['pointIds'], message });
    }
  });

const COUNTS = ['no', 'one', 'two', 'three'];

function countWords(count: number, thing: string): string {
  return `${COUNTS[count] ?? String(count)} ${thing}${count === 1 ? '' : 's'}`;
}

function planeWords(least: number, most: number | null): string {
  if (most === 0) return 'Choose no plane';
  return `Choose ${most === null ? `${countWords(least, 'plane')} or more` : countWords(least, 'plane')}`;
}

const runVectorInput = z
  .object({
    pointId: id,
    recordId: z.union([z.literal('').transform(() => null), z.null(), id]).default(null),
    amplitude: z.union([z.string(), z.number()]).default(''),
    phaseDeg: z.union([z.string(), z.number()]).default(''),
    overall: optionalNumber({ what: 'the overall velocity', unit: 'mm/s rms', min: 0, max: 1000 }),
  })
  .transform((vector, context) => {
    if (vector.recordId !== null) return { ...vector, amplitude: 0, phaseDeg: 0 };
    const amplitude = typedNumber({ what: 'the 1x size', min: 0, max: 100_000 }).safeParse(
      vector.amplitude,
    );
    const phase = typedNumber({ what: 'the phase', unit: '°', min: 0, max: 360 }).safeParse(
      vector.phaseDeg,
    );
    for (const [path, parsed] of [
      ['amplitude', amplitude],
      ['phaseDeg', phase],
    ] as const) {
      for (const issue of parsed.error?.issues ?? [])
        context.addIssue({ code: 'custom', path: [path], message: issue.message });
    }
    if (!amplitude.success || !phase.success) return z.NEVER;
    return { ...vector, amplitude: amplitude.data, phaseDeg: phase.data };
  });

export const recordRunInput = z.object({
  jobId: id,
  purpose: z.enum(['base', 'trial', 'check']),
  speedRpm: typedNumber({ what: 'the speed', unit: 'r/min', above: 0, max: 200_000 }),
  unit: z.enum(AMPLITUDE_UNITS),
  vectors: z.array(runVectorInput).min(1, 'Enter the reading of every point.'),
  clearOfRotor: mustTick(
    'Before the start: people clear, tools out, locks off by their owners, guards back. Tick it when it is so.',
  ),
  namedPerson: namedPerson('who made sure that everybody is clear and the guards are back'),
});

export const acceptBaseInput = z.object({
  jobId: id,
  reason: z.string().trim().max(1000).default(''),
});

export const fitWeightInput = z.object({
  jobId: id,
  purpose: z.enum(['trial', 'correction']),
  planeId: id,
  positionId: z.union([z.literal('').transform(() => null), z.null(), id]).default(null),
  massG: typedNumber({ what: 'the mass', unit: 'g', above: 0, max: 1_000_000 }),
  massSource: choice(['scale', 'nominal'], 'Say whether the mass was weighed or is nominal.'),
  radiusMm: typedNumber({ what: 'the radius', unit: 'mm', above: 0, max: 20_000 }),
  angleDeg: optionalNumber({ what: 'the angle', unit: '°', min: 0, max: 360 }),
  angleSense: z.enum(['against', 'with', '']).default(''),
  arcMm: optionalNumber({ what: 'the arc along the rim', unit: 'mm', min: 0 }),
  fixing: text('how the weight is fixed', 200),
  /** Engineer who agrees to a trial weight while the base is in zone D. */
  consent: z.string().trim().max(120).default(''),
  ...fixingFields,
  standingStill: mustTick(
    'Hands on the rotor only when it stands still and every energy source is locked out. Tick it when it is so.',
  ),
  fixingHolds: mustTick('Check mass, fixing and force, then tick it.'),
  namedPerson: namedPerson('who locked the machine out'),
});

export const settleTrialInput = z.object({
  jobId: id,
  weightId: id,
  stays: choice(['taken off', 'stays on'], 'Say whether this weight is still on the rotor.'),
  standingStill: mustTick(
    'Look at the rotor only when it stands still and is locked out. Tick it.',
  ),
  namedPerson: namedPerson('who locked the machine out'),
});

export const takeOffWeightInput = z.object({
  jobId: id,
  weightId: id,
  reason: text('why the weight is taken off', 400),
  standingStill: mustTick(
    'Hands on the rotor only when it stands still and is locked out. Tick it.',
  ),
  namedPerson: namedPerson('who locked the machine out'),
});

/** What was really found where the ledger lists a weight. */
export const correctLedgerInput = z
  .object({
    jobId: id,
    weightId: id,
    found: choice(['missing', 'worn'], 'Say whether the weight is gone or worn.'),
    massG: optionalNumber({ what: 'the mass that is left', unit: 'g', above: 0, max: 1_000_000 }),
    reason: text('what you saw', 400),
    standingStill: mustTick(
      'Look at the rotor only when it stands still and is locked out. Tick it.',
    ),
    namedPerson: namedPerson('who locked the machine out'),
  })
  .superRefine(({ found, massG }, context) => {
    if (found === 'worn' && massG === null)
      context.addIssue({
        code: 'custom',
        path: ['massG'],
        message: 'Weigh the worn weight, or estimate it, and write its mass.',
      });
  });

/** A weight that hangs on the rotor and is on no ledger. */
export const recordFoundWeightInput = z.object({
  jobId: id,
  planeId: id,
  positionId: z.union([z.literal('').transform(() => null), z.null(), id]).default(null),
  massG: typedNumber({ what: 'the mass', unit: 'g', above: 0, max: 1_000_000 }),
  radiusMm: typedNumber({ what: 'the radius', unit: 'mm', above: 0, max: 20_000 }),
  angleDeg: optionalNumber({ what: 'the angle', unit: '°', min: 0, max: 360 }),
  angleSense: z.enum(['against', 'with', '']).default(''),
  arcMm: optionalNumber({ what: 'the arc along the rim', unit: 'mm', min: 0 }),
  fixing: text('how the weight is fixed', 200),
  standingStill: mustTick(
    'Look at the rotor only when it stands still and is locked out. Tick it.',
  ),
  namedPerson: namedPerson('who locked the machine out'),
});

export const confirmSlipInput = z.object({
  jobId: id,
  /** The check run that was looked at, so that a newer one is never repaired by mistake. */
  runId: id,
  slip: z.enum(SLIPS),
  reason: text('who looked, and what was seen', 1000),
});

export const acceptAnswerInput = z.object({
  jobId: id,
  /** Fingerprint of the answer the person looked at, so that an older one is never accepted. */
  fingerprint: z.string().min(1),
});

/** What must be as it was when the stored coefficients were measured; each is ticked by a person. */
export const REUSE_CONDITIONS = [
  { name: 'sameSensors', label: 'The sensors sit at the same places in the same direction.' },
  { name: 'sameMark', label: 'Mark and tacho are where they were.' },
  { name: 'sameSupports', label: 'Bearings, feet, isolators and base are unchanged since then.' },
  { name: 'sameState', label: 'Load and temperature are as usual, and the rotor is clean.' },
] as const;

export const reuseCoefficientsInput = z.object({
  jobId: id,
  sameSensors: mustTick('Look at the sensors. Where one has moved, make trial runs.'),
  sameMark: mustTick('Look at mark and tacho. Where one has moved, make trial runs.'),
  sameSupports: mustTick('Where supports have changed, make trial runs.'),
  sameState: mustTick('Where load, temperature or deposits differ, make trial runs.'),
  reason: z.string().trim().max(1000).default(''),
});

export const withdrawReuseInput = z.object({
  jobId: id,
  reason: text('why trial runs are made after all', 1000),
});

export const lineThroughRunInput = z.object({
  jobId: id,
  runId: id,
  reason: text('what went wrong in this run', 1000),
});

export const keepRunInput = z.object({
  jobId: id,
  runId: id,
  reason: text('why this run may be used', 1000),
});

export const stopJobInput = z.object({
  jobId: id,
  outcome: choice(['stopped safe', 'not a balance job'], 'Say how the job ends.'),
  reason: text('why the job stops here', 1000),
  rotorState: text('what is on the rotor now', 1000),
  safe: mustTick('Leave the machine safe, then tick it.'),
});

export const signJobInput = z.object({
  jobId: id,
  statement: text('your statement', 1000),
  permanentWeightIds: ids,
  handBack: mustTick(
    'Tools counted, temporary weights gone or made permanent, guards on, locks removed by their owners, area owner told: tick it when it is so.',
  ),
  areaOwner: namedPerson('the area owner who takes the machine back'),
  /** Needed where a target is missed or a prediction was missed. */
  reason: z.string().trim().max(1000).default(''),
});
