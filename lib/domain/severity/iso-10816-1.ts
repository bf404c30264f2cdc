import { CHECK_YOUR_COPY, type LimitSetData } from './limit-set-data';

/** Machines up to 15 kW, which ISO 20816-3 leaves out: class I of ISO 10816-1:1995, annex B. */
export const ISO_10816_1: readonly LimitSetData[] = [
  {
    key: 'iso-10816-1-class-i',
    title: 'Small machines class I, up to 15 kW',
    edition: 'ISO 10816-1:1995',
    family: 'small machine',
    group: 'class I',
    quantity: 'velocity',
    unit: 'mm/s rms',
    bandLowHz: 10,
    bandHighHz: 1000,
    boundaries: { ab: 0.71, bc: 1.8, cd: 4.5 },
    displacementRmsUm: null,
    powerMinKw: 0,
    powerMaxKw: 15,
    speedMinRpm: 600,
    speedMaxRpm: 12_000,
    support: 'any',
    citation: `ISO 10816-1:1995 annex B, class I; ${CHECK_YOUR_COPY}`,
    confidence: 'high',
  },
];
