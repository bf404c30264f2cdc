import { CHECK_YOUR_COPY, type LimitSetData } from './limit-set-data';
import type { ZoneBoundaries } from './zone';

type Row = {
  readonly category: 'category I' | 'category II';
  readonly large: boolean;
  readonly boundaries: ZoneBoundaries;
};

const ROWS: readonly Row[] = [
  { category: 'category I', large: false, boundaries: { ab: 2.5, bc: 4, cd: 6.6 } },
  { category: 'category I', large: true, boundaries: { ab: 3.5, bc: 5, cd: 7.6 } },
  { category: 'category II', large: false, boundaries: { ab: 3.2, bc: 5.1, cd: 8.5 } },
  { category: 'category II', large: true, boundaries: { ab: 4.2, bc: 6.1, cd: 9.5 } },
];

/** Rotodynamic pumps above 600 r/min, ISO 10816-7:2009; slower ones need displacement limits too. */
export const ISO_10816_7: readonly LimitSetData[] = ROWS.map(({ category, large, boundaries }) => ({
  key: `iso-10816-7-${category.toLowerCase().replace(' ', '-')}-${large ? 'large' : 'small'}`,
  title: `Rotodynamic pumps ${category}, ${large ? 'above' : 'up to'} 200 kW`,
  edition: 'ISO 10816-7:2009',
  family: 'rotodynamic pump',
  group: category,
  quantity: 'velocity',
  unit: 'mm/s rms',
  bandLowHz: 10,
  bandHighHz: 1000,
  boundaries,
  displacementRmsUm: null,
  powerMinKw: large ? 200 : 1,
  powerMaxKw: large ? null : 200,
  speedMinRpm: 600,
  speedMaxRpm: null,
  support: 'any',
  citation: `ISO 10816-7:2009, rotodynamic pumps, ${category}; ${CHECK_YOUR_COPY}`,
  confidence: 'high',
}));
