import { CHECK_YOUR_COPY, type LimitSetData, type Support } from './limit-set-data';
import type { ZoneBoundaries } from './zone';

type Row = {
  readonly group: 'group 1' | 'group 2';
  readonly support: Support;
  readonly velocity: ZoneBoundaries;
  readonly displacement: ZoneBoundaries;
};

const ROWS: readonly Row[] = [
  {
    group: 'group 1',
    support: 'rigid',
    velocity: { ab: 2.3, bc: 4.5, cd: 7.1 },
    displacement: { ab: 29, bc: 57, cd: 90 },
  },
  {
    group: 'group 1',
    support: 'flexible',
    velocity: { ab: 3.5, bc: 7.1, cd: 11 },
    displacement: { ab: 45, bc: 90, cd: 140 },
  },
  {
    group: 'group 2',
    support: 'rigid',
    velocity: { ab: 1.4, bc: 2.8, cd: 4.5 },
    displacement: { ab: 22, bc: 45, cd: 71 },
  },
  {
    group: 'group 2',
    support: 'flexible',
    velocity: { ab: 2.3, bc: 4.5, cd: 7.1 },
    displacement: { ab: 37, bc: 71, cd: 113 },
  },
];

const GROUPS = {
  'group 1': { powerMinKw: 300, powerMaxKw: 50_000, words: 'above 300 kW to 50 MW' },
  'group 2': { powerMinKw: 15, powerMaxKw: 300, words: 'above 15 kW to 300 kW' },
} as const;

// The band starts at 2 Hz up to 600 r/min, so slow machines have sets of their own. The slow set
// comes first: at 600 r/min exactly it is the one that holds.
const SPEEDS = [
  { slow: true, speedMinRpm: 120, speedMaxRpm: 600, bandLowHz: 2 },
  { slow: false, speedMinRpm: 600, speedMaxRpm: 30_000, bandLowHz: 10 },
] as const;

/** Bearing housings of industrial machines, ISO 20816-3:2022 (the values of ISO 10816-3:2009). */
export const ISO_20816_3: readonly LimitSetData[] = ROWS.flatMap((row) =>
  SPEEDS.map((speeds) => limitSet(row, speeds)),
);

function limitSet(row: Row, { slow, ...speeds }: (typeof SPEEDS)[number]): LimitSetData {
  const { group, support } = row;
  const { words, ...powers } = GROUPS[group];
  return {
    ...powers,
    ...speeds,
    key: `iso-20816-3-${group.replace(' ', '-')}-${support}${slow ? '-slow' : ''}`,
    title: `Industrial machines ${group}, ${words}, ${support} support${slow ? ', 120 to 600 r/min' : ''}`,
    edition: 'ISO 20816-3:2022',
    family: 'machine',
    group,
    support,
    quantity: 'velocity',
    unit: 'mm/s rms',
    bandHighHz: 1000,
    boundaries: row.velocity,
    displacementRmsUm: row.displacement,
    citation: `ISO 20816-3:2022, bearing housing vibration, ${group}; ${CHECK_YOUR_COPY}`,
    confidence: 'high',
  };
}
