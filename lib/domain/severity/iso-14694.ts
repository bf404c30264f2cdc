import { CHECK_YOUR_COPY, type LimitSetData, type Support } from './limit-set-data';
import type { ZoneBoundaries } from './zone';

type Row = {
  readonly category: 'BV-3' | 'BV-4' | 'BV-5';
  readonly support: Support;
  readonly boundaries: ZoneBoundaries;
};

// BV-1 and BV-2 are left out: the standard gives them no shut-down value to stand for C/D.
const ROWS: readonly Row[] = [
  { category: 'BV-3', support: 'rigid', boundaries: { ab: 4.5, bc: 7.1, cd: 9 } },
  { category: 'BV-3', support: 'flexible', boundaries: { ab: 6.3, bc: 11.8, cd: 12.5 } },
  { category: 'BV-4', support: 'rigid', boundaries: { ab: 2.8, bc: 4.5, cd: 7.1 } },
  { category: 'BV-4', support: 'flexible', boundaries: { ab: 4.5, bc: 7.1, cd: 11.2 } },
  { category: 'BV-5', support: 'rigid', boundaries: { ab: 1.8, bc: 4, cd: 5.6 } },
  { category: 'BV-5', support: 'flexible', boundaries: { ab: 2.8, bc: 5.6, cd: 7.1 } },
];

/**
 * Fans in place, ISO 14694:2003. The standard names start-up, alarm and shut-down values, not
 * zones: they stand here for A/B, B/C and C/D.
 */
export const ISO_14694: readonly LimitSetData[] = ROWS.map(({ category, support, boundaries }) => ({
  key: `iso-14694-${category.toLowerCase()}-${support}`,
  title: `Fans ${category} in place, ${support} support`,
  edition: 'ISO 14694:2003',
  family: 'fan',
  group: category,
  quantity: 'velocity',
  unit: 'mm/s rms',
  bandLowHz: 10,
  bandHighHz: 1000,
  boundaries,
  displacementRmsUm: null,
  powerMinKw: null,
  powerMaxKw: null,
  speedMinRpm: 600,
  speedMaxRpm: null,
  support,
  citation: `ISO 14694:2003, fans in situ, ${category}; start-up, alarm and shut-down values used as A/B, B/C and C/D; ${CHECK_YOUR_COPY}`,
  confidence: 'medium-high',
}));
