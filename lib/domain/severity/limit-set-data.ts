import type { ZoneBoundaries } from './zone';

/** Support class of a machine in one direction (ISO 20816-1). */
export type Support = 'rigid' | 'flexible';

/** What a limit set is meant for. */
export type MachineFamily = 'machine' | 'small machine' | 'rotodynamic pump' | 'fan';

/** A limit set as data: what it says, where it comes from, what it holds for. */
export type LimitSetData = {
  readonly key: string;
  readonly title: string;
  readonly edition: string;
  readonly family: MachineFamily;
  /** Group, category or class by the name the standard gives it. */
  readonly group: string;
  readonly quantity: 'velocity';
  readonly unit: 'mm/s rms';
  readonly bandLowHz: number;
  readonly bandHighHz: number;
  readonly boundaries: ZoneBoundaries;
  /** Boundaries of displacement, µm rms, judged beside the velocity at low frequencies. */
  readonly displacementRmsUm: ZoneBoundaries | null;
  /** Above this power, kW. */
  readonly powerMinKw: number | null;
  /** Up to and including this power, kW. */
  readonly powerMaxKw: number | null;
  readonly speedMinRpm: number | null;
  readonly speedMaxRpm: number | null;
  readonly support: Support | 'any';
  readonly citation: string;
  readonly confidence: 'high' | 'medium-high' | 'medium';
};

/** Every shipped set says so: the text of the standards is not in this product. */
export const CHECK_YOUR_COPY = 'from memory of the standard, check against your copy';
