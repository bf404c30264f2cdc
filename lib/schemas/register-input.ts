import { z } from 'zod';
import { id, optionalNumber, text, tick, typedNumber } from './number';

const choice = <const Options extends readonly [string, ...string[]]>(
  options: Options,
  message: string,
) => z.enum(options, { error: message });

const optionalText = (longest: number) => z.string().trim().max(longest).default('');

export const MACHINE_KINDS = [
  'fan, overhung',
  'fan between bearings',
  'axial fan',
  'blower',
  'pump',
  'motor',
  'mill',
  'crusher',
  'centrifuge',
  'roll',
  'other',
] as const;

const identity = {
  tag: text('the tag', 40),
  name: text('the name', 120),
  kind: text('what kind of machine it is', 60),
  area: text('the area', 80),
  powerKw: optionalNumber({ what: 'the power', unit: 'kW', above: 0, max: 100_000 }),
  speedMinRpm: typedNumber({ what: 'the lowest speed', unit: 'r/min', above: 0, max: 200_000 }),
  speedMaxRpm: typedNumber({ what: 'the highest speed', unit: 'r/min', above: 0, max: 200_000 }),
  nominalSpeedRpm: typedNumber({ what: 'the usual speed', unit: 'r/min', above: 0, max: 200_000 }),
  drive: choice(['direct', 'belt', 'gear', 'variable speed'], 'Choose the drive.'),
  lineHz: typedNumber({ what: 'the line frequency', unit: 'Hz', above: 0, max: 1000 }),
  criticality: choice(['A', 'B', 'C', 'D'], 'Choose the criticality, A to D.'),
  support: choice(['rigid', 'flexible', 'unknown'], 'Choose the support class, or say unknown.'),
};

type Speeds = { speedMinRpm: number; speedMaxRpm: number; nominalSpeedRpm: number };

/** The usual speed lies between the lowest and the highest. */
function speedsInOrder(machine: Speeds, context: z.RefinementCtx): void {
  const { speedMinRpm: low, speedMaxRpm: high, nominalSpeedRpm: usual } = machine;
  if (low > high)
    context.addIssue({
      code: 'custom',
      path: ['speedMaxRpm'],
      message: `The highest speed (${high} r/min) is below the lowest (${low} r/min). Write them the other way round.`,
    });
  else if (usual < low || usual > high)
    context.addIssue({
      code: 'custom',
      path: ['nominalSpeedRpm'],
      message: `The usual speed is ${usual} r/min: it must lie between ${low} and ${high} r/min.`,
    });
}

export const setupFields = {
  mark: text('where the mark is', 300),
  tachoDeg: typedNumber({ what: 'the place of the tacho', unit: '°', min: 0, max: 360 }),
  tachoEdge: choice(['rising', 'falling'], 'Choose the edge that counts.'),
  rotationFromDriveEnd: choice(
    ['clockwise', 'counter-clockwise'],
    'Say which way it turns, seen from the drive end.',
  ),
  supportNote: optionalText(400),
};

const bearingInput = z.object({
  label: text('the letter of the bearing', 20),
  fromAM: optionalNumber({ what: 'the place of the bearing', unit: 'm', min: -100, max: 100 }),
  type: optionalText(60),
  horizontal: tick,
  vertical: tick,
  axial: tick,
});

const planeInput = z
  .object({
    name: text('the name of the plane', 40),
    radiusMm: typedNumber({ what: 'the radius of the plane', unit: 'mm', above: 0, max: 20_000 }),
    fromAM: optionalNumber({ what: 'the place of the plane', unit: 'm', min: -100, max: 100 }),
    maxGTotal: optionalNumber({ what: 'the most grams in the plane', unit: 'g', above: 0 }),
    pieceG: optionalNumber({ what: 'the piece', unit: 'g', above: 0 }),
    positions: optionalNumber({ what: 'the number of positions', min: 2, max: 360 }),
    numbering: z.enum(['against', 'with', '']).default(''),
    firstDeg: optionalNumber({ what: 'the angle of position 1', unit: '°', min: 0, max: 360 }),
    positionMaxG: optionalNumber({ what: 'the most grams on a position', unit: 'g', above: 0 }),
  })
  .superRefine(({ positions, numbering, firstDeg }, context) => {
    if (positions === null) return;
    const missing = (field: string, message: string) => {
      context.addIssue({ code: 'custom', path: [field], message });
    };
    if (numbering === '')
      missing('numbering', 'Say which way the positions are numbered: against or with rotation.');
    if (firstDeg === null)
      missing('firstDeg', 'Write where position 1 is, in degrees from the mark.');
  });

export const createMachineInput = z
  .object({
    siteId: id,
    ...identity,
    ...setupFields,
    limitSetId: z.union([z.literal('').transform(() => null), z.null(), id]).default(null),
    rotorSerial: text('the serial number of the rotor', 60),
    rotorMassKg: optionalNumber({ what: 'the rotor mass', unit: 'kg', above: 0 }),
    balanceGrade: optionalNumber({ what: 'the balance quality grade', unit: 'mm/s', above: 0 }),
    bearingSpanM: optionalNumber({ what: 'the distance between bearings', unit: 'm', above: 0 }),
    centreOfMassFromAM: optionalNumber({ what: 'the place of the centre of mass', unit: 'm' }),
    overhung: tick,
    bearings: z.array(bearingInput).min(1, 'Add at least one bearing.'),
    planes: z.array(planeInput).default([]),
  })
  .superRefine(speedsInOrder);

export const editMachineInput = z
  .object({ machineId: id, ...identity, reason: text('why it is changed', 400) })
  .superRefine(speedsInOrder);

export const retireMachineInput = z.object({
  machineId: id,
  reason: text('why the machine is retired', 400),
});

export const restoreMachineInput = z.object({
  machineId: id,
  reason: text('why the machine comes back', 400),
});

export const recordEventInput = z.object({
  machineId: id,
  kind: choice(
    ['cleaning', 'repair', 'alignment', 'trip', 'process', 'other'],
    'Choose what kind of event it was.',
  ),
  text: text('what happened', 1000),
  breaksTrend: tick,
});

export const newSetupInput = z.object({
  machineId: id,
  ...setupFields,
  reason: text('why there is a new set-up', 400),
});

export const chooseLimitSetInput = z.object({
  machineId: id,
  limitSetId: id,
  reason: text('why this limit set fits', 400),
});
